import { jStat } from 'jstat';
import { decayLeakRate, expandedUncertainty, judge } from '../../../procedures/calculations';
import { listOf, type Given, type Reproduction, type Results } from './reproduction';

/** The root of the sum of squares of standard uncertainties, by the product alone. */
const combined = (parts: readonly number[]): number =>
  parts.reduce((u, part) => expandedUncertainty({ repeatDeviation: u, accuracy: Math.sqrt(3) * part, k: 1 }), 0);

/** Standard uncertainty by the kind of distribution; the product knows the rectangular one and repeated readings. */
const byDistribution: Readonly<Record<string, (given: Given) => number>> = {
  rectangular: (given) => expandedUncertainty({ accuracy: given('half_width'), k: 1 }),
  resolution: (given) => expandedUncertainty({ resolution: given('resolution'), k: 1 }),
  // A triangle is the sum of two rectangles of half its half-width.
  triangular: (given) =>
    expandedUncertainty({ accuracy: given('half_width') / 2, resolution: given('half_width'), k: 1 }),
  normal_expanded: (given) => expandedUncertainty({ repeatDeviation: given('U') / given('k'), k: 1 }),
};

/** Propagates the inputs' uncertainties through the product's own leak rate by central differences. */
function leakBudget(given: Given): Results {
  const leakOf = (volumeL: number, startKpa: number, endKpa: number, startC: number, endC: number, seconds: number) =>
    decayLeakRate({ volumeL, startKpa, endKpa, startC, endC, seconds, referenceC: 20 }).standardCm3PerMin;
  type Inputs = Parameters<typeof leakOf>;
  const t = given('t_c');
  const at: Inputs = [given('volume_l'), given('p1_kpa'), given('p2_kpa'), t, t, given('dt_s')];
  const [uP, uT] = [given('u_p_kpa'), given('u_t_k')];
  const u: Inputs = [given('u_volume_l'), uP, uP, uT, uT, given('u_dt_s')];
  const shares = at.map((_, index) => {
    const moved = (sign: number) => at.map((value, i) => (i === index ? value + sign * 1e-3 * u[i]! : value)) as Inputs;
    return Math.abs(leakOf(...moved(1)) - leakOf(...moved(-1))) / 2e-3;
  });
  const standard = combined(shares);
  return { leak_sccm_20C: leakOf(...at), u_leak_sccm_20C: standard, U_k2: 2 * standard };
}

const decisions = { in: 'accept', out: 'reject', 'too-close': 'inconclusive' } as const;

function decided({ inputs }: { inputs: Results }): Results {
  const [y, U, k] = [Number(inputs['y']), Number(inputs['U']), Number(inputs['k'])];
  const limit = (name: 'low' | 'high', found: unknown) => (typeof found === 'number' ? { [name]: found } : {});
  const [low, high] = [limit('low', inputs['lower_limit']), limit('high', inputs['upper_limit'])];
  const verdict = judge({ value: y, uncertainty: U, ...low, ...high });
  const isInside = judge({ value: y, uncertainty: 0, ...low, ...high }) === 'in';
  const side = isInside ? 'pass' : 'fail';
  const below = (edge: number) => jStat.normal.cdf(edge, y, U / k);
  return {
    decision: decisions[verdict],
    ilac_term: verdict === 'too-close' ? `conditional ${side}` : side,
    conformance_probability: below(high['high'] ?? Infinity) - below(low['low'] ?? -Infinity),
  };
}

/** Section i: uncertainty and decisions. */
export const uncertaintyValues: readonly Reproduction[] = [
  {
    topic: 'i',
    inputs: ['distribution', 'half_width?', 'resolution?', 'U?', 'k?'],
    give: (given, { inputs, expected }) => {
      const u = byDistribution[String(inputs['distribution'])]!(given);
      return 'u_squared' in expected ? { u, u_squared: u ** 2 } : { u };
    },
  },
  {
    topic: 'i',
    inputs: ['type_a_u', 'rectangular_half_width'],
    give: (given) => {
      const [accuracy, repeatDeviation] = [given('rectangular_half_width'), given('type_a_u')];
      return {
        u_rect: expandedUncertainty({ accuracy, k: 1 }),
        u_combined: expandedUncertainty({ accuracy, repeatDeviation, k: 1 }),
      };
    },
  },
  {
    topic: 'i',
    inputs: ['components_nm'],
    give: (_given, value) => ({ u_combined_nm: combined(listOf(value, 'components_nm')) }),
  },
  {
    topic: 'i',
    inputs: ['components', 'k'],
    give: (given, { inputs }) => {
      const [step, limit] = inputs['components'] as Record<string, number>[];
      const sources = { resolution: step!['resolution']!, accuracy: limit!['half_width']! };
      return {
        u_combined: expandedUncertainty({ ...sources, k: 1 }),
        U: expandedUncertainty({ ...sources, k: given('k') }),
      };
    },
  },
  {
    topic: 'i',
    inputs: ['x1', 'U1', 'x2', 'U2'],
    give: (given) => {
      const uncertainty = combined([given('U1'), given('U2')]);
      const en = (given('x1') - given('x2')) / uncertainty;
      // Two readings agree when their difference is not told from nothing: it is not outside a band of no width.
      const agree = judge({ value: given('x1') - given('x2'), uncertainty, low: 0, high: 0 }) !== 'out';
      return { en, agree };
    },
  },
  {
    topic: 'i',
    inputs: ['volume_l', 'u_volume_l', 'p1_kpa', 'p2_kpa', 'u_p_kpa', 't_c', 'u_t_k', 'dt_s', 'u_dt_s', 'note'],
    give: leakBudget,
  },
  {
    topic: 'i',
    inputs: ['y', 'U', 'k', 'lower_limit', 'upper_limit', 'guard_band'],
    give: (_given, value) => decided(value),
  },
];
