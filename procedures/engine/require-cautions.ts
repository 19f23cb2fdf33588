import type { Step } from '../document';
import { cautionCount } from './cautions';
import { CannotDo, type Drafting } from './drafting';

/** Throws `CannotDo` while a caution of the step was not acknowledged. */
export function requireCautions(drafting: Drafting, step: Step): void {
  const acknowledged = drafting.state.current?.acknowledged.length ?? 0;
  if (acknowledged < cautionCount(drafting.procedure, step)) {
    throw new CannotDo('caution-first', 'Read the caution first and say so.');
  }
}
