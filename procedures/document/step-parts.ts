import type { ReadQuantity, Result } from './quantity';
import type { Channel, Found, FoundQuantity, FoundTruth, SeriesStep, Step, TakenResult } from './step';

/** A part of a step, and where it stands in it: `reads/0`. */
export interface Placed<T> {
  readonly part: T;
  /** JSON pointer from the step, without a leading slash. */
  readonly pointer: string;
}

/** What a step takes as readings, in the order in which they are taken. */
export function placedReadsOf(step: Step): readonly Placed<ReadQuantity>[] {
  switch (step.kind) {
    case 'reading':
    case 'wait':
      return placed(step.reads, 'reads');
    case 'hold':
      return [...placed(step.begins ?? [], 'begins'), ...placed(step.ends ?? [], 'ends')];
    default:
      return [];
  }
}

export function readsOf(step: Step): readonly ReadQuantity[] {
  return placedReadsOf(step).map(({ part }) => part);
}

export function isSeriesStep(step: Step): step is SeriesStep {
  return step.kind === 'listen' || step.kind === 'ramp';
}

/** What a step looks for in its series. */
export function findsOf(step: Step): readonly Found[] {
  return isSeriesStep(step) ? step.finds : [];
}

export function isFoundQuantity(found: Found): found is FoundQuantity {
  return 'unit' in found;
}

export function isFoundTruth(found: Found): found is FoundTruth {
  return !('unit' in found);
}

/** The channels of a step's series. */
export function channelsOf(step: Step): readonly Channel[] {
  return isSeriesStep(step) ? step.channels : [];
}

/** What a step computes when it is done. */
export function resultsOf(step: Step): readonly Result[] {
  return step.kind === 'finding' ? [] : (step.results ?? []);
}

/** What a step takes over from the procedure that it calls. */
export function takenOf(step: Step): readonly TakenResult[] {
  return step.kind === 'call' ? step.takes : [];
}

function placed<T>(parts: readonly T[], field: string): readonly Placed<T>[] {
  return parts.map((part, index) => ({ part, pointer: `${field}/${index}` }));
}
