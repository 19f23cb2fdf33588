import type { UnitName } from '../calculations/for-a-run';

/** Gauge and absolute are different kinds: neither is compared with the other. */
export type PressureSense = 'absolute' | 'gauge';

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
  /** How long it stays true; absent: for the whole run. */
  readonly validity?: Validity;
}

/** How long a reading stays true. Once that is over, the reading has no value until it is taken again. */
export interface Validity {
  /** Minutes since it was taken. At least one of the two ends is given. */
  readonly minutes?: number;
  /** Ids of steps whose doing ends it, as starting the engine ends a key-on baseline. */
  readonly until?: readonly string[];
  /** Why, in words: `A warm engine cools.` */
  readonly because: string;
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
