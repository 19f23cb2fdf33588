import type { Step } from '../document';
import { CannotDo } from './drafting';

export function wrongKind(step: Step): CannotDo {
  return new CannotDo('wrong-kind', `Step ${step.number} does not take that.`);
}
