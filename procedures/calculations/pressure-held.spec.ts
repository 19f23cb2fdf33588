import { fellBetween, heldUntil } from './pressure-held';

/** Ten readings a second of a pressure that is drawn by the second. */
function series(pressureKpa: (timeS: number) => number, endS = 30) {
  const timeS = Float64Array.from({ length: endS * 10 }, (_, index) => index / 10);
  return { timeS, value: timeS.map(pressureKpa) };
}

describe('heldUntil', () => {
  it('goes on for as long as asked while the pressure stays or rises', () => {
    expect(
      heldUntil(
        series(() => 3),
        10,
        10,
        0.1,
      ),
    ).toBe(20);
    expect(
      heldUntil(
        series((timeS) => 0.1 * timeS),
        10,
        10,
        0.1,
      ),
    ).toBe(20);
  });

  it('ends where the pressure falls, also on a display of whole kilopascals', () => {
    const falls = (timeS: number) => (timeS < 14 ? 3 : 3 - 0.5 * (timeS - 14));
    expect(Math.abs(heldUntil(series(falls), 10, 10, 0.01) - 14)).toBeLessThan(1);
    expect(
      heldUntil(
        series((timeS) => Math.round(falls(timeS))),
        10,
        10,
        1,
      ),
    ).toBeLessThan(16.1);
  });

  it('does not take the flicker of a display for a fall', () => {
    expect(
      heldUntil(
        series((timeS) => (Math.round(timeS * 10) % 2 === 0 ? 3 : 4)),
        10,
        10,
        1,
      ),
    ).toBe(20);
  });
});

describe('fellBetween', () => {
  it('tells a valve that opened from something else that was heard', () => {
    expect(
      fellBetween(
        series((timeS) => 3 - 2 * Math.max(0, timeS - 10)),
        10,
        10.5,
        0.1,
      ),
    ).toBe(true);
    expect(
      fellBetween(
        series(() => 3),
        10,
        10.5,
        0.1,
      ),
    ).toBe(false);
  });

  it('tells nothing from one reading, nor from a display of whole kilopascals', () => {
    expect(
      fellBetween(
        series(() => 3),
        10,
        10.05,
        0.1,
      ),
    ).toBeUndefined();
    expect(
      fellBetween(
        series(() => 3),
        10,
        10.5,
        1,
      ),
    ).toBeUndefined();
  });
});
