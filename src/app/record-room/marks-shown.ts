import type { SeriesState } from '../../../procedures/engine/showing';
import type { PlotMark } from '../shared/ramp-plot-options';

/** The marks of a series as the plot shows them. */
export function marksShown(marks: SeriesState['marks']): readonly PlotMark[] {
  const begins = marks['noise-begins'];
  const stops = marks['noise-stops'];
  return [
    ...(begins === undefined ? [] : [{ label: 'noise begins', timeS: begins.timeS, isMain: false }]),
    ...(stops === undefined ? [] : [{ label: 'noise stops', timeS: stops.timeS, isMain: true }]),
  ];
}
