import { clockTime, daysUntil, dayTime, howLong } from './time-words';

const now = new Date(2026, 11, 2, 9, 5).getTime();

describe('time words', () => {
  it('says times of the day with two digits for the minutes', () => {
    expect(clockTime(now)).toBe('9:05');
  });

  it.each([
    [new Date(2026, 11, 2, 7, 55), 'today 7:55'],
    [new Date(2026, 11, 1, 23, 59), 'yesterday 23:59'],
    [new Date(2026, 10, 12), '12 Nov'],
    [new Date(2025, 10, 12), '12 Nov 2025'],
  ])('says when %s was', (date, words) => {
    expect(dayTime(date.getTime(), now)).toBe(words);
  });

  it.each([
    [59_999, 'under a minute'],
    [6 * 60_000, '6 min'],
    [2 * 3_600_000, '2 h'],
    [49 * 3_600_000, '2 days'],
  ])('says how long %i ms are', (ms, words) => {
    expect(howLong(ms)).toBe(words);
  });

  it('counts days to a date, negative once it has passed', () => {
    expect(['2026-12-11', '2026-12-02', '2026-11-30'].map((day) => daysUntil(day, now))).toEqual([9, 0, -2]);
  });
});
