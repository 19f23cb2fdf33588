import { linearRegression, linearRegressionLine, median, standardDeviation, sum } from 'simple-statistics';
import { findSealPoint, type RampSample } from '../../procedures/calculations';
import { atMost, type Report } from './budget';
import { longRamp, sumOfColumns } from './long-ramp';
import { measure, timing } from './measure';

const manySamples = 1_000_000;
const stationKpa = 93.9;

function analysed(samples: readonly RampSample[]): number {
  const found = findSealPoint(samples, { stationKpa });
  if (!found.sealed || Math.abs(found.aboveStationKpa - 3.4) > 0.2) throw new Error(JSON.stringify(found));
  return found.aboveStationKpa;
}

/** The ramp analysis: how it grows, beside one pass over its columns and a general statistics library on one column. */
export function benchRamp(): Report {
  const many = longRamp(manySamples);
  const few = longRamp(manySamples / 10);
  const sound = many.map(({ soundDb }) => soundDb ?? 0);
  const points = many.map(({ timeS, mapKpa }) => [timeS, mapKpa]);
  const timings = measure(
    [
      { name: 'ramp analysis, a tenth of the samples', units: few.length, work: () => analysed(few) },
      { name: 'ramp analysis', units: manySamples, work: () => analysed(many) },
      { name: 'one pass of summing all columns', units: manySamples, work: () => sumOfColumns(many) },
      { name: 'one column: sum (simple-statistics)', units: manySamples, work: () => sum(sound) },
      {
        name: 'one column: standard deviation (simple-statistics)',
        units: manySamples,
        work: () => standardDeviation(sound),
      },
      {
        name: 'two columns: line (simple-statistics)',
        units: manySamples,
        work: () => linearRegressionLine(linearRegression(points))(50),
      },
      { name: 'one column: median (simple-statistics)', units: manySamples, work: () => median(sound) },
    ],
    { rounds: 7, warmUp: 2 },
  );
  const [small, large] = [timing(timings, 'ramp analysis, a tenth of the samples'), timing(timings, 'ramp analysis')];
  const pass = timing(timings, 'one pass of summing all columns');
  return {
    timings,
    budgets: [
      atMost('ramp analysis: 1,000,000 samples against one pass of summing', 10, large.perUnitNs / pass.perUnitNs),
      atMost('ramp analysis: cost of 10x the samples', 11, (10 * large.perUnitNs) / small.perUnitNs),
    ],
  };
}
