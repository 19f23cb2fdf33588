import { decayLeakRate } from '../../../procedures/calculations';
import { type Reproduction } from './reproduction';

/** CODATA 2018, exact. */
const gasConstant = 8.314462618;
const iceKelvin = 273.15;

/** Section e: leak rate from a pressure decay. */
export const leakRates: readonly Reproduction[] = [
  {
    topic: 'e',
    inputs: ['volume_l', 'p1_abs_kpa', 't1_c', 'p2_abs_kpa', 't2_c', 'dt_s'],
    give: (given) => {
      const test = {
        volumeL: given('volume_l'),
        startKpa: given('p1_abs_kpa'),
        endKpa: given('p2_abs_kpa'),
        startC: given('t1_c'),
        endC: given('t2_c'),
        seconds: given('dt_s'),
      };
      const atZero = decayLeakRate(test);
      const atTwenty = decayLeakRate({ ...test, referenceC: 20 });
      // One temperature throughout takes the compensation out.
      const raw = decayLeakRate({ ...test, startC: 20, endC: 20, referenceC: 20 });
      return {
        leak_mol_s: atZero.paM3PerS / (gasConstant * iceKelvin),
        leak_sccm_0C_101325: atZero.standardCm3PerMin,
        leak_sccm_20C_101325: atTwenty.standardCm3PerMin,
        leak_pa_m3_s_at_20C: atTwenty.paM3PerS,
        v_dp_dt_uncompensated_pa_m3_s: raw.paM3PerS,
      };
    },
  },
  {
    topic: 'e',
    inputs: ['pa_m3_s_at_0C'],
    give: (given) => {
      // One cubic metre that loses a pascal a second loses one pascal cubic metre a second.
      const seconds = 1000;
      const endKpa = 101 - (given('pa_m3_s_at_0C') * seconds) / 1000;
      const rate = decayLeakRate({ volumeL: 1000, startKpa: 101, endKpa, startC: 0, endC: 0, seconds });
      return {
        leak_sccm_0C_101325: rate.standardCm3PerMin,
        // 1 Pa is 0.01 mbar, 1 m3 is 1000 L.
        mbar_l_s: rate.paM3PerS * 0.01 * 1000,
        mol_s: rate.paM3PerS / (gasConstant * iceKelvin),
      };
    },
  },
  {
    topic: 'e',
    inputs: ['volume_l', 'p1_kpa', 't1_k', 'p2_kpa', 't2_k', 'dt_s', 'R'],
    give: (given) => {
      const out = decayLeakRate({
        volumeL: given('volume_l'),
        startKpa: given('p1_kpa'),
        endKpa: given('p2_kpa'),
        startC: given('t1_k') - iceKelvin,
        endC: given('t2_k') - iceKelvin,
        seconds: given('dt_s'),
      });
      return { leak_into_vessel_mol_s: -out.paM3PerS / (given('R') * iceKelvin) };
    },
  },
];
