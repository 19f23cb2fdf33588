import type { SeriesStep } from '../../../../procedures/document';
import type { RunState } from '../../../../procedures/engine';
import type { PlotMark } from '../../shared/ramp-plot-options';
import type { MarkName } from './live-series';

const words: Readonly<Record<MarkName, string>> = { 'noise-begins': 'noise begins', 'noise-stops': 'noise stops' };

/** The step's marks for the plot, with a mark that is being moved in its new place. */
export function plotMarks(
  state: RunState,
  step: SeriesStep,
  moved?: { readonly mark: MarkName; readonly timeS: number; readonly label?: string },
): readonly PlotMark[] {
  const marks = state.series[step.name]?.marks ?? {};
  return (['noise-begins', 'noise-stops'] as const).flatMap((mark) => {
    const timeS = moved?.mark === mark ? moved.timeS : marks[mark]?.timeS;
    if (timeS === undefined) return [];
    const label = (moved?.mark === mark ? moved.label : undefined) ?? words[mark];
    return [{ label, timeS, isMain: mark === 'noise-stops' }];
  });
}
