import { composeWriteUp } from '../../procedures/engine';
import type { RunWalk } from '../../procedures/engine/testing/run-walk';

/** The four parts of a run's write-up as one reads them. */
export function writeUpTexts({ procedure, state }: Pick<RunWalk, 'procedure' | 'state'>): {
  readonly concern: string;
  readonly cause: string;
  readonly correction: string;
  readonly customer: string;
} {
  const { concern, cause, correction, customer } = composeWriteUp(procedure, state);
  return { concern: concern.text, cause: cause.text, correction: correction.text, customer: customer.text };
}
