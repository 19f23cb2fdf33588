import type { CompiledProcedure } from '../document';
import { applyEvent } from './apply-event';
import { changingInPlace } from './state-changes';
import type { ReplayResult } from './refusal';
import type { RunEvent, RunHeader } from './run-event';
import type { RunState } from './run-state';

/** The state of a run after its events, from the start or on from a state that an earlier replay gave. */
export function replay(
  procedure: CompiledProcedure,
  header: RunHeader,
  events: readonly RunEvent[],
  from?: RunState,
): ReplayResult {
  return changingInPlace(() => {
    let state = from;
    for (const event of events) {
      const result = applyEvent(procedure, header, state, event);
      if (!result.ok) return result;
      state = result.state;
    }
    return state === undefined
      ? { ok: false, refusal: { seq: 1, code: 'not-opened', what: 'the run has no events' } }
      : { ok: true, state };
  });
}
