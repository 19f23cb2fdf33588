import type { Step } from '../../../../procedures/document';
import { decide } from '../../../../procedures/engine';
import { waitsForSomebody } from '../../../../procedures/engine/showing';
import type { RunView } from '../run-view';

/**
 * Whether a step's own part is entered and only somebody else's, or the way on, is left. A series is judged when it is
 * done, so there the look comes as soon as the series is kept.
 */
export function isForSomebody({ procedure, state }: RunView, step: Step): boolean {
  if (step.kind === 'finding' || (step.release === undefined && step.verify === undefined)) return false;
  if (step.kind === 'listen' || step.kind === 'ramp') {
    const isWaiting = waitsForSomebody(step, state.current) !== undefined;
    return isWaiting && state.series[step.name]?.record !== undefined;
  }
  const outcome = decide(procedure, state, { do: 'confirm' });
  return outcome.ok || outcome.code === 'verify-first' || outcome.code === 'release-first';
}
