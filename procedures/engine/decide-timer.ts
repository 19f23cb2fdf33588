import type { HoldStep, Step, WaitStep } from '../document';
import { finishEntry } from './decide-readings';
import { CannotDo, type Drafting } from './drafting';
import { own } from './environment';
import { wrongKind } from './wrong-kind';

/** How long a step lasts; undefined where it has no clock. */
export function secondsOf(step: Step): number | undefined {
  if (step.kind === 'hold') return step.seconds;
  return step.kind === 'wait' ? step.atLeastSeconds : undefined;
}

/** Starts the clock of a hold, once what it begins with was read, or of a wait that has a least time. */
export function startTimer(drafting: Drafting, step: Step): void {
  const seconds = secondsOf(step);
  if (!isTimed(step) || seconds === undefined) throw wrongKind(step);
  const unread = step.kind === 'hold' ? (step.begins ?? []).filter(({ name }) => !isRead(drafting, step, name)) : [];
  if (unread.length > 0) {
    throw new CannotDo('read-first', `Enter ${unread.map(({ label }) => label.toLowerCase()).join(' and ')} first.`);
  }
  drafting.add({ type: 'timer-started', data: { step: step.id, seconds } });
}

/** Ends it; a clock that was changed meanwhile proves nothing, and the time is offered again. */
export function endTimer(drafting: Drafting, step: Step, certain: boolean): void {
  if (!isTimed(step)) throw wrongKind(step);
  if (drafting.state.current?.timer === undefined) throw new CannotDo('no-timer', 'Start the clock first.');
  drafting.add({ type: 'timer-ended', data: { step: step.id, certain } });
  finishEntry(drafting, step);
}

function isTimed(step: Step): step is HoldStep | WaitStep {
  return step.kind === 'hold' || step.kind === 'wait';
}

function isRead(drafting: Drafting, step: Step, name: string): boolean {
  return own(drafting.state.values, name)?.step === step.id;
}
