import type { InstrumentKind, PressureSense } from '../document';
import type { UnitName } from '../calculations/for-a-run';

/** What the first event's `prev` is the hash of: which procedure is run, on what, and whether it is real. Never changes. */
export interface RunHeader {
  readonly runId: string;
  readonly procedureId: string;
  readonly version: number;
  /** SHA-256 of the procedure document's canonical JSON, hexadecimal. */
  readonly contentHash: string;
  readonly visitId: string;
  readonly siteId: string;
  /** Practice never passes for work: the kind is in the hash. */
  readonly kind: 'real' | 'practice';
  readonly half?: 'cold' | 'warm';
  readonly pairId?: string;
}

/** One thing that happened. Only ever added. */
export type RunEvent = { [T in RunEventType]: EventOf<T> }[RunEventType];

export interface EventOf<T extends RunEventType> extends EventEnvelope {
  readonly type: T;
  readonly data: RunEventData[T];
}

export interface EventEnvelope {
  readonly runId: string;
  /** From 1, without gaps, within one branch of the run. */
  readonly seq: number;
  /** UUIDv7 made on the device. */
  readonly id: string;
  /** The device's clock, milliseconds since 1970. Order never comes from it. */
  readonly at: number;
  /** Monotonic milliseconds since the run was opened on this device. */
  readonly elapsed: number;
  /** The person's id. */
  readonly actor: string;
  /** The enrolled tablet's id. */
  readonly device: string;
  /** The build that wrote it, and the events' schema. */
  readonly build: string;
  readonly schema: 1;
  /** The hash of the event before; the first event's: of the header. Hexadecimal. */
  readonly prev: string;
  /** SHA-256 of the RFC 8785 canonical JSON of all the rest. Hexadecimal. */
  readonly hash: string;
}

export type RunEventType = keyof RunEventData;

/** An event before the chain gives it its place. */
export type EventDraft = { [T in RunEventType]: { readonly type: T; readonly data: RunEventData[T] } }[RunEventType];

/** How a reading came in. */
export type ReadingSource = 'typed' | 'file' | 'simulated' | 'computed';

/** A figure with the digits that were given: never a JSON number. */
export interface Figure {
  readonly text: string;
  readonly unit: UnitName;
  readonly sense?: PressureSense;
}

/** The instrument as it was when it was chosen: a later calibration does not change an old run. */
export interface InstrumentSnapshot {
  readonly id: string;
  readonly kind: InstrumentKind;
  /** As it is written on it: `G-12`. */
  readonly label: string;
  readonly shows: readonly InstrumentRange[];
  /** The day until which its check holds, `2026-12-10`. */
  readonly dueOn: string;
}

/** What an instrument can show. */
export interface InstrumentRange {
  readonly unit: UnitName;
  readonly sense?: PressureSense;
  readonly low: number;
  readonly high: number;
  /** The step of its display. */
  readonly resolution: number;
  /** Half-width of its stated accuracy (rectangular). */
  readonly accuracy: number;
}

/** The car and the concern as they were when the run was opened. */
export interface VisitSnapshot {
  readonly repairOrder: string;
  readonly vin: string;
  readonly car: string;
  readonly odometer: Figure;
  readonly concern: string;
  readonly codes: readonly string[];
}

/** Why a run was begun although others of the same visit, procedure and half were known. */
export interface BegunAgain {
  readonly because: string;
  /** Those runs, by their ids. */
  readonly besides: readonly string[];
}

export interface TroubleCodeEntry {
  readonly code: string;
  readonly status: 'stored' | 'pending' | 'permanent';
  /** The freeze frame in words or figures, as the scan tool shows it. */
  readonly freezeFrame?: string;
}

/** One value that a decision used, as text with its unit. */
export interface DecisionInput {
  readonly name: string;
  readonly label: string;
  /** A figure's text, or `yes` / `no`, or `not measured`. */
  readonly text: string;
  readonly unit?: UnitName;
  /** Expanded uncertainty (k = 2), decimal text in the same unit. */
  readonly uncertainty?: string;
}

