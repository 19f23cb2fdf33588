import * as fc from 'fast-check';
import { judge, type JudgedReading } from './decision';

const anyValue = fc.double({ min: -1000, max: 1000, noNaN: true });
const width = fc.double({ min: 0, max: 500, noNaN: true });

describe('judge', () => {
  it('puts a value that touches the inner boundary in and one that touches the outer boundary too close', () => {
    const band = { uncertainty: 0.5, low: 2, high: 4 };
    const verdicts = [1.25, 1.5, 2, 2.25, 2.5, 3, 3.5, 3.75, 4.5, 4.75].map((value) => judge({ value, ...band }));
    expect(verdicts).toEqual([
      'out',
      'too-close',
      'too-close',
      'too-close',
      'in',
      'in',
      'in',
      'too-close',
      'too-close',
      'out',
    ]);
  });

  it('judges decimals as the whole numbers of their last digit', () => {
    const digits = fc.integer({ min: -2000, max: 2000 });
    const widths = fc.integer({ min: 0, max: 400 });
    fc.assert(
      fc.property(
        digits,
        widths,
        digits,
        widths,
        fc.constantFrom(10, 100, 1000),
        (value, uncertainty, low, wide, by) => {
          const whole = judge({ value, uncertainty, low, high: low + wide });
          const [high, tenths] = [
            (low + wide) / by,
            { value: value / by, uncertainty: uncertainty / by, low: low / by },
          ];
          expect(judge({ ...tenths, high })).toBe(whole);
        },
      ),
      { numRuns: 5000 },
    );
    // 2.3 - 2 is 0.2999999999999998 in doubles.
    expect(judge({ value: 2.3, uncertainty: 0.3, low: 2, high: 3 })).toBe('in');
    expect(judge({ value: 1.7, uncertainty: 0.3, low: 2, high: 3 })).toBe('too-close');
  });

  it('needs no second edge', () => {
    expect(judge({ value: 509.7, uncertainty: 17.2, low: 490 })).toBe('in');
    expect(judge({ value: 216, uncertainty: 15, high: 200 })).toBe('out');
  });

  it('never calls a reading in when its band is narrower than twice the uncertainty', () => {
    fc.assert(
      fc.property(
        anyValue,
        anyValue,
        width,
        fc.double({ min: 1.0001, max: 10, noNaN: true }),
        (value, low, wide, factor) => {
          fc.pre(wide > 1e-6);
          expect(judge({ value, low, high: low + wide, uncertainty: (factor * wide) / 2 })).not.toBe('in');
        },
      ),
    );
  });

  it('keeps a clear verdict when the uncertainty shrinks', () => {
    fc.assert(
      fc.property(
        anyValue,
        anyValue,
        width,
        width,
        fc.double({ min: 0, max: 1, noNaN: true }),
        (value, low, wide, uncertainty, part) => {
          const verdict = judge({ value, low, high: low + wide, uncertainty });
          fc.pre(verdict !== 'too-close');
          expect(judge({ value, low, high: low + wide, uncertainty: uncertainty * part })).toBe(verdict);
        },
      ),
    );
  });

  it('is the same seen in a mirror', () => {
    fc.assert(
      fc.property(anyValue, anyValue, width, width, (value, low, wide, uncertainty) => {
        const high = low + wide;
        expect(judge({ value: -value, low: -high, high: -low, uncertainty })).toBe(
          judge({ value, low, high, uncertainty }),
        );
      }),
    );
  });

  it.each<[JudgedReading, string]>([
    [{ value: NaN, uncertainty: 0, low: 1 }, 'value is NaN'],
    [{ value: 1, uncertainty: -0.1, low: 1 }, 'uncertainty is -0.1; allowed: 0 or more'],
    [{ value: 1, uncertainty: 0, low: 3, high: 2 }, 'high is 2; allowed: 3 or more'],
    [{ value: 1, uncertainty: 0, low: -Infinity }, 'low is -Infinity'],
    [{ value: 1, uncertainty: 0 }, 'low and high are undefined'],
  ])('refuses %p', (reading, message) => {
    expect(() => judge(reading)).toThrow(RangeError);
    expect(() => judge(reading)).toThrow(message);
  });
});
