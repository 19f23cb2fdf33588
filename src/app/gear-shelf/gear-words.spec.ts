import { accuracyText, dueWords, rangeText, stepText } from './gear-words';

describe('the words of an instrument', () => {
  const gauge = { unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 } as const;

  it('say what it shows, in which steps, how accurately', () => {
    expect(rangeText(gauge)).toBe('0 to 60 kPa gauge');
    expect(stepText(gauge)).toBe('0.1 kPa');
    expect(accuracyText(gauge)).toBe('± 0.25 kPa');
    expect(rangeText({ unit: 'degC', low: -30, high: 60, resolution: 1, accuracy: 1 })).toBe('-30 to 60 °C');
  });

  it.each([
    ['2026-11-03', 'overdue by 29 days', 'overdue'],
    ['2026-12-01', 'overdue by 1 day', 'overdue'],
    ['2026-12-02', 'today is the last day', 'soon'],
    ['2026-12-11', 'in 9 days', 'soon'],
    ['2027-03-10', 'in 98 days', 'fine'],
  ])('say on 2 December that a check due on %s is %s', (dueOn, when, state) => {
    const now = new Date(2026, 11, 2, 9, 0).getTime();
    expect(dueWords(dueOn, now)).toMatchObject({ when, state });
  });

  it('name the day', () => {
    const now = new Date(2026, 11, 2, 9, 0).getTime();
    expect(dueWords('2026-12-10', now).day).toBe('due 10 Dec 2026');
    expect(dueWords('2026-11-03', now).day).toBe('was due 3 Nov 2026');
  });
});
