import type { Timing } from './measure';

/** A bound and what was measured against it. */
export interface Budget {
  readonly what: string;
  readonly bound: string;
  readonly measured: number;
  readonly met: boolean;
}

export interface Report {
  readonly timings: readonly Timing[];
  readonly budgets: readonly Budget[];
}

export function atMost(what: string, bound: number, measured: number): Budget {
  return { what, bound: `at most ${bound}`, measured: rounded(measured), met: measured <= bound };
}

export function atLeast(what: string, bound: number, measured: number): Budget {
  return { what, bound: `at least ${bound}`, measured: rounded(measured), met: measured >= bound };
}

/** Three figures: more than that is noise. */
export const rounded = (value: number): number => Number(value.toPrecision(3));
