import * as fc from 'fast-check';
import { jStat } from 'jstat';
import { expandedUncertainty, judge } from '../../../procedures/calculations';
import { between, expectClose, readings, thousands } from './runs';

describe('expandedUncertainty', () => {
  it('adds the variances of uniform distributions and of the mean of repeats, by jstat', () => {
    fc.assert(
      fc.property(
        readings(0.001, 100),
        readings(0.001, 100),
        readings(0, 100),
        fc.integer({ min: 1, max: 1000 }),
        (accuracy, resolution, repeatDeviation, repeats) => {
          const variance =
            jStat.uniform.variance(-accuracy, accuracy) +
            jStat.uniform.variance(0, resolution) +
            repeatDeviation ** 2 / repeats;
          const found = expandedUncertainty({ accuracy, resolution, repeatDeviation, repeats });
          expectClose(found / (2 * Math.sqrt(variance)), 1, 1e-12);
        },
      ),
      thousands,
    );
  });
});

describe('judge', () => {
  // JCGM 106:2012, 8.3.2: with a guard band of U = 2 u the risk at the acceptance limit is at most 2.3 %.
  const risk = jStat.normal.cdf(-2, 0, 1);

  it('accepts and rejects with a risk of 2.3 % for each edge at most, by the normal distribution of jstat', () => {
    const seen = { in: 0, out: 0, 'too-close': 0 };
    fc.assert(
      fc.property(readings(-10, 10), readings(0.01, 3), readings(-8, 0), readings(0, 8), (value, U, low, high) => {
        const verdict = judge({ value, uncertainty: U, low, high });
        const conforms = jStat.normal.cdf(high, value, U / 2) - jStat.normal.cdf(low, value, U / 2);
        seen[verdict]++;
        if (verdict === 'in') expect(conforms).toBeGreaterThanOrEqual(1 - 2 * risk - 1e-9);
        if (verdict === 'out') expect(conforms).toBeLessThanOrEqual(risk + 1e-9);
      }),
      thousands,
    );
    expect(Math.min(...Object.values(seen))).toBeGreaterThan(200);
  });

  it('with one edge says exactly which side of 2.3 % the probability is on', () => {
    fc.assert(
      fc.property(readings(-10, 10), readings(0.01, 3), readings(-8, 8), (value, U, high) => {
        const conforms = jStat.normal.cdf(high, value, U / 2);
        fc.pre(Math.abs(Math.abs(high - value) - U) > 1e-9);
        const byProbability = conforms > 1 - risk ? 'in' : conforms < risk ? 'out' : 'too-close';
        expect(judge({ value, uncertainty: U, high })).toBe(byProbability);
      }),
      thousands,
    );
  });

  it('does not change when everything is moved and stretched', () => {
    fc.assert(
      fc.property(
        readings(-10, 10),
        readings(0, 3),
        readings(-8, 0),
        readings(0, 8),
        between(1, 3),
        (y, U, l, h, by) => {
          const margins = [y - l - U, y - l + U, h - y - U, h - y + U];
          fc.pre(margins.every((margin) => Math.abs(margin) > 1e-9));
          const moved = judge({ value: y * by + 7, uncertainty: U * by, low: l * by + 7, high: h * by + 7 });
          expect(moved).toBe(judge({ value: y, uncertainty: U, low: l, high: h }));
        },
      ),
      thousands,
    );
  });
});
