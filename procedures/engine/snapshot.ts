import type { CompiledProcedure } from '../document';
import { canonicalJson } from './canonical-json';
import { contentHash, headerHash } from './chain';
import type { ReplayResult } from './refusal';
import { replay } from './replay';
import type { RunEvent, RunHeader } from './run-event';
import type { RunState } from './run-state';
import { sha256Hex } from './sha256';
import { count, objectOf, text } from './shape';

/** The form of `RunState` that snapshots hold. It is counted up whenever a member of the state changes. */
export const snapshotFormat = 4;

/**
 * A state kept so that a replay need not begin at the start: a copy that can be thrown away, never the truth. JSON;
 * bound to the document, the run, the build that computed it and the chain's head after its last event.
 */
export interface RunSnapshot {
  readonly format: number;
  /** Another build may compute another value from the same events: its snapshot is not used. */
  readonly build: string;
  /** SHA-256 of the document's canonical JSON, hexadecimal. */
  readonly contentHash: string;
  /** SHA-256 of the header's canonical JSON, hexadecimal. */
  readonly headerHash: string;
  /** The last event that the state holds, from 1. */
  readonly seq: number;
  /** That event's hash. */
  readonly head: string;
  readonly state: RunState;
  /** SHA-256 of the canonical JSON of all the rest: a damaged copy is not used. */
  readonly hash: string;
}

/** Why a snapshot is not used, for a log: the replay begins at the start then, which gives the same. */
export interface SnapshotProblem {
  readonly code:
    'malformed' | 'other-format' | 'other-build' | 'other-document' | 'other-run' | 'damaged' | 'other-chain';
  /** In words, a clause without a full stop. */
  readonly what: string;
}

export type SnapshotReading =
  { readonly ok: true; readonly state: RunState } | { readonly ok: false; readonly problem: SnapshotProblem };

/** A snapshot of a state that `replay` gave; `build` names the code that did. */
export function takeSnapshot(state: RunState, build: string): RunSnapshot {
  const rest = {
    format: snapshotFormat,
    build,
    contentHash: state.header.contentHash,
    headerHash: headerHash(state.header),
    seq: state.seq,
    head: state.head,
    state: JSON.parse(JSON.stringify(state)) as RunState,
  };
  return { ...rest, hash: sha256Hex(canonicalJson(rest)) };
}

/** Where a snapshot has to come from to be used. */
export interface SnapshotPlace {
  readonly procedure: CompiledProcedure;
  readonly header: RunHeader;
  readonly build: string;
}

/** The state of a snapshot, as `replay` would give it; or why it is not used. Never throws on what JSON can hold. */
export function readSnapshot({ procedure, header, build }: SnapshotPlace, value: unknown): SnapshotReading {
  const refused = (code: SnapshotProblem['code'], what: string): SnapshotReading => ({
    ok: false,
    problem: { code, what },
  });
  const odd = snapshotShape(value, 'the snapshot');
  if (odd !== undefined) return refused('malformed', odd);
  const snapshot = value as RunSnapshot;
  if (snapshot.format !== snapshotFormat) {
    return refused('other-format', `the snapshot has the form ${snapshot.format}, this build reads ${snapshotFormat}`);
  }
  if (snapshot.build !== build) return refused('other-build', `the snapshot was computed by ${snapshot.build}`);
  if (snapshot.contentHash !== contentHash(procedure.authored)) {
    return refused('other-document', 'the snapshot belongs to another procedure or version');
  }
  if (snapshot.headerHash !== headerHash(header)) return refused('other-run', 'the snapshot belongs to another run');
  const { hash, ...rest } = snapshot;
  const { seq, head, state } = rest;
  if (hash !== sha256Hex(canonicalJson(rest)) || state.seq !== seq || state.head !== head) {
    return refused('damaged', 'the snapshot was changed after it was taken');
  }
  return { ok: true, state: { ...absent, ...state, ...currentOf(state) } };
}

/**
 * The state after all of a run's events: on from the snapshot where it holds, else from the start. Equal to
 * `replay(procedure, header, events)`, but that events before the snapshot are not read again: their chain was checked
 * when it was taken.
 */
export function replayFrom(place: SnapshotPlace, events: readonly RunEvent[], snapshot: unknown): SnapshotReplay {
  const read = readSnapshot(place, snapshot);
  const fromStart = (problem: SnapshotProblem): SnapshotReplay => ({
    from: 0,
    problem,
    result: replay(place.procedure, place.header, events),
  });
  if (!read.ok) return fromStart(read.problem);
  const { seq, head } = read.state;
  if (events[seq - 1]?.hash !== head) {
    return fromStart({ code: 'other-chain', what: `event ${seq} is not the one that the snapshot was taken after` });
  }
  return { from: seq, result: replay(place.procedure, place.header, events.slice(seq), read.state) };
}

export interface SnapshotReplay {
  /** How many events the snapshot spared; 0 where it was not used. */
  readonly from: number;
  /** Why it was not used. */
  readonly problem?: SnapshotProblem;
  readonly result: ReplayResult;
}

/** JSON leaves out what is undefined; a state that was read has the same members as one that was computed. */
const absent = {
  current: undefined,
  due: undefined,
  verdict: undefined,
  finding: undefined,
  overruled: undefined,
  alarm: undefined,
  pause: undefined,
  writeUp: undefined,
} satisfies Partial<RunState>;

function currentOf({ current }: RunState): Partial<Pick<RunState, 'current'>> {
  return current === undefined ? {} : { current: { ...current, timer: current.timer } };
}

const snapshotShape = objectOf({
  format: count,
  build: text,
  contentHash: text,
  headerHash: text,
  seq: count,
  head: text,
  state: (value, at) => (typeof value === 'object' && value !== null ? undefined : `${at} is no object`),
  hash: text,
});
