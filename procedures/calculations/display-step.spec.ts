import { displayUncertainty, scatterBehindDisplay } from './display-step';
import { seededRandom } from '../../test/support/ramps/seeded-random';

describe('displayUncertainty', () => {
  it('is a step over the root of twelve where nothing scatters (JCGM 100:2008, F.2.2.1)', () => {
    expect(displayUncertainty(1, 0)).toBeCloseTo(0.28867513, 8);
    expect(displayUncertainty(0.1, 0)).toBeCloseTo(0.028867513, 9);
    expect(displayUncertainty(0, 0.05)).toBe(0);
  });

  it('goes on from there and falls as the scatter grows', () => {
    expect(displayUncertainty(1, 1e-3)).toBeCloseTo(0.2887, 2);
    expect(displayUncertainty(1, 0.5)).toBeLessThan(0.002);
  });

  it.each([0.05, 0.1, 0.2, 0.35, 0.6])(
    'is what the means of many readings err by at a scatter of %d steps',
    (scatter) => {
      const random = seededRandom(7);
      const readings = 4000;
      let squares = 0;
      const places = 200;
      for (let place = 0; place < places; place++) {
        const truth = (place + 0.5) / places;
        let sum = 0;
        for (let reading = 0; reading < readings; reading++) sum += Math.round(truth + random.normal(scatter));
        squares += (sum / readings - truth) ** 2;
      }
      // What the finite number of readings adds is below 0.01 of a step.
      expect(Math.abs(Math.sqrt(squares / places) - displayUncertainty(1, scatter))).toBeLessThan(0.012);
    },
  );
});

describe('scatterBehindDisplay', () => {
  it.each([0.05, 0.1, 0.2, 0.35, 0.6])('finds a scatter of %d steps in a slow rise', (scatter) => {
    const random = seededRandom(11);
    const value = Float64Array.from({ length: 20_000 }, (_, index) => Math.round(index / 500 + random.normal(scatter)));
    const found = scatterBehindDisplay({ timeS: value, value }, 0, value.length, 1);
    expect(Math.abs(found / scatter - 1)).toBeLessThan(0.2);
  });
});
