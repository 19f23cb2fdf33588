import type { FindingResult, JudgedResult, PressureSense } from '../document';
import type { UnitName } from '../calculations/for-a-run';
import type {
  BegunAgain,
  DecisionInput,
  Figure,
  InstrumentSnapshot,
  ReadingSource,
  RunEventData,
  RunHeader,
  TroubleCodeEntry,
  VisitSnapshot,
} from './run-event';

/** What a run is after its events: derived by `replay`, never stored as truth. JSON-serialisable. */
export interface RunState {
  readonly header: RunHeader;
  readonly status: 'open' | 'set-aside' | 'stopped' | 'lead-called' | 'closed' | 'signed';
  /** Of the last event. */
  readonly seq: number;
  readonly head: string;
  readonly openedAt: number;
  readonly lastAt: number;
  readonly openedBy: string;
  readonly personName: string;
  readonly visit: VisitSnapshot;
  readonly siteName: string;
  /** Why it was begun beside others of the same half. */
  readonly again?: BegunAgain;
  readonly inputs: Readonly<Record<string, Figure & { readonly source: string }>>;
  /** The claimed step; absent once a finding is reached. */
  readonly current: CurrentStep | undefined;
  /** The step to be claimed or the finding to be reached next: where a way led that was taken, or a step taken again. */
  readonly due: string | undefined;
  /** Every claim in order, the current one included. */
  readonly walked: readonly WalkedStep[];
  /** The latest of each named quantity. */
  readonly values: Readonly<Record<string, NamedValue>>;
  /** Options chosen, windows visited, noise heard: names that hold or do not. */
  readonly truths: Readonly<Record<string, NamedTruth>>;
  /** The finding that the way heads for. */
  readonly verdict: string | undefined;
  /** The finding that was reached. */
  readonly finding: string | undefined;
  readonly gear: Readonly<Record<string, ChosenInstrument>>;
  /** What is apart, the latest first: the order in which it goes back. */
  readonly disturbed: readonly DisturbedItem[];
  readonly series: Readonly<Record<string, SeriesState>>;
  readonly codes: Readonly<Record<string, CodesState>>;
  readonly choices: Readonly<Record<string, ChoiceState>>;
  /** Of each photo step, by its name, the photos that were kept. */
  readonly photos: Readonly<Record<string, PhotosState>>;
  /** When the device's clock was set, and by how much (milliseconds, forward is positive). */
  readonly clockJumps: readonly { readonly seq: number; readonly byMs: number }[];
  /** A step whose way is being overruled: its next `branch-taken` is the person's choice. */
  readonly overruled: string | undefined;
  /** How often each bounded branch was taken: `step/next-N` -> count. */
  readonly branchCounts: Readonly<Record<string, number>>;
  /** Every limit that was exceeded, in order; what broke it does not count as a reading. */
  readonly exceeded: readonly LimitAlarm[];
  /** A limit was exceeded and not yet acknowledged. */
  readonly alarm: LimitAlarm | undefined;
  /** Set while the run is stopped or set aside: when, by whom, why. */
  readonly pause: { readonly seq: number; readonly at: number; readonly reason: string } | undefined;
  readonly writeUp: RunEventData['write-up-written'] | undefined;
  /** What this build computes differently from what an event says; recorded, never a reason to refuse. */
  readonly discrepancies: readonly Discrepancy[];
}

export interface CurrentStep {
  readonly id: string;
  readonly claimedSeq: number;
  readonly claimedAt: number;
  /** Who claimed it. */
  readonly claimedBy: string;
  /** Who let the run go on from here, and who looked a second time. */
  readonly releasedBy?: string;
  readonly verifiedBy?: string;
  /** Of the step's cautions, by place, those acknowledged in this claim. */
  readonly acknowledged: readonly number[];
  /** Takes recorded in this claim: name -> decimal texts. */
  readonly takes: Readonly<Record<string, readonly Take[]>>;
  readonly timer:
    | {
        readonly startedAt: number;
        readonly startedElapsed: number;
        readonly seconds: number;
        readonly ended: boolean;
        readonly certain: boolean;
      }
    | undefined;
  /** `step-done` was written: only the way on is missing. */
  readonly isDone: boolean;
}

