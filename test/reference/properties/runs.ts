import * as fc from 'fast-check';

/** How many random inputs each property is held to; fast-check prints the seed of a failure. */
export const thousands = { numRuns: 5000 };

/** Any finite number between two, the ends and numbers next to them often. */
export const between = (min: number, max: number) => fc.double({ min, max, noNaN: true });

/** Numbers with three decimals, as readings have them. */
export const readings = (min: number, max: number) =>
  fc.integer({ min: Math.ceil(min * 1000), max: Math.floor(max * 1000) }).map((thousandths) => thousandths / 1000);

/** Expects two numbers to be as close as `relative` of the larger; below 1 that is an absolute difference. */
export function expectClose(found: number, expected: number, relative: number): void {
  const allowed = relative * Math.max(1, Math.abs(expected));
  if (Math.abs(found - expected) <= allowed) return;
  throw new Error(`${found} is not ${expected} within ${allowed}`);
}
