import { clockText, readHold } from './hold-clock';

const hold = { startedAt: 5_000_000, startedElapsed: 10_000, seconds: 30 };

describe('readHold', () => {
  it('counts by the monotonic clock', () => {
    const reading = readHold(hold, { elapsed: 22_000, loadedElapsed: 0, clockBackMs: 0 });
    expect(reading).toEqual({ leftS: 18, isOver: false, isCertain: true });
  });

  it('is over at the second, and stays at nothing left', () => {
    expect(readHold(hold, { elapsed: 40_000, loadedElapsed: 0, clockBackMs: 0 })).toMatchObject({
      leftS: 0,
      isOver: true,
    });
    expect(readHold(hold, { elapsed: 90_000, loadedElapsed: 0, clockBackMs: 0 }).leftS).toBe(0);
  });

  it('is not certain when the clock was set back while the app was closed over the hold', () => {
    expect(readHold(hold, { elapsed: 22_000, loadedElapsed: 15_000, clockBackMs: 60_000 }).isCertain).toBe(false);
  });

  it('is certain when the clock was set back before the hold was started', () => {
    expect(readHold(hold, { elapsed: 22_000, loadedElapsed: 9_000, clockBackMs: 60_000 }).isCertain).toBe(true);
  });

  it('is certain after a reload with a clock that went on as it should', () => {
    expect(readHold(hold, { elapsed: 22_000, loadedElapsed: 15_000, clockBackMs: 0 }).isCertain).toBe(true);
  });
});

describe('clockText', () => {
  it.each([
    [30, '0:30'],
    [29.2, '0:30'],
    [0, '0:00'],
    [61, '1:01'],
    [600, '10:00'],
  ])('%p s is %p', (seconds, text) => {
    expect(clockText(seconds)).toBe(text);
  });
});
