import { requireInRange } from './argument-range';
import { airKelvin, airPressureRangeKpa } from './dry-air';

/** Pressure and temperature of a closed volume at the start and at the end of a decay test. */
export interface DecayTest {
  /** The volume in litres, 0.001 to 1 000 000; it must not stretch. */
  readonly volumeL: number;
  /** Absolute pressures in kPa, 0 to 10 000. */
  readonly startKpa: number;
  readonly endKpa: number;
  /** Temperatures of the gas in degC, -100 to 1000. */
  readonly startC: number;
  readonly endC: number;
  /** Time between the two in seconds, 0.001 to 10 000 000. */
  readonly seconds: number;
  /** Absolute pressure that the standard flow refers to, in kPa, 0.001 to 10 000; 101.325 when left out. */
  readonly referenceKpa?: number;
  /** Temperature that both rates refer to, in degC, -100 to 1000; 0 when left out. */
  readonly referenceC?: number;
}

/** A leak rate; positive when gas goes out. */
export interface LeakRate {
  /** Throughput in Pa m3/s of gas at the reference temperature. */
  readonly paM3PerS: number;
  /** Standard volume flow in cm3/min at the reference temperature and pressure. */
  readonly standardCm3PerMin: number;
}

/** Volumes of vessels and intake tracts in litres, from a cubic centimetre to a cubic decametre. */
export const vesselRangeL = { low: 0.001, high: 1_000_000 };
const pressureRangeKpa = { low: 0, high: airPressureRangeKpa.high };
const timeRangeS = { low: 0.001, high: 10_000_000 };
const cm3PerMinInM3PerS = 60e6;

/**
 * Gives the mean leak rate of a rigid volume from its pressure decay, compensated for the temperature of the gas.
 *
 *     Q = V / dt (p1 / T1 - p2 / T2) T_ref        throughput, Pa m3/s
 *     Q_std = Q / p_ref                           standard volume flow
 *
 * p and T are absolute; 1 and 2 the start and the end. Both rates mean nothing without their reference temperature,
 * the second none without its reference pressure: print them beside it. With one temperature throughout, also as
 * `referenceC`, the throughput is V (p1 - p2) / dt.
 *
 * Throws RangeError outside the ranges of `DecayTest`. Source: mass balance of the ideal gas, in the practice of ASTM
 * E2930 (a total change below 10 % of the start; hoses settled) and in 40 CFR 1065.644.
 *
 * @example
 * decayLeakRate({ volumeL: 8, startKpa: 131.8, endKpa: 129.3, startC: 25, endC: 23.5, seconds: 60 })
 * // { paM3PerS: 0.22552, standardCm3PerMin: 133.54 }
 */
export function decayLeakRate(test: DecayTest): LeakRate {
  const { volumeL, startKpa, endKpa, startC, endC, seconds, referenceKpa = 101.325, referenceC = 0 } = test;
  requireInRange('volumeL', volumeL, vesselRangeL);
  requireInRange('startKpa', startKpa, pressureRangeKpa);
  requireInRange('endKpa', endKpa, pressureRangeKpa);
  requireInRange('seconds', seconds, timeRangeS);
  requireInRange('referenceKpa', referenceKpa, airPressureRangeKpa);
  const startKelvin = airKelvin('startC', startC);
  const endKelvin = airKelvin('endC', endC);
  const referenceKelvin = airKelvin('referenceC', referenceC);
  // Litres times kilopascals are Pa m3. One quotient keeps equal states at exactly no leak.
  const lost = (startKpa * endKelvin - endKpa * startKelvin) / (startKelvin * endKelvin);
  const paM3PerS = ((volumeL * lost) / seconds) * referenceKelvin;
  return { paM3PerS, standardCm3PerMin: (paM3PerS / (referenceKpa * 1000)) * cm3PerMinInM3PerS };
}
