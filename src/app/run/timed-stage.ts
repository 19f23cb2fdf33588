import type { Step } from '../../../procedures/document';
import { secondsOf } from '../../../procedures/engine';
import { takesNeeded } from '../../../procedures/engine/showing';
import { takesOf } from './readings/earlier-readings';
import type { RunView } from './run-view';

/** What a timed step asks for now: its clock, or readings. */
export type TimedStage = 'clock' | 'read';

type Timed = Extract<Step, { readonly kind: 'hold' | 'wait' }>;

/**
 * A hold reads what it begins with, then runs its clock, then reads what it ends with. A wait that has a least time
 * lets it go by first: what is read before could not end it.
 */
export function timedStage(run: RunView, step: Timed): TimedStage {
  const timer = run.state.current?.timer;
  const isOver = timer?.ended === true && timer.certain;
  if (step.kind === 'wait') return secondsOf(step) === undefined || isOver ? 'read' : 'clock';
  if (isOver) return (step.ends ?? []).length > 0 ? 'read' : 'clock';
  if (timer !== undefined) return 'clock';
  const isBegun = (step.begins ?? []).every((read) => takesOf(run, read.name).length >= takesNeeded(read));
  return isBegun ? 'clock' : 'read';
}
