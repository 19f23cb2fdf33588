import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** One value from outside the project: what goes in, what must come out, how closely, and who says so. */
export interface CheckValue {
  readonly topic: string;
  readonly case: string;
  readonly inputs: Readonly<Record<string, unknown>>;
  readonly expected: Readonly<Record<string, unknown>>;
  readonly tolerance: Tolerance;
  readonly source: string;
  /** How the value was obtained: read in the source, computed, or from memory. */
  readonly how: string;
}

/** A number passes when it is within max(abs, rel * |expected|); an entry of `keys` replaces that for its key. */
export interface Tolerance {
  readonly rel?: number;
  readonly abs?: number;
  readonly zero_abs?: number;
  /** How far the published formulas of one quantity may be apart. */
  readonly any_formula_abs?: number;
  readonly exact?: boolean;
  readonly keys?: Readonly<Record<string, number>>;
}

/** Every check value of every section. */
export const allCheckValues = JSON.parse(
  readFileSync(join(__dirname, 'check-values.json'), 'utf8'),
) as readonly CheckValue[];

/** What the title of a test says of its value: the case, its source, and whether something in it is from memory. */
export function titleOf({ case: name, source, how }: CheckValue): string {
  const isFromMemory = /from memory/.test(how) && !/from memory/.test(source);
  return `${name} (${source}${isFromMemory ? '; partly from memory' : ''})`;
}

/** The values of one topic that carry every named input; fails when there is none, so that no table runs empty. */
export function checkValues(topic: string, ...inputs: string[]): [title: string, value: CheckValue][] {
  const found = allCheckValues.filter((value) => value.topic === topic && inputs.every((name) => name in value.inputs));
  if (found.length === 0) throw new Error(`no check value of topic ${topic} with ${inputs.join(', ')}`);
  return found.map((value) => [titleOf(value), value]);
}

/** A numeric input or expectation, or an error: a missing number must fail the check, not pass as undefined. */
export function numberOf(record: Readonly<Record<string, unknown>>, key: string): number {
  const found = record[key];
  if (typeof found !== 'number') throw new Error(`${key} is no number`);
  return found;
}

/** How far a result may be from an expected number under this key. */
export function allowance(tolerance: Tolerance, key: string, expected: number): number {
  const byKey = tolerance.keys?.[key];
  if (byKey !== undefined) return byKey;
  if (expected === 0 && tolerance.zero_abs !== undefined) return tolerance.zero_abs;
  return Math.max(tolerance.abs ?? 0, (tolerance.rel ?? 0) * Math.abs(expected));
}

/** Expects a result within the value's own tolerance. */
export function expectWithin(value: CheckValue, key: string, result: number): void {
  const expected = numberOf(value.expected, key);
  expect(Math.abs(result - expected)).toBeLessThanOrEqual(allowance(value.tolerance, key, expected));
}
