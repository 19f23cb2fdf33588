import type { UnitName } from '../calculations/for-a-run';
import type { Branch, Exit } from './exit';
import type { PressureSense, Quantity, ReadQuantity, Result } from './quantity';

export interface Caution {
  /** The signal word, by the worst credible outcome (ANSI Z535.6, ISO 3864-2). */
  readonly word: 'danger' | 'warning' | 'caution' | 'notice';
  /** The hazard, what it can do, how to avoid it. */
  readonly text: string;
}

export type Step =
  | StartStep
  | ActionStep
  | ReadingStep
  | ChoiceStep
  | RampStep
  | ListenStep
  | HoldStep
  | WaitStep
  | CodesStep
  | DriveStep
  | PhotoStep
  | ComputeStep
  | CallStep
  | RestoreStep
  | FindingStep;

export type StepKind = Step['kind'];

interface StepBase {
  /** Letters, digits and hyphens; a finding's id is a name, since expressions ask for it. */
  readonly id: string;
  /** As people say it: `11`, `16a`. */
  readonly number: string;
  /** A few words, for the Route and the record. */
  readonly title: string;
  /** The one action, as a sentence. */
  readonly action: string;
  /** The action in a few words, for whoever knows the procedure. Never instead of cautions, limits or waits. */
  readonly short?: string;
  /** Background for whoever wants it; it asks for nothing to be done. */
  readonly notes?: readonly string[];
  /** A template: why, and what to expect. */
  readonly why?: string;
  readonly cautions?: readonly Caution[];
  readonly picture?: StepPicture;
  /** What is taken apart or blocked here, and is put back later on every path. */
  readonly disturbs?: readonly Disturbed[];
  /** The person stays at the car while this step is open; nothing that can wait is said meanwhile. */
  readonly stay?: boolean;
  /** The step is not done before somebody else released it. */
  readonly release?: ReleasePoint;
  /** The step is not done before a second person looked. */
  readonly verify?: Verification;
}

/** Who lets the run go on, and on what evidence. */
export interface ReleasePoint {
  readonly by: 'lead' | 'manager';
  readonly evidence: string;
}

/** A second person's look: afterwards and by themselves, or beside the first one before the act. */
export interface Verification {
  readonly how: 'independent' | 'concurrent';
  readonly what: string;
}

export interface StepPicture {
  readonly sheet: string;
  readonly marks: readonly string[];
  /** Part id -> words beside it. */
  readonly labels?: Readonly<Record<string, string>>;
}

export interface Disturbed {
  readonly item: string;
  /** `dipstick`, as the open list says it. */
  readonly label: string;
  /** The sentence that puts it back. */
  readonly restore: string;
}

interface GoesOn extends StepBase {
  readonly next?: readonly Branch[];
  readonly otherwise: Exit;
  /** Named results that follow from this step, computed when it is done. */
  readonly results?: readonly Result[];
}

interface Measures extends GoesOn {
  /** The honest way out. */
  readonly cannotMeasure: Exit;
}

/** The start card: what must be ready, the cautions that hold throughout, the gear. */
export interface StartStep extends GoesOn {
  readonly kind: 'start';
}

/** Do it, confirm it. */
export interface ActionStep extends GoesOn {
  readonly kind: 'action';
}

export interface ReadingStep extends Measures {
  readonly kind: 'reading';
  readonly reads: readonly ReadQuantity[];
}

/** An observation among options; each option's name is true from then on when it was chosen, else false. */
export interface ChoiceStep extends Measures {
  readonly kind: 'choice';
  readonly name: string;
  readonly several?: boolean;
  readonly options: readonly ChoiceOption[];
}

export interface ChoiceOption {
  readonly name: string;
  readonly label: string;
  /** What to write down when it is chosen. */
  readonly ask?: string;
  /** Whether it contradicts every other option: where several may be true, it stands alone. */
  readonly alone?: boolean;
  /** What it looks like. */
  readonly picture?: StepPicture;
}

interface TakesSeries extends Measures {
  /** The series' name. */
  readonly name: string;
  readonly channels: readonly Channel[];
  /** The gauge pressure to raise to, in the gauge channel's unit; not a limit. */
  readonly target: number;
}

/** A logged series, and what is found in it. */
export interface RampStep extends TakesSeries {
  readonly kind: 'ramp';
  readonly finds: readonly FoundQuantity[];
}

/** A logged series with the marks `noise begins` and `noise stops`, and what is found in it. */
export interface ListenStep extends TakesSeries {
  readonly kind: 'listen';
  readonly finds: readonly Found[];
}

