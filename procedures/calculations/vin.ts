import { requireInRange } from './argument-range';

/** What is wrong with a vehicle identification number, in the order of the tests. */
export type VinProblem = 'length' | 'character' | 'check-digit' | 'year-code';

/** The outcome of `checkVin`; `problems` is empty when the number is valid. */
export interface VinCheck {
  readonly valid: boolean;
  readonly problems: readonly VinProblem[];
}

const vinLength = 17;
const checkDigitIndex = 8;
const yearIndex = 9;
const cycleIndex = 6;
const vinPattern = /^[A-HJ-NPR-Z0-9]{17}$/;

/** 49 CFR 565.15(c), Table III: the letters in the order of the alphabet, I, O and Q left out. */
const letters = 'ABCDEFGHJKLMNPRSTUVWXYZ';
const letterValues = [1, 2, 3, 4, 5, 6, 7, 8, 1, 2, 3, 4, 5, 7, 9, 2, 3, 4, 5, 6, 7, 8, 9];
/** 49 CFR 565.15(c), Table IV: the weight of each position; the check digit's own is 0. */
const weights = [8, 7, 6, 5, 4, 3, 2, 10, 0, 9, 8, 7, 6, 5, 4, 3, 2];
/** 49 CFR 565.15(d)(1), Table VII: the year codes from 1980 on, which begin again in 2010. */
const yearCodes = 'ABCDEFGHJKLMNPRSTVWXY123456789';
const firstCycleYear = 1980;

const valueOf = (character: string): number => letterValues[letters.indexOf(character)] ?? Number(character);

/**
 * Gives the check digit, `0` to `9` or `X`, that position 9 of a vehicle identification number should carry.
 *
 *     the sum over the 17 positions of value * weight, modulo 11; 10 is written X
 *
 * Takes upper case without blanks. Throws RangeError unless it is 17 characters of the digits and the letters without
 * I, O and Q. The rule binds in North America; elsewhere a mismatch is worth a second look and proves nothing (ISO
 * 3779). It cannot see every mistake: B and S, among others, carry the same value.
 *
 * Source: 49 CFR 565.15(c), Tables III and IV; 565.13(g) on the characters.
 *
 * @example vinCheckDigit('1ZZBT4CK4LR204817') // '4'
 */
export function vinCheckDigit(vin: string): string {
  if (typeof vin !== 'string' || !vinPattern.test(vin)) {
    throw new RangeError(`vin is ${String(vin)}; allowed: 17 digits and upper-case letters without I, O and Q`);
  }
  const sum = weights.reduce((total, weight, index) => total + weight * valueOf(vin.charAt(index)), 0);
  const remainder = sum % 11;
  return remainder === 10 ? 'X' : String(remainder);
}

/**
 * Checks a vehicle identification number: its length, its characters, its check digit and its year code, in this
 * order. A wrong length or character ends the check, since the rest would have no meaning. Takes upper case without
 * blanks, never throws. Outside North America neither the check digit nor the year code is mandatory, so let these
 * two problems be notes, not walls.
 *
 * Source: 49 CFR 565.13(g) and 565.15(c) and (d); ISO 3779 on the length and the characters.
 *
 * @example checkVin('1ZZBT4CK7LR204817') // { valid: false, problems: ['check-digit'] }
 */
export function checkVin(vin: string): VinCheck {
  const problems = vinProblems(vin);
  return { valid: problems.length === 0, problems };
}

function vinProblems(vin: string): readonly VinProblem[] {
  if (vin.length !== vinLength) return ['length'];
  if (!vinPattern.test(vin)) return ['character'];
  const problems: VinProblem[] = [];
  if (vin.charAt(checkDigitIndex) !== vinCheckDigit(vin)) problems.push('check-digit');
  if (!yearCodes.includes(vin.charAt(yearIndex))) problems.push('year-code');
  return problems;
}

/**
 * Gives the model year of a vehicle identification number, or undefined when position 10 is no year code or when the
 * year would lie after `notAfter`.
 *
 * Each code stands for two years, 30 apart: a digit in position 7 means 1980 to 2009, a letter 2010 to 2039, as the
 * rule for passenger cars, multipurpose vehicles and trucks up to 4536 kg has it. `notAfter` (a year, such as next
 * year's) only bounds the answer: a year beyond it is no answer rather than a guess.
 *
 * Throws RangeError unless the vin is 17 allowed characters and `notAfter` is a whole year from 1980 on.
 * Source: 49 CFR 565.15(b) and (d)(1), Table VII.
 *
 * @example modelYear('1ZZBT4CK4LR204817', { notAfter: 2030 }) // 2020
 */
export function modelYear(vin: string, { notAfter }: { readonly notAfter: number }): number | undefined {
  vinCheckDigit(vin);
  requireInRange('notAfter', notAfter, { low: firstCycleYear });
  if (!Number.isInteger(notAfter)) throw new RangeError(`notAfter is ${notAfter}; allowed: a whole year`);
  const code = yearCodes.indexOf(vin.charAt(yearIndex));
  if (code < 0) return undefined;
  const isSecondCycle = /[A-Z]/.test(vin.charAt(cycleIndex));
  const year = firstCycleYear + code + (isSecondCycle ? yearCodes.length : 0);
  return year <= notAfter ? year : undefined;
}
