import * as fc from 'fast-check';
import { fallRate, overpressureAt, timeLeft } from './emptying';
import { flowFunction } from './orifice';

const overpressure = fc.double({ min: -9, max: 2, noNaN: true }).map((power) => 10 ** power);

describe('the emptying curve', () => {
  it('falls at the rate of the orifice flow', () => {
    fc.assert(
      fc.property(overpressure, (q) => {
        expect(Math.abs(fallRate(q) / ((1 + q) * flowFunction(1 + q, 1, 1.4)) - 1)).toBeLessThan(1e-6);
      }),
    );
    // Near nothing the ratio of the pressures has lost its figures, so the closer bound holds away from it.
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 100, noNaN: true }), (q) => {
        expect(Math.abs(fallRate(q) / ((1 + q) * flowFunction(1 + q, 1, 1.4)) - 1)).toBeLessThan(1e-12);
      }),
    );
  });

  it('has that rate as its slope', () => {
    fc.assert(
      fc.property(overpressure, (q) => {
        const step = 1e-5 * q;
        const slope = (2 * step) / (timeLeft(q + step) - timeLeft(q - step));
        expect(Math.abs(slope / fallRate(q) - 1)).toBeLessThan(1e-8);
      }),
    );
  });

  it('comes back to the overpressure it started from', () => {
    fc.assert(
      fc.property(overpressure, (q) => {
        expect(Math.abs(overpressureAt(timeLeft(q)) / q - 1)).toBeLessThan(1e-13);
      }),
      { numRuns: 2000 },
    );
  });

  it('has nothing left where there is no overpressure', () => {
    expect([timeLeft(0), timeLeft(-0.1), overpressureAt(0), overpressureAt(-1), fallRate(0), fallRate(-1)]).toEqual([
      0, 0, 0, 0, 0, 0,
    ]);
  });
});
