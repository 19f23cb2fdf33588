import { withoutBursts } from './without-bursts';

/** Ten samples a second. */
const seriesOf = (values: number[]) => ({
  timeS: Float64Array.from(values, (_, index) => index / 10),
  value: Float64Array.from(values),
});
const repeat = (level: number, count: number) => Array.from({ length: count }, () => level);

describe('withoutBursts', () => {
  it('cuts what is short and stands out, and leaves edges where they are', () => {
    const values = [...repeat(60, 20), ...repeat(50, 10), ...repeat(70, 8), ...repeat(50, 20)];
    expect([...withoutBursts(seriesOf(values), 1, 4)]).toEqual([...repeat(60, 20), ...repeat(50, 38)]);
  });

  it('leaves what lasts, and what does not stand out', () => {
    const lasts = [...repeat(50, 20), ...repeat(70, 15), ...repeat(50, 20)];
    const low = [...repeat(50, 20), 53, ...repeat(50, 20)];
    for (const values of [lasts, low]) expect([...withoutBursts(seriesOf(values), 1, 4)]).toEqual(values);
  });
});
