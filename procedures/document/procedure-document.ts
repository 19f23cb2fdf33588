import type { UnitName } from '../calculations';

/**
 * The procedure document: what a lead authors, a version freezes and a run walks. Plain JSON, validated by
 * `procedure-document.schema.json` beside this file. Expressions are text in the language of `expression/`;
 * templates are text in which `{name}` stands for a value of the run.
 */
export interface ProcedureDocument {
  /** The format's own version; a later one stays readable beside this. */
  readonly format: 1;
  /** Lower-case words joined by hyphens; the same over all versions. */
  readonly id: string;
  readonly title: string;
  readonly purpose: string;
  readonly system: string;
  readonly appliesTo: AppliesTo;
  readonly expectedMinutes: number;
  /** Whether every step is marked, or the procedure is consulted. */
  readonly useLevel: 'every-step' | 'consulted';
  /** Whether a run is one half, cold or warm, of a pair. */
  readonly pair?: boolean;
  readonly gear: readonly GearNeed[];
  readonly inputs: readonly ProcedureInput[];
  /** Names of the drawn sheets whose parts the steps mark. */
  readonly pictures: readonly string[];
  readonly references: readonly string[];
  /** Whose instructions come first. */
  readonly deference: string;
  readonly start: StartCard;
  readonly limits: readonly Limit[];
  readonly stop: StopSheet;
  /** The first one is where a run begins; order is the reading order, not the way. */
  readonly steps: readonly Step[];
}

/** By what a procedure is found: what can be seen or measured, and codes; never by the part suspected. */
export interface AppliesTo {
  readonly codes: readonly string[];
  readonly symptoms: readonly string[];
  readonly engine: readonly string[];
}

/** A kind of instrument that the procedure needs, under the role by which steps name it. */
export interface GearNeed {
  readonly role: string;
  readonly kind: InstrumentKind;
  readonly label: string;
  /** Whether a run can do without it (one of several ways needs it). */
  readonly optional?: boolean;
  /** What it must be able to show; absent for gear that shows no number. */
  readonly shows?: {
    readonly unit: UnitName;
    readonly low: number;
    readonly high: number;
    /** The coarsest step with which the bands can still be judged. */
    readonly resolution: number;
  };
}

export type InstrumentKind = 'pressure-gauge' | 'scan-tool' | 'listening-probe' | 'barometer' | 'thermometer';

/** A named figure that a run starts with. */
export interface ProcedureInput {
  readonly name: string;
  readonly label: string;
  readonly unit: UnitName;
  readonly sense?: PressureSense;
  /** Where it comes from: the site's or the visit's own field, or the procedure's default. */
  readonly from: 'site.elevation' | 'visit.displacement' | 'default';
  /** Decimal text, used where `from` is `default` or the field is empty. */
  readonly default?: string;
  /** Who says so; a default without a published source says "common practice, no source". */
  readonly source: string;
}

/** Gauge and absolute are different kinds: neither is compared with the other. */
export type PressureSense = 'absolute' | 'gauge';

/** What gates the first step. */
export interface StartCard {
  readonly prerequisites: readonly string[];
  /** At most three acts, to be known by heart. */
  readonly stopActions: readonly string[];
  readonly people: string;
  /** Cautions that hold throughout, one screen each. */
  readonly throughout: readonly Caution[];
}

export interface Caution {
  /** The signal word, by the worst credible outcome (ANSI Z535.6, ISO 3864-2). */
  readonly word: 'danger' | 'warning' | 'caution' | 'notice';
  /** The hazard, what it can do, how to avoid it. */
  readonly text: string;
}

/** A condition that holds all through a run. */
export interface Limit {
  readonly id: string;
  /** An expression over the one name `gauge`, a gauge pressure. */
  readonly holds: string;
  /** The quantities and channels that are held against it; an absolute one is first reduced by `stationPressure`. */
  readonly of: readonly string[];
  readonly says: string;
  readonly then: string;
}

/** What *Stop, supply off* shows and where a stopped run goes on if it does not go back. */
export interface StopSheet {
  readonly makeSafe: readonly string[];
  /** The step from which the work is put back in order. */
  readonly exit: Exit;
}

/** A way on. */
export interface Exit {
  /** A step's id, or `verdict`: the finding that an earlier exit named. */
  readonly to: string;
  readonly because: string;
  /** The finding (its step's id) that the run now heads for; it takes effect when the way reaches `verdict`. */
  readonly verdict?: string;
}

