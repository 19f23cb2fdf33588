import { RefusedEvent } from './refusal';
import type { RunEvent, RunEventType } from './run-event';
import type { RunState } from './run-state';

/** Work on the run: none of it is recorded while the run waits or a limit is not acknowledged. */
const work: ReadonlySet<RunEventType> = new Set([
  'gear-chosen',
  'step-claimed',
  'step-done',
  'caution-acknowledged',
  'reading-recorded',
  'not-measurable',
  'not-applicable',
  'series-recorded',
  'mark-placed',
  'codes-recorded',
  'timer-started',
  'timer-ended',
  'choice-made',
  'photo-attached',
  'released',
  'verified',
  'restored',
  'branch-taken',
  'branch-overruled',
  'step-redone',
  'undone',
  'limit-exceeded',
  'finding-reached',
  'write-up-written',
  'closed',
]);

/** What may still follow when the run is closed. */
const afterwards: ReadonlySet<RunEventType> = new Set(['signed', 'amended']);

const statusWords: Readonly<Record<Exclude<RunState['status'], 'open' | 'closed' | 'signed'>, string>> = {
  'set-aside': 'the run is set aside',
  stopped: 'the run is stopped',
  'lead-called': 'the run waits for the lead',
};

/** Refuses what the run's status has no place for: work while it waits, anything but a signature once it is closed. */
export function requireGoing(state: RunState, event: RunEvent): void {
  const { status, alarm } = state;
  if (status === 'closed' || status === 'signed') {
    if (afterwards.has(event.type)) return;
    throw new RefusedEvent('not-open', 'the run is closed: only a signature or an amendment may follow');
  }
  if (event.type === 'signed' || event.type === 'amended') {
    throw new RefusedEvent('not-done', 'the run is not closed yet: nothing can be signed or amended');
  }
  if (event.type === 'resumed') return requireSamePause(state, event.data.from);
  if (!work.has(event.type)) return;
  if (alarm !== undefined) {
    throw new RefusedEvent(
      'alarm',
      `the limit ${alarm.limit} is exceeded and not acknowledged: nothing goes on before`,
    );
  }
  const leavesTheStop = status === 'stopped' && event.type === 'branch-taken' && event.data.exit === 'stop';
  if (status !== 'open' && !leavesTheStop) {
    throw new RefusedEvent('not-open', `${statusWords[status]}: it has to be resumed before anything is recorded`);
  }
}

/** A run is resumed from the pause that it is in; after a reload from none. */
function requireSamePause({ status }: RunState, from: RunState['status'] | 'reload'): void {
  if (from === status || (from === 'reload' && status === 'open')) return;
  throw new RefusedEvent('not-open', `the run is ${status}: it cannot be resumed from ${from}`);
}
