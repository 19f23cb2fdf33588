import type { CompiledProcedure, ProcedureDocument } from '../document';
import { unitKind } from '../calculations/for-a-run';
import { brokenLink, contentHash, headerHash } from './chain';
import { exceedLimit, overrule, reachFinding, redo } from './apply-detours';
import {
  acknowledge,
  chooseGear,
  disturb,
  keepPhoto,
  makeChoice,
  recordCodes,
  restore,
  runTimer,
} from './apply-entries';
import { applyRelease, applyVerification } from './apply-second-person';
import { placeMark, recordReading, recordSeries, undo } from './apply-readings';
import { amendClaim, claimStep, finishStep, requireCurrent, takeBranch } from './apply-walk';
import { own } from './environment';
import { problemWithHeader, problemWithShape } from './event-shape';
import { parseDecimal } from './figures';
import { RefusedEvent, type Refusal, type ReplayResult } from './refusal';
import { requireGoing } from './require-going';
import type { EventOf, RunEvent, RunHeader } from './run-event';
import type { RunState } from './run-state';
import { draftOf, type StateDraft } from './state-changes';

/**
 * The run after one more event. Total and deterministic: whatever the event holds, it gives a state or a refusal that
 * names the event and why; it never throws on what JSON can hold. Order comes from seq and the chain alone; a value
 * that this build computes differently is a discrepancy, never a refusal.
 */
export function applyEvent(
  procedure: CompiledProcedure,
  header: RunHeader,
  state: RunState | undefined,
  event: RunEvent,
): ReplayResult {
  const seq = (state?.seq ?? 0) + 1;
  const refused = (code: Refusal['code'], what: string): ReplayResult => {
    const id: unknown = typeof event === 'object' ? (event as RunEvent | null)?.id : undefined;
    return { ok: false, refusal: { seq, ...(typeof id === 'string' ? { id } : {}), code, what } };
  };
  const odd = (state === undefined ? problemWithHeader(header) : undefined) ?? problemWithShape(event);
  if (odd !== undefined) return refused('malformed', `event ${seq} cannot be read: ${odd}`);
  const broken = brokenLink(header, event, seq, state?.head ?? headerHash(header));
  if (broken !== undefined) return refused('chain', broken);
  try {
    const next = state === undefined ? open(procedure, header, event) : reduceEvent(procedure, state, event);
    return { ok: true, state: placed(state, next, event) };
  } catch (error) {
    if (error instanceof RefusedEvent) return refused(error.code, error.message);
    // RangeError: a figure of the event is outside of what its calculation allows.
    if (error instanceof RangeError) return refused('malformed', error.message);
    throw error;
  }
}

/** The state as of the event that led to it. A reducer gives the state before, or a new one that nobody has seen. */
export function placed(before: RunState | undefined, next: RunState, event: RunEvent): RunState {
  const state = next === before ? draftOf(next) : (next as StateDraft);
  state.seq = event.seq;
  state.head = event.hash;
  state.lastAt = event.at;
  return state;
}

function open(procedure: CompiledProcedure, header: RunHeader, event: RunEvent): RunState {
  if (event.type !== 'opened') throw new RefusedEvent('not-opened', 'the first event must open the run');
  const { document, authored } = procedure;
  if (document.id !== header.procedureId || contentHash(authored) !== header.contentHash) {
    throw new RefusedEvent('other-procedure', 'the run was opened on another procedure or version');
  }
  requireInputs(document, event);
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
    due: document.steps[0]?.id,
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
    photos: {},
    clockJumps: [],
    overruled: undefined,
    branchCounts: {},
    exceeded: [],
    alarm: undefined,
    pause: undefined,
    writeUp: undefined,
    discrepancies: [],
  };
}

/** Every input of the procedure has to be there, as a figure of its own kind: conditions are evaluated on them. */
function requireInputs({ inputs }: ProcedureDocument, { data }: EventOf<'opened'>): void {
  for (const { name, unit } of inputs) {
    const given = own(data.inputs, name);
    if (given === undefined) throw new RefusedEvent('malformed', `the input ${name} is missing`);
    if (parseDecimal(given.text) === undefined || unitKind(given.unit) !== unitKind(unit)) {
      throw new RefusedEvent('malformed', `the input ${name} is no figure in ${unit}`);
    }
  }
}

/** The same without shape and chain: for events that have no place in it yet. Throws `RefusedEvent` and `RangeError`. */
export function reduceEvent(procedure: CompiledProcedure, state: RunState, event: RunEvent): RunState {
  requireGoing(state, event);
  switch (event.type) {
    case 'opened':
      throw new RefusedEvent('opened-twice', 'the run was opened already');
    case 'gear-chosen':
      return chooseGear(procedure, state, event);
    case 'step-claimed':
      return claimStep(procedure, state, event);
    case 'step-done':
      return finishStep(procedure, state, event);
    case 'caution-acknowledged':
      return acknowledge(procedure, state, event);
    case 'reading-recorded':
      return recordReading(procedure, state, event);
    case 'not-measurable':
    case 'not-applicable':
      requireCurrent(state, event.data.step);
      return amendClaim(state, { notMeasured: true, notMeasuredBecause: event.data.reason });
    case 'series-recorded':
      return recordSeries(procedure, state, event);
    case 'mark-placed':
      return placeMark(procedure, state, event);
    case 'photo-attached':
      return keepPhoto(procedure, state, event);
    case 'released':
      return applyRelease(procedure, state, event);
    case 'verified':
      return applyVerification(procedure, state, event);
    case 'codes-recorded':
      return recordCodes(procedure, state, event);
    case 'timer-started':
    case 'timer-ended':
      return runTimer(state, event);
    case 'choice-made':
      return makeChoice(procedure, state, event);
    case 'clock-jumped':
      return { ...state, clockJumps: [...state.clockJumps, { seq: event.seq, byMs: event.data.byMs }] };
    case 'disturbed':
      return disturb(procedure, state, event);
    case 'restored':
      return restore(state, event);
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
      if (state.alarm?.seq !== event.data.seq) {
        throw new RefusedEvent('unknown-name', `no limit was exceeded at event ${event.data.seq} that still waits`);
      }
      return { ...state, alarm: undefined };
    case 'finding-reached':
      return reachFinding(procedure, state, event);
    case 'write-up-written':
      return { ...state, writeUp: event.data };
    case 'closed':
      if (state.finding === undefined || state.finding !== event.data.finding)
        throw new RefusedEvent('not-done', 'the run has not reached that finding');
      if (state.disturbed.length > 0) throw new RefusedEvent('still-disturbed', 'something disturbed is not restored');
      return { ...state, status: 'closed', current: undefined };
    case 'signed':
      return { ...state, status: 'signed' };
    default:
      // Kept and shown, without an effect on the state: notes, predictions, notices.
      return state;
  }
}

function pauseOf(event: RunEvent, reason: string): RunState['pause'] {
  return { seq: event.seq, at: event.at, reason };
}