/** A way on under a condition; the first that holds is taken. */
export interface Branch extends Exit {
  readonly when: string;
  /** How often one run may take it; then `thenceforth` is taken instead. Every way back needs it. */
  readonly atMost?: number;
  readonly thenceforth?: Exit;
}

/** What a reading, a ramp or a computation gives a name to. */
export interface Quantity {
  /** The name in expressions: letters and digits, first letter small. */
  readonly name: string;
  readonly label: string;
  readonly unit: UnitName;
  readonly sense?: PressureSense;
  readonly band?: Band;
}

/** The acceptance range of a quantity. */
export interface Band {
  /** Expressions in the quantity's kind; at least one end. */
  readonly low?: string;
  readonly high?: string;
  /** The band is judged only where this holds. */
  readonly when?: string;
  /** What is said where it does not. */
  readonly unjudged?: string;
  readonly source: string;
}

/** A quantity that a person reads off an instrument. */
export interface ReadQuantity extends Quantity {
  /** The gear's role; its resolution and accuracy make the uncertainty. */
  readonly gear?: string;
  /** What can be believed, in `unit`: a value outside is refused. */
  readonly plausible: { readonly low: number; readonly high: number };
  /** How often it is taken; the mean counts. At most 5. */
  readonly takes?: number;
  /** Other ways to know the same quantity; where given, one of them is chosen. */
  readonly ways?: readonly EntryWay[];
}

/** One way to know a quantity that is not read directly. */
export interface EntryWay {
  readonly id: string;
  readonly label: string;
  readonly hint: string;
  /** What is entered; absent when nothing is (an input alone gives it). */
  readonly entry?: {
    readonly name: string;
    readonly label: string;
    readonly unit: UnitName;
    readonly sense?: PressureSense;
    readonly plausible: { readonly low: number; readonly high: number };
    readonly gear?: string;
  };
  /** The quantity as an expression of the entry and the inputs. */
  readonly is: string;
  /** The expanded uncertainty (k = 2), an expression; absent: from the entry's instrument. */
  readonly uncertainty?: string;
}

/** A named result of an expression, shown with its formula and numbers. */
export interface Result extends Quantity {
  readonly is: string;
}

export type Step =
  | StartStep
  | ActionStep
  | ReadingStep
  | ChoiceStep
  | ListenStep
  | HoldStep
  | WaitStep
  | CodesStep
  | DriveStep
  | ComputeStep
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
  /** A template: why, and what to expect. */
  readonly why?: string;
  readonly cautions?: readonly Caution[];
  readonly picture?: StepPicture;
  /** What is taken apart or blocked here, and is put back later on every path. */
  readonly disturbs?: readonly Disturbed[];
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
}

/** A logged series with the marks `noise begins` and `noise stops`, and what is found in it. */
export interface ListenStep extends Measures {
  readonly kind: 'listen';
  /** The series' name. */
  readonly name: string;
  readonly channels: readonly Channel[];
  /** The gauge pressure to raise to, in the gauge channel's unit; not a limit. */
  readonly target: number;
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

/** What a listen step looks for; truths are names that hold or do not, the rest are quantities. */
export type Found =
  | { readonly what: 'noise-heard' | 'noise-stopped'; readonly name: string }
  | (Quantity & {
      readonly what: 'seal-point' | 'highest-gauge' | 'manifold-gain' | 'boost-gain' | 'worst-gap';
    });

/** A timed wait under pressure. */
export interface HoldStep extends Measures {
  readonly kind: 'hold';
  readonly seconds: number;
}

/** Wait until something is true of a reading. */
export interface WaitStep extends Measures {
  readonly kind: 'wait';
  readonly reads: readonly ReadQuantity[];
  readonly until: string;
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
  readonly windows: readonly { readonly name: string; readonly label: string; readonly what: string }[];
}

/** Named results shown with formula and numbers; nothing is entered. */
export interface ComputeStep extends GoesOn {
  readonly kind: 'compute';
}

/** Puts back everything that is still disturbed, one by one. */
export interface RestoreStep extends GoesOn {
  readonly kind: 'restore';
}

/** Ends a path. */
export interface FindingStep extends StepBase {
  readonly kind: 'finding';
  /** How it is drawn: as in band, out of band, or too close to call. */
  readonly result: JudgedResult;
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

/** A sentence of a write-up. It is left out when `when` does not hold or a value that it names was never measured. */
export interface Sentence {
  readonly text: string;
  readonly when?: string;
}