export interface Channel {
  /** The name in the series and in limits. */
  readonly name: 'gauge' | 'manifold' | 'boost' | 'sound';
  readonly label: string;
  readonly unit: UnitName | 'dB';
  readonly sense?: PressureSense;
  /** The gear whose resolution and accuracy it has. */
  readonly gear?: string;
  readonly needed: boolean;
}

/** A step that takes a series. */
export type SeriesStep = RampStep | ListenStep;

/** What a listen step looks for; truths are names that hold or do not, the rest are quantities. */
export type Found = FoundTruth | FoundQuantity;

export interface FoundTruth {
  readonly what: 'noise-heard' | 'noise-stopped';
  readonly name: string;
}

/** What is computed from a series: the change point of its sound, an extreme, or how its sensors follow each other. */
export type FoundQuantity = Quantity & {
  readonly what: 'seal-point' | 'highest-gauge' | 'rise-rate' | 'manifold-gain' | 'boost-gain' | 'worst-gap';
};

/** A timed wait, such as one under pressure, with what is read as it begins and as it ends. */
export interface HoldStep extends Measures {
  readonly kind: 'hold';
  /** A name under which texts say for how long it was held. */
  readonly heldAs?: string;
  readonly seconds: number;
  readonly begins?: readonly ReadQuantity[];
  readonly ends?: readonly ReadQuantity[];
}

/** Wait until something is true of a reading. */
export interface WaitStep extends Measures {
  readonly kind: 'wait';
  readonly reads: readonly ReadQuantity[];
  readonly until: string;
  /** It lasts at least so long, whatever is read. */
  readonly atLeastSeconds?: number;
  readonly meanwhile: string;
}

/** Trouble codes with status and freeze frame. */
export interface CodesStep extends Measures {
  readonly kind: 'codes';
  readonly name: string;
  /** An earlier codes step's name; what is new against it makes `newCodes` true. */
  readonly comparedWith?: string;
  /** The name that is true when a code stands that the earlier step did not have. */
  readonly newCodes?: string;
}

/** A road test: windows to visit, ticked after parking; nothing is entered while driving. */
export interface DriveStep extends Measures {
  readonly kind: 'drive';
  readonly name: string;
  readonly windows: readonly DriveWindow[];
}

export interface DriveWindow {
  readonly name: string;
  readonly label: string;
  readonly what: string;
}

/** A picture kept as evidence. */
export interface PhotoStep extends Measures {
  readonly kind: 'photo';
  readonly name: string;
  /** What it must show, one thing a line. */
  readonly shows: readonly string[];
}

/** Named results shown with formula and numbers; nothing is entered. */
export interface ComputeStep extends GoesOn {
  readonly kind: 'compute';
}

/** Another published procedure, gone through as a part of this one. It starts and restores what it disturbs itself. */
export interface CallStep extends GoesOn {
  readonly kind: 'call';
  readonly procedure: string;
  readonly version: number;
  /** The results of it that this procedure goes on with. */
  readonly takes: readonly TakenResult[];
  /** Where each of its findings leads; a finding that is not named goes on as `otherwise`. */
  readonly finds: readonly CalledFinding[];
}

/** A quantity of a called procedure, under the name that it has here. */
export interface TakenResult extends Quantity {
  /** Its name there; unit and sense are the same. */
  readonly from: string;
}

/** A finding of a called procedure, which is true under a name of this one. */
export interface CalledFinding {
  readonly finding: string;
  readonly name: string;
}

/** Puts back everything that is still disturbed, one by one. */
export interface RestoreStep extends GoesOn {
  readonly kind: 'restore';
}

/** Ends a path. */
export interface FindingStep extends StepBase {
  readonly kind: 'finding';
  /** How it is drawn: as in band, out of band, too close to call, or as one that judges nothing. */
  readonly result: FindingResult;
  /** The verdict as a template. */
  readonly verdict: string;
  readonly cause: readonly Sentence[];
  readonly correction: readonly Sentence[];
  /** One sentence for the customer. */
  readonly customer: readonly Sentence[];
  /** Another procedure's id, to be run next. */
  readonly nextProcedure?: string;
}

/** The three results of a reading. */
export type JudgedResult = 'in' | 'out' | 'too-close';

/** What a finding says: one of the three results, or that nothing was judged. */
export type FindingResult = JudgedResult | 'not-judged';

/** A sentence of a write-up. It is left out when `when` does not hold or a value that it names was never measured. */
export interface Sentence {
  readonly text: string;
  readonly when?: string;
}
