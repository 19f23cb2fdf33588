import { loudRuns } from './loud-runs';

const levels = { loudDb: 60, quietDb: 50, scatterDb: 1 };
const runsOf = (values: number[], isLeftOut: (index: number) => boolean = () => false) =>
  loudRuns(Float64Array.from(values), 0, values.length, levels, isLeftOut).map(({ from, to }) => [from, to]);
const repeat = (level: number, count: number) => Array.from({ length: count }, () => level);

describe('loudRuns', () => {
  it('gives the stretches in which it is loud', () => {
    expect(runsOf([...repeat(60, 5), ...repeat(50, 4), ...repeat(61, 3), ...repeat(49, 5)])).toEqual([
      [0, 5],
      [9, 12],
    ]);
    expect(runsOf(repeat(50, 6))).toEqual([]);
    expect(runsOf(repeat(70, 6))).toEqual([[0, 6]]);
  });

  it('is not moved by a value between the levels, but by the nearer one at an edge', () => {
    expect(runsOf([...repeat(50, 5), 55.4, ...repeat(50, 5)])).toEqual([]);
    expect(runsOf([...repeat(60, 5), 57, ...repeat(50, 5)])).toEqual([[0, 6]]);
    expect(runsOf([...repeat(80, 5), 53, ...repeat(50, 5)])).toEqual([[0, 5]]);
  });

  it('tells nothing from what is left out', () => {
    const cough = [...repeat(60, 5), ...repeat(50, 4), ...repeat(75, 3), ...repeat(50, 4)];
    expect(runsOf(cough, (index) => cough[index] === 75)).toEqual([[0, 5]]);
  });
});
