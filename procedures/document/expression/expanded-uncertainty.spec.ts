import type { Environment } from './environment';
import { expandedUncertaintyOf } from './expanded-uncertainty';
import { parseExpression } from './parse';

type Figures = Readonly<Record<string, readonly [value: number, uncertainty: number]>>;

function uncertaintyOf(source: string, figures: Figures): number {
  const parsed = parseExpression(source);
  if (!parsed.ok) throw new Error(parsed.problem.message);
  const environment: Environment = {
    number: (name) => figures[name]?.[0],
    uncertainty: (name) => figures[name]?.[1],
    truth: () => false,
    result: () => undefined,
    isMeasured: (name) => figures[name] !== undefined,
  };
  return expandedUncertaintyOf(parsed.expression)(environment);
}

// JCGM 100:2008, 5.1.2 with the sensitivities by hand; k = 2 goes through unchanged, being on both sides.
describe('first-order propagation', () => {
  test.each<[string, Figures, number]>([
    ['a - b', { a: [93_900, 300], b: [95_100, 400] }, 500],
    ['a + b', { a: [1, 3], b: [2, 4] }, 5],
    ['-a', { a: [5, 2] }, 2],
    ['2 * a', { a: [5, 2] }, 4],
    ['a + a', { a: [5, 2] }, 4],
    ['a - a', { a: [5, 2] }, 0],
    ['mean(a, b)', { a: [10, 3], b: [20, 4] }, 2.5],
    // 5.1.6: for a product or a quotient the relative parts add in squares.
    ['a * b', { a: [10, 0.3], b: [20, 0.8] }, 200 * Math.hypot(0.03, 0.04)],
    ['a / b', { a: [10, 0.3], b: [20, 0.8] }, 0.5 * Math.hypot(0.03, 0.04)],
    ['abs(a - b)', { a: [10, 3], b: [20, 4] }, 5],
    ['max(a, b)', { a: [10, 3], b: [20, 4] }, 4],
    ['min(a, b)', { a: [10, 3], b: [20, 4] }, 3],
    // At the corner the steeper side counts: a step of a alone moves the result with slope 1 on one side.
    ['abs(a)', { a: [0, 2] }, 2],
    ['max(a, b)', { a: [20, 3], b: [20, 0] }, 3],
    ['absolute(a)', { a: [2_600, 300], stationPressure: [94_000, 400] }, 500],
    ['a + 5', { a: [5, 0] }, 0],
    ['uncertainty(a) * 3', { a: [5, 2] }, 0],
  ])('%s', (source, figures, expected) => {
    expect(uncertaintyOf(source, figures)).toBeCloseTo(expected, 3);
  });

  it('carries the elevation through the standard atmosphere', () => {
    // ISO 2533: dp/dH = -rho g; at 640 m rho = 1.1513 kg/m3, so 10 m are 112.9 Pa.
    expect(uncertaintyOf('standardPressure(elevation)', { elevation: [640, 10] })).toBeCloseTo(112.9, 0);
  });

  it('takes the one side that there is at the end of a range', () => {
    expect(uncertaintyOf('standardPressure(elevation)', { elevation: [11_000, 10] })).toBeGreaterThan(30);
  });

  it('refuses what has no value', () => {
    expect(() => uncertaintyOf('a - b', { a: [1, 1] })).toThrow(RangeError);
  });
});