/** Each event type with its data: who emits it, when, and what it supersedes. */
export interface RunEventData {
  /** The first event. Holds what the run starts with, so that it can be read without anything else. */
  opened: {
    readonly visit: VisitSnapshot;
    readonly siteName: string;
    /** The procedure's inputs as resolved from site, visit and defaults, by name. */
    readonly inputs: Readonly<Record<string, Figure & { readonly source: string }>>;
    readonly person: string;
    /** Absent where no other run of the same half was known. */
    readonly again?: BegunAgain;
  };
  /** An instrument was taken for a role; a later one for the same role supersedes it from there on. */
  'gear-chosen': { readonly role: string; readonly instrument: InstrumentSnapshot; readonly overdueBecause?: string };
  /** The first place-keeping mark: a step is now the current one. */
  'step-claimed': { readonly step: string };
  /** The second place-keeping mark: the step's action is done. */
  'step-done': { readonly step: string };
  /** A caution of the step, by its place in the list, was seen and acknowledged. */
  'caution-acknowledged': { readonly step: string; readonly caution: number };
  /** One take of one quantity. Takes of the same claim are averaged; a take after a new claim supersedes the old ones. */
  'reading-recorded': {
    readonly step: string;
    readonly name: string;
    readonly figure: Figure;
    readonly source: ReadingSource;
    /** Which of the quantity's ways; absent when it is read directly. */
    readonly way?: string;
    /** The instrument's id and the step of its display. */
    readonly instrument?: string;
    readonly resolution?: string;
    /** Expanded uncertainty (k = 2) in the same unit; only where it was computed together with the value. */
    readonly uncertainty?: string;
    /** Seconds in the series, for a point of a ramp that was typed. */
    readonly timeS?: number;
  };
  /** A step or one quantity of it cannot be measured; its own exit follows. */
  'not-measurable': { readonly step: string; readonly reason: string };
  'not-applicable': { readonly step: string; readonly reason: string };
  predicted: { readonly step: string; readonly option: string };
  /** A series came in: its samples are a blob of their own, named by hash. */
  'series-recorded': {
    readonly step: string;
    readonly name: string;
    readonly sha256: string;
    readonly bytes: number;
    readonly samples: number;
    readonly durationS: number;
    readonly channels: readonly { readonly name: string; readonly unit: string; readonly column: string }[];
    readonly source: ReadingSource;
    readonly fileName?: string;
    /** What the file's reader could not make sense of: how often, and the first few in words. */
    readonly skipped: number;
    readonly problems: readonly string[];
  };
  /** A mark on a series. A later one with the same name supersedes it. */
  'mark-placed': {
    readonly step: string;
    readonly series: string;
    readonly mark: 'noise-begins' | 'noise-stops';
    readonly timeS: number;
    readonly by: 'tap' | 'pedal' | 'suggested';
  };
  'codes-recorded': { readonly step: string; readonly name: string; readonly codes: readonly TroubleCodeEntry[] };
  'timer-started': { readonly step: string; readonly seconds: number };
  'timer-ended': { readonly step: string; readonly certain: boolean };
  /** The options (or the windows of a road test) that were chosen, and what was asked for beside them. */
  'choice-made': {
    readonly step: string;
    readonly name: string;
    readonly options: readonly string[];
    readonly text?: string;
  };
  'photo-attached': {
    readonly step: string;
    readonly sha256: string;
    readonly bytes: number;
    readonly mediaType: string;
  };
  'note-written': { readonly step: string; readonly text: string };
  'margin-note-written': { readonly step: string; readonly text: string };
  disturbed: { readonly step: string; readonly item: string; readonly label: string };
  restored: { readonly step: string; readonly item: string };
  /** The way that was taken, with the expression, its inputs and why. */
  'branch-taken': {
    readonly step: string;
    readonly to: string;
    /** Which exit: a branch by its place, `thenceforth-N` when its bound was reached, or a named one. */
    readonly exit: string;
    readonly when?: string;
    readonly inputs: readonly DecisionInput[];
    readonly because: string;
    readonly verdict?: string;
    /** Why the person ended the test there, in their words; only on the way out of a stop. */
    readonly reason?: string;
  };
  'branch-overruled': {
    readonly step: string;
    readonly computed: string;
    readonly chosen: string;
    readonly reason: string;
  };
  'step-redone': { readonly step: string; readonly reason: string };
  /** The event with this seq no longer counts; it stays visible. */
  undone: { readonly seq: number; readonly reason: string };
  'lead-called': { readonly step: string; readonly question: string };
  /** Somebody who may let the run go on did so; the actor is who. */
  released: {
    readonly step: string;
    readonly evidence: string;
    readonly by: 'lead' | 'manager';
  };
  'set-aside': { readonly reason: string };
  resumed: {
    readonly from: 'set-aside' | 'stopped' | 'reload' | 'lead-called';
    /** Why it had been stopped, where the person said so. */
    readonly reason?: string;
  };
  'handed-over': { readonly to: string; readonly reason: string };
  /** A value went over a limit. Nothing goes on until it is acknowledged. */
  'limit-exceeded': { readonly step: string; readonly limit: string; readonly name: string; readonly figure: Figure };
  'alert-raised': { readonly step: string; readonly text: string };
  'alert-acknowledged': { readonly seq: number };
  /** *Stop, supply off*. */
  stopped: { readonly step: string; readonly reason: string };
  'version-notice-answered': { readonly version: number; readonly answer: 'go-on' | 'end' };
  'finding-reached': { readonly finding: string; readonly verdict: string };
  /** The write-up as it was kept; `composed` is what the record itself gave. */
  'write-up-written': {
    readonly concern: string;
    readonly cause: string;
    readonly correction: string;
    readonly customer: string;
    readonly edited: readonly ('concern' | 'cause' | 'correction' | 'customer')[];
  };
  closed: { readonly finding: string };
  verified: { readonly step: string; readonly by: string };
  signed: {
    readonly head: string;
    readonly meaning: 'performed' | 'reviewed';
    readonly signature: string;
    readonly key: string;
  };
  amended: { readonly text: string; readonly reason: string };
  joined: { readonly branch: string; readonly head: string };
  'clock-jumped': { readonly byMs: number };
  transcribed: { readonly from: string };
}
