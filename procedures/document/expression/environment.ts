import type { JudgedResult } from '../procedure-document';
import type { Span } from './expression';

/** What a run gives to an expression. Numbers are in base units: Pa, K, m, m3/s, ... */
export interface Environment {
  /** The value of a quantity; undefined while it was not measured. */
  readonly number: (name: string) => number | undefined;
  readonly truth: (name: string) => boolean;
  /** The result of a quantity against its band; undefined where it was not judged. */
  readonly result: (name: string) => JudgedResult | undefined;
  /** Expanded uncertainty (k = 2) in base units. */
  readonly uncertainty: (name: string) => number | undefined;
  readonly isMeasured: (name: string) => boolean;
}

export type Evaluation =
  { readonly ok: true; readonly value: number | boolean } | { readonly ok: false; readonly problem: EvaluationProblem };

/** Why an expression has no value in a run. */
export type EvaluationProblem =
  | (Span & { readonly code: 'not-measured'; readonly name: string; readonly message: string })
  | (Span & { readonly code: 'no-value'; readonly message: string });
