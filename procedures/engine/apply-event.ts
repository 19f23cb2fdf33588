import type { CompiledProcedure } from '../document';
import { brokenLink, contentHash, headerHash } from './chain';
import { exceedLimit, overrule, reachFinding, redo } from './apply-detours';
import { acknowledge, chooseGear, disturb, makeChoice, recordCodes, runTimer } from './apply-entries';
import { placeMark, recordReading, recordSeries, undo } from './apply-readings';
import { amendClaim, claimStep, finishStep, requireCurrent, takeBranch } from './apply-walk';
import { RefusedEvent, type ReplayResult } from './refusal';
import type { RunEvent, RunHeader } from './run-event';
import type { RunState } from './run-state';

/**
 * The run after one more event. Total and deterministic: it gives a state or a refusal that names the event and why.
 * Order comes from seq and the chain alone; a value that this build computes differently is a discrepancy, never a
 * refusal.
 */
export function applyEvent(
  procedure: CompiledProcedure,
  header: RunHeader,
  state: RunState | undefined,
  event: RunEvent,
): ReplayResult {
  const seq = (state?.seq ?? 0) + 1;
  const broken = brokenLink(header, event, seq, state?.head ?? headerHash(header));
  if (broken !== undefined) return { ok: false, refusal: { seq, code: 'chain', what: broken } };
  try {
    const next = state === undefined ? open(procedure, header, event) : reduceEvent(procedure, state, event);
    return { ok: true, state: { ...next, seq: event.seq, head: event.hash, lastAt: event.at } };
  } catch (error) {
    if (error instanceof RefusedEvent) return { ok: false, refusal: { seq, code: error.code, what: error.message } };
    // RangeError: a figure of the event is outside of what its calculation allows.
    if (error instanceof RangeError) return { ok: false, refusal: { seq, code: 'malformed', what: error.message } };
    throw error;
  }
}

function open(procedure: CompiledProcedure, header: RunHeader, event: RunEvent): RunState {
  if (event.type !== 'opened') throw new RefusedEvent('not-opened', 'the first event must open the run');
  const document = procedure.document;
  if (document.id !== header.procedureId || contentHash(document) !== header.contentHash) {
    throw new RefusedEvent('other-procedure', 'the run was opened on another procedure or version');
  }
  return {
    header,
    status: 'open',
    seq: event.seq,
    head: event.hash,
    openedAt: event.at,
    lastAt: event.at,
    openedBy: event.actor,
    personName: event.data.person,
    visit: event.data.visit,
    siteName: event.data.siteName,
    inputs: event.data.inputs,
    ...(event.data.again === undefined ? {} : { again: event.data.again }),
    current: undefined,
    walked: [],
    values: {},
    truths: {},
    verdict: undefined,
    finding: undefined,
    gear: {},
    disturbed: [],
    series: {},
    codes: {},
    choices: {},
    overruled: undefined,
    branchCounts: {},
    exceeded: [],
    alarm: undefined,
    pause: undefined,
    writeUp: undefined,
    discrepancies: [],
  };
}

/** The same without the chain: for events that have no place in it yet. Throws `RefusedEvent`. */
export function reduceEvent(procedure: CompiledProcedure, state: RunState, event: RunEvent): RunState {
  if (state.status === 'closed' || state.status === 'signed') {
    if (event.type !== 'signed' && event.type !== 'amended') {
      throw new RefusedEvent('not-open', 'the run is closed: only a signature or an amendment may follow');
    }
  }
  switch (event.type) {
    case 'opened':
      throw new RefusedEvent('opened-twice', 'the run was opened already');
    case 'gear-chosen':
      return chooseGear(state, event);
    case 'step-claimed':
      return claimStep(procedure, state, event);
    case 'step-done':
      return finishStep(procedure, state, event);
    case 'caution-acknowledged':
      return acknowledge(state, event);
    case 'reading-recorded':
      return recordReading(procedure, state, event);
    case 'not-measurable':
    case 'not-applicable':
      requireCurrent(state, event.data.step);
      return amendClaim(state, { notMeasured: true });
    case 'series-recorded':
      return recordSeries(procedure, state, event);
    case 'mark-placed':
      return placeMark(procedure, state, event);
    case 'codes-recorded':
      return recordCodes(procedure, state, event);
    case 'timer-started':
    case 'timer-ended':
      return runTimer(state, event);
    case 'choice-made':
      return makeChoice(procedure, state, event);
    case 'disturbed':
      return disturb(procedure, state, event);
    case 'restored':
      return { ...state, disturbed: state.disturbed.filter(({ item }) => item !== event.data.item) };
    case 'branch-taken':
      return takeBranch(procedure, state, event);
    case 'branch-overruled':
      return overrule(procedure, state, event);
    case 'step-redone':
      return redo(procedure, state, event);
    case 'undone':
      return undo(procedure, state, event);
    case 'lead-called':
      return { ...state, status: 'lead-called', pause: pauseOf(event, event.data.question) };
    case 'set-aside':
      return { ...state, status: 'set-aside', pause: pauseOf(event, event.data.reason) };
    case 'stopped':
      return { ...state, status: 'stopped', pause: pauseOf(event, event.data.reason) };
    case 'resumed':
      return { ...state, status: 'open', pause: undefined };
    case 'limit-exceeded':
      return exceedLimit(procedure, state, event);
    case 'alert-acknowledged':
      return state.alarm?.seq === event.data.seq ? { ...state, alarm: undefined } : state;
    case 'finding-reached':
      return reachFinding(procedure, state, event);
    case 'write-up-written':
      return { ...state, writeUp: event.data };
    case 'closed':
      if (state.finding === undefined) throw new RefusedEvent('not-done', 'the run has no finding yet');
      if (state.disturbed.length > 0) throw new RefusedEvent('still-disturbed', 'something disturbed is not restored');
      return { ...state, status: 'closed', current: undefined };
    case 'signed':
      return { ...state, status: 'signed' };
    default:
      // Kept and shown, without an effect on the state: notes, photos, predictions, notices.
      return state;
  }
}

function pauseOf(event: RunEvent, reason: string): RunState['pause'] {
  return { seq: event.seq, at: event.at, reason };
}
