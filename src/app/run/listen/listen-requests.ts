import type { RunCommand, Series } from '../../../../procedures/engine/showing';
import type { MarkName } from './live-series';
import type { SeriesFacts } from './series-blob';

/** A series that is to be kept with the step. */
export interface SeriesTaken {
  readonly series: Series;
  readonly facts: SeriesFacts;
}

/** The listening is done: what is to be kept and marked first, in this order. */
export interface ListenDone {
  /** The series as it stands, typed or from a file. */
  readonly series: Series;
  /** Marks that are to be placed before it is judged. */
  readonly marks: readonly {
    readonly mark: MarkName;
    readonly timeS: number;
    readonly by: 'tap' | 'suggested';
  }[];
}

/** The step once more, for another log; the one that is left behind stays in the record. */
export function anotherFile(step: string): RunCommand {
  return { do: 'redo', step, reason: 'another file is taken' };
}
