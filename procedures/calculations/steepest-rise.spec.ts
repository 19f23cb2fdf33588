import { steepestRise } from './steepest-rise';

/** A sample a second, raised by so much in each. */
const ramp = (...rises: readonly number[]) => {
  let gaugeKpa = 0;
  return [{ timeS: 0, gaugeKpa }, ...rises.map((rise, s) => ({ timeS: s + 1, gaugeKpa: (gaugeKpa += rise) }))];
};
const times = (count: number, rise: number): readonly number[] => Array.from({ length: count }, () => rise);

describe('steepestRise', () => {
  it('is the slope of an even ramp', () => {
    expect(steepestRise(ramp(...times(40, 0.15)))?.kpaPerS).toBeCloseTo(0.15, 12);
  });

  it('finds the ten seconds in which it rose fastest', () => {
    const found = steepestRise(ramp(...times(20, 0.1), ...times(12, 0.3), ...times(20, 0.05)));
    expect(found?.kpaPerS).toBeCloseTo(0.3, 12);
    expect(found).toMatchObject({ fromS: 20, toS: 30 });
  });

  it('spreads a jump of one second over ten', () => {
    expect(steepestRise(ramp(...times(15, 0.1), 1.1, ...times(15, 0.1)))?.kpaPerS).toBeCloseTo(0.2, 12);
  });

  it('takes the whole of a ramp that is shorter, and nothing from less than two seconds', () => {
    expect(steepestRise(ramp(0.2, 0.2, 0.5))?.kpaPerS).toBeCloseTo(0.3, 12);
    expect(steepestRise(ramp(0.2))).toBeUndefined();
    expect(steepestRise([])).toBeUndefined();
  });

  it('passes over what has no gauge, and reads times of any distance', () => {
    const samples = [
      { timeS: 0, gaugeKpa: 0 },
      { timeS: 3 },
      { timeS: 12, gaugeKpa: 2.4 },
      { timeS: 30, gaugeKpa: 4.2 },
    ];
    expect(steepestRise(samples)).toEqual({ kpaPerS: expect.closeTo(0.2, 12) as number, fromS: 0, toS: 12 });
  });

  it('is below zero where the pressure only fell', () => {
    expect(steepestRise(ramp(...times(12, -0.1)))?.kpaPerS).toBeCloseTo(-0.1, 12);
  });

  it('refuses what is no number and a clock that runs backwards', () => {
    const good = ramp(...times(12, 0.1));
    expect(() => steepestRise([...good, { timeS: 13, gaugeKpa: NaN }])).toThrow('gaugeKpa of sample 13 is NaN');
    expect(() => steepestRise([...good, { timeS: 11, gaugeKpa: 1 }])).toThrow(
      'timeS of sample 13 is 11; allowed: 12 or more',
    );
    expect(() => steepestRise([{ timeS: -Infinity, gaugeKpa: 1 }, ...good])).toThrow('timeS of sample 0 is -Infinity');
  });
});
