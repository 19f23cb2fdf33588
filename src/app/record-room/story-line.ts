import type { UnitName } from '../../../procedures/calculations/for-a-run';
import type { Channel, Step } from '../../../procedures/document';
import type {
  NamedValue,
  RunEventData,
  RunEventType,
  SeriesState,
  TroubleCodeEntry,
} from '../../../procedures/engine/showing';
import type { ShownResult } from '../shared/result-words';

/** A run retold for a reader: what happened, claim by claim. */
export interface Story {
  readonly passages: readonly Passage[];
  /** Where the retelling had to end because an event does not fit; absent when it came through. */
  readonly brokenOff?: { readonly seq: number; readonly what: string };
}

/** One claim of one step with all that happened until the next claim. */
export interface Passage {
  /** The seq of the event that began it; an anchor for citations. */
  readonly seq: number;
  readonly at: number;
  /** Absent for what happened before the first step was claimed. */
  readonly step?: Step;
  readonly result?: ShownResult;
  /** The step that called the procedure which this one belongs to, the innermost; absent for the run's own steps. */
  readonly within?: Step;
  /** Whether the step was left before it was done, or the way to it was overruled. */
  readonly isLeft: boolean;
  readonly lines: readonly StoryLine[];
}

export type StoryLine = ValueLine | SeriesLine | PointsLine | PhotoLine | CodesLine | WayLine | SaidLine;

interface LineBase {
  readonly seq: number;
  readonly at: number;
}

/** A quantity got its value. */
export interface ValueLine extends LineBase {
  readonly kind: 'value';
  readonly value: NamedValue;
  /** The texts of the single takes, with their unit, where there was more than one. */
  readonly takes: readonly string[];
  /** When a later value took its place. */
  readonly takenAgainAt?: number;
}

/** A series came in; the marks are those that stood when the step was left. */
export interface SeriesLine extends LineBase {
  readonly kind: 'series';
  readonly record: RunEventData['series-recorded'];
  readonly marks: SeriesState['marks'];
}

/** Points that were typed into a ramp and are in no kept series: they stay to be read, and do not count. */
export interface PointsLine extends LineBase {
  readonly kind: 'points';
  readonly points: readonly TypedPoint[];
  /** Those placed in the same claim. */
  readonly marks: SeriesState['marks'];
}

export interface TypedPoint {
  readonly seq: number;
  /** Seconds from the start of the ramp. */
  readonly timeS: number;
  /** The channel's name. */
  readonly channel: Channel['name'];
  readonly text: string;
  readonly unit: UnitName;
  readonly isTakenBack: boolean;
}

/** A photo was kept. */
export interface PhotoLine extends LineBase {
  readonly kind: 'photo';
  readonly record: RunEventData['photo-attached'];
}

export interface CodesLine extends LineBase {
  readonly kind: 'codes';
  readonly codes: readonly TroubleCodeEntry[];
  /** The earlier reading of codes that these are compared with. */
  readonly before?: readonly TroubleCodeEntry[];
}

export interface WayLine extends LineBase {
  readonly kind: 'way';
  readonly way: RunEventData['branch-taken'];
  /** The step or finding that it leads to. */
  readonly to?: Step;
  /** The finding that the run heads for from here on, where this way says so. */
  readonly verdict?: Step;
  /** Where the conditions led, in words, when a person chose this way instead. */
  readonly insteadOf?: string;
}

/** How loud a line is: `out` something went wrong, `live` something is or was open, `plain` the rest. */
export type Tone = 'plain' | 'live' | 'out';

export interface SaidLine extends LineBase {
  readonly kind: 'said';
  readonly type: RunEventType;
  readonly tone: Tone;
  /** What happened, a few words. */
  readonly what: string;
  /** The person's own words or the particulars. */
  readonly words?: string;
  /** The id of the person whom it is about. */
  readonly person?: string;
}
