import type { Environment } from '../../expression/environment';
import { numberPart } from '../../expression/number-part';
import { parseExpression } from '../../expression/parse';
import {
  Dice,
  ExpressionAuthor,
  kinds,
  unitsOf,
  valueRange,
  type Want,
} from '../../expression/testing/random-expression';
import { intervalOf, type Interval } from './interval';

/** A part of what each name can be, so that the intervals are not all alike. */
function rangesFor(dice: Dice): ReadonlyMap<string, Interval> {
  return new Map(
    Object.keys(kinds).flatMap((name): [string, Interval][] => {
      const range = valueRange[name === 'stationPressure' ? 'absolute' : (/^[a-z]+/.exec(name)?.[0] ?? '')];
      if (range === undefined) return [];
      const [low = 0, high = 0] = [dice.between(range), dice.between(range)].sort((a, b) => a - b);
      return [[name, { low, high }]];
    }),
  );
}

it('holds every value that an expression takes while its names stay in their ranges, over 1,500 random ones', () => {
  let bounded = 0;
  let checked = 0;
  for (let seed = 1; seed <= 1_500; seed += 1) {
    const dice = new Dice(seed);
    const { ours } = new ExpressionAuthor(dice).quantity(dice.pick(Object.keys(unitsOf) as Want[]), 4);
    const parsed = parseExpression(ours);
    if (!parsed.ok) continue;
    const ranges = rangesFor(dice);
    const of = (name: string): Interval => ranges.get(name) ?? { low: Number.NaN, high: Number.NaN };
    const { low, high } = intervalOf(parsed.expression, of);
    if (Number.isFinite(low) && Number.isFinite(high)) bounded += 1;
    const slack = 1e-9 * Math.max(Math.abs(low), Math.abs(high), 1);
    const part = numberPart(parsed.expression);
    for (let drawn = 0; drawn < 20; drawn += 1) {
      const values = new Map([...ranges].map(([name, range]) => [name, dice.between([range.low, range.high])]));
      const environment: Environment = {
        number: (name) => values.get(name),
        truth: () => false,
        result: () => undefined,
        uncertainty: () => undefined,
        isMeasured: () => true,
      };
      const value = part(environment);
      if (value === undefined) continue;
      checked += 1;
      const isWithin = value >= low - slack && value <= high + slack;
      expect([seed, ours, value, low, high, isWithin]).toEqual([seed, ours, value, low, high, true]);
    }
  }
  expect(checked).toBeGreaterThan(15_000);
  // It is no use to say that everything is possible.
  expect(bounded).toBeGreaterThan(900);
});

it('is as narrow as its parts allow', () => {
  const interval = (source: string, ranges: Readonly<Record<string, Interval>>): Interval => {
    const parsed = parseExpression(source);
    if (!parsed.ok) throw new Error(parsed.problem.message);
    return intervalOf(parsed.expression, (name) => ranges[name] ?? { low: 0, high: 0 });
  };
  const ranges = { a: { low: -1, high: 3 }, b: { low: 2, high: 4 } };
  expect(interval('a + b', ranges)).toEqual({ low: 1, high: 7 });
  expect(interval('a - b', ranges)).toEqual({ low: -5, high: 1 });
  expect(interval('a * b', ranges)).toEqual({ low: -4, high: 12 });
  expect(interval('a / b', ranges)).toEqual({ low: -0.5, high: 1.5 });
  expect(interval('b / a', ranges)).toEqual({ low: Number.NEGATIVE_INFINITY, high: Number.POSITIVE_INFINITY });
  expect(interval('abs(a)', ranges)).toEqual({ low: 0, high: 3 });
  expect(interval('max(a, b)', ranges)).toEqual({ low: 2, high: 4 });
  expect(interval('min(a, b)', ranges)).toEqual({ low: -1, high: 3 });
  expect(interval('mean(a, b)', ranges)).toEqual({ low: 0.5, high: 3.5 });
});
