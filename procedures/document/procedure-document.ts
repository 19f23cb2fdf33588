import type { UnitName } from '../calculations/for-a-run';
import type { Exit } from './exit';
import type { PressureSense } from './quantity';
import type { Caution, Step } from './step';

export type * from './exit';
export type * from './quantity';
export type * from './step';

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

/** What gates the first step. */
export interface StartCard {
  readonly prerequisites: readonly string[];
  /** At most three acts, to be known by heart. */
  readonly stopActions: readonly string[];
  readonly people: string;
  /** Cautions that hold throughout, one screen each. */
  readonly throughout: readonly Caution[];
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
