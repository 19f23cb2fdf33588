import type { SeriesStep } from '../../../../procedures/document';
import type { RunState } from '../../../../procedures/engine/showing';
import type { PlotMark } from '../../shared/ramp-plot-options';
import type { MarkName } from './live-series';

const words: Readonly<Record<MarkName, string>> = { 'noise-begins': 'noise begins', 'noise-stops': 'noise stops' };

/** Marks that are being moved: where they stand now, and what is said there; one without a time is away. */
export type MovedMarks = Partial<
  Record<MarkName, { readonly timeS: number | undefined; readonly label?: string | undefined }>
>;

/** The step's marks for the plot, with those that are being moved in their new places. */
export function plotMarks(state: RunState, step: SeriesStep, moved: MovedMarks = {}): readonly PlotMark[] {
  const marks = state.series[step.name]?.marks ?? {};
  return (['noise-begins', 'noise-stops'] as const).flatMap((mark) => {
    const change = moved[mark];
    const timeS = change === undefined ? marks[mark]?.timeS : change.timeS;
    if (timeS === undefined) return [];
    return [{ label: change?.label ?? words[mark], timeS, isMain: mark === 'noise-stops' }];
  });
}
