import { layOutGauge, placeEndTexts } from './band-gauge-layout';

describe('layOutGauge', () => {
  it('gives a two-ended band half the line while the value lies near it', () => {
    const layout = layOutGauge({ low: 91.9, high: 95.9, value: 94.2, uncertainty: 0.6 }, 560);
    expect(layout.low).toBeCloseTo(152, 6);
    expect(layout.high).toBeCloseTo(408, 6);
    expect(layout.value).toBeCloseTo(299.2, 6);
    expect([layout.whiskerStart, layout.whiskerEnd].map(Math.round as (x?: number) => number)).toEqual([261, 338]);
    expect(layout.beyond).toBeUndefined();
  });

  it('is the same picture in any unit', () => {
    const kPa = layOutGauge({ low: 1.5, high: 5, value: 7.1, uncertainty: 0.4 }, 400);
    const pa = layOutGauge({ low: 1500, high: 5000, value: 7100, uncertainty: 400 }, 400);
    expect(pa.value).toBeCloseTo(kPa.value!, 6);
    expect(pa.low).toBeCloseTo(kPa.low!, 6);
  });

  it.each([
    ['right', 70],
    ['left', -70],
  ])('lets a value far off point %s at the end of the line, without a whisker', (side, value) => {
    const layout = layOutGauge({ low: 1.5, high: 5, value, uncertainty: 0.4 }, 560);
    expect(layout.beyond).toBe(side);
    expect(layout.value).toBe(side === 'right' ? layout.lineEnd : layout.lineStart);
    expect(layout.whiskerStart).toBeUndefined();
    expect(layout.high! - layout.low!).toBeGreaterThan(100);
  });

  it.each([
    { low: undefined, high: 1.5, value: 0.4 },
    { low: 85, high: undefined, value: 78 },
    { low: 85, high: undefined, value: undefined },
    { low: 93.9, high: 93.95, value: 93.1 },
    { low: 2, high: 2, value: 2 },
  ])('keeps everything on the line for $low to $high with $value', (figures) => {
    const layout = layOutGauge({ ...figures, uncertainty: 0.3 }, 320);
    for (const x of [layout.low, layout.high, layout.value, layout.whiskerStart, layout.whiskerEnd]) {
      if (x === undefined) continue;
      expect(x).toBeGreaterThanOrEqual(layout.lineStart);
      expect(x).toBeLessThanOrEqual(layout.lineEnd);
    }
  });
});

describe('placeEndTexts', () => {
  it('leaves texts over their ends where there is room', () => {
    expect(placeEndTexts({ x: 150, width: 40 }, { x: 400, width: 80 }, 560)).toEqual({ low: 150, high: 400 });
  });

  it.each([
    [100, 104],
    [2, 20],
    [300, 318],
  ])('moves texts at %i and %i apart and keeps them inside', (low, high) => {
    const at = placeEndTexts({ x: low, width: 60 }, { x: high, width: 90 }, 320);
    expect(at.high! - at.low!).toBeGreaterThanOrEqual(75);
    expect(at.low! - 30).toBeGreaterThanOrEqual(0);
    expect(at.high! + 45).toBeLessThanOrEqual(320);
  });
});
