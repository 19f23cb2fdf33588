import { type ChannelQuantity } from './channel-quantity';

/** One channel of a log. */
export interface LogChannel {
  /** The name as the file has it, without the unit. */
  readonly name: string;
  /** The unit as `convert` names it, or as the file has it where the table has none; undefined when it gives none. */
  readonly unit: string | undefined;
  /** What it measures, where the name tells. */
  readonly quantity: ChannelQuantity | undefined;
}

/** Something in a log that could not be read. */
export interface LogProblem {
  /** Number of the line in the file, from 1. */
  readonly line: number;
  /** What is wrong, in plain words. */
  readonly what: string;
}

/** A log as `parseScanLog` reads it. */
export interface ScanLog {
  readonly channels: readonly LogChannel[];
  /** Seconds from the first sample, 0, rising. */
  readonly timeS: readonly number[];
  /** values[channel][sample] in the channel's unit; undefined where there was none. */
  readonly values: readonly (readonly (number | undefined)[])[];
  readonly problems: readonly LogProblem[];
}

/** What a person knows about a file that it does not say itself. */
export interface LogHints {
  /** The character between the cells. */
  readonly delimiter?: string | undefined;
  readonly decimalMark?: '.' | ',' | undefined;
  /** The unit of a time column of plain numbers: s, ms, min or h. */
  readonly timeUnit?: 's' | 'ms' | 'min' | 'h' | undefined;
}