export interface Take {
  readonly seq: number;
  readonly text: string;
  readonly unit: UnitName;
  readonly source: ReadingSource;
  readonly way?: string;
  readonly timeS?: number;
}

export interface WalkedStep {
  readonly step: string;
  readonly claimedSeq: number;
  readonly claimedAt: number;
  readonly doneSeq?: number;
  readonly doneAt?: number;
  /** The worst result among what was judged here, or the finding's own, for the Route's bead. */
  readonly result?: FindingResult;
  /** For how long it was held, where its clock ran to the end. */
  readonly heldSeconds?: number;
  readonly notMeasured?: boolean;
  /** Why it was not, in the person's words. */
  readonly notMeasuredBecause?: string;
  /** The finding that the run headed for when the step was claimed. */
  readonly verdictBefore?: string;
  /** The claim was left without being done: by redoing another step, or because the way to it was overruled. */
  readonly isLeft?: boolean;
  readonly way?: BranchTaken;
}

export interface BranchTaken {
  readonly seq: number;
  readonly to: string;
  readonly exit: string;
  readonly when?: string;
  readonly inputs: readonly DecisionInput[];
  readonly because: string;
  readonly verdict?: string;
  /** Why the person ended the test there; only on the way out of a stop. */
  readonly reason?: string;
}

/** A quantity of the run, in base units (Pa, K, s, ...) beside the text it was given as. */
export interface NamedValue {
  readonly name: string;
  readonly label: string;
  /** In base units. */
  readonly value: number;
  /** Expanded, k = 2, in base units. */
  readonly uncertainty: number;
  /** Rounded to what its resolution or uncertainty carries, in `unit`. */
  readonly text: string;
  readonly uncertaintyText: string;
  readonly unit: UnitName;
  readonly sense?: PressureSense;
  readonly step: string;
  readonly seq: number;
  readonly at: number;
  readonly source: ReadingSource;
  readonly way?: string;
  readonly takes: number;
  /** Sample standard deviation of the takes, in base units; 0 for one. */
  readonly spread: number;
  readonly judgement?: Judgement;
  /** Set once it no longer holds: expressions see no value until it is taken again. */
  readonly stale?: { readonly seq: number; readonly because: string };
}

export interface Judgement {
  /** Absent when the band's condition did not hold; then `unjudged` says why. */
  readonly result?: JudgedResult;
  /** The band's ends in base units and as text in the value's unit. */
  readonly low?: number;
  readonly high?: number;
  readonly lowText?: string;
  readonly highText?: string;
  readonly unjudged?: string;
  /** What the verdict was guarded by, base units: the value's uncertainty and that of the band's ends together. */
  readonly guard: number;
  readonly source: string;
}

export interface NamedTruth {
  readonly holds: boolean;
  readonly step: string;
  readonly seq: number;
}

export type ChosenInstrument = InstrumentSnapshot & {
  readonly seq: number;
  /** Why it was used though its check had run out. */
  readonly overdueBecause?: string;
};

export interface DisturbedItem {
  readonly item: string;
  readonly label: string;
  readonly restore: string;
  readonly step: string;
  readonly seq: number;
}

export interface SeriesState {
  readonly step: string;
  readonly seq: number;
  /** Absent while marks are placed and points are typed, before the series is kept. */
  readonly record?: RunEventData['series-recorded'];
  readonly marks: Readonly<
    Partial<
      Record<'noise-begins' | 'noise-stops', { readonly timeS: number; readonly seq: number; readonly by: string }>
    >
  >;
}

export interface CodesState {
  readonly step: string;
  readonly seq: number;
  readonly codes: readonly TroubleCodeEntry[];
}

export interface ChoiceState {
  readonly step: string;
  readonly seq: number;
  readonly options: readonly string[];
  readonly labels: readonly string[];
  readonly text?: string;
}

export interface PhotosState {
  readonly step: string;
  readonly seq: number;
  readonly photos: readonly {
    readonly seq: number;
    readonly sha256: string;
    readonly mediaType: string;
  }[];
}

export interface LimitAlarm {
  readonly seq: number;
  readonly step: string;
  readonly limit: string;
  readonly name: string;
  readonly figure: Figure;
  readonly says: string;
  readonly then: string;
}

export interface Discrepancy {
  readonly seq: number;
  readonly what: string;
  readonly recorded: string;
  readonly computed: string;
}
