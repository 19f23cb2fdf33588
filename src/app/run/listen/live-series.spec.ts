import type { ListenStep } from '../../../../procedures/document';
import type { RunEvent, Take } from '../../../../procedures/engine';
import { raised, riseRate, risesOf, seriesOfTakes, stepsFor, timeBase, valueAt } from './live-series';

const step: ListenStep = {
  id: 'raise',
  number: '11',
  title: 'Raise',
  kind: 'listen',
  action: 'Raise the pressure.',
  name: 'ramp',
  target: 10,
  finds: [],
  channels: [
    { name: 'gauge', label: 'Gauge', unit: 'kPa', sense: 'gauge', needed: true },
    { name: 'manifold', label: 'Manifold', unit: 'kPa', sense: 'absolute', needed: false },
  ],
  otherwise: { to: 'next', because: 'done' },
  cannotMeasure: { to: 'next', because: 'not done' },
};
const take = (timeS: number, text: string): Take => ({ seq: 1, text, unit: 'kPa', source: 'typed', timeS });
const event = (seq: number, elapsed: number, type: string, data: object): RunEvent =>
  ({ seq, elapsed, type, data }) as unknown as RunEvent;

describe('seriesOfTakes', () => {
  it('puts typed points on one rising time axis, with gaps where a channel was not typed', () => {
    const series = seriesOfTakes(step, {
      gauge: [take(0, '0.0'), take(4, '0.5')],
      manifold: [take(2, '94.1')],
    });
    expect(series).toEqual({
      timeS: [0, 2, 4],
      channels: [
        { name: 'gauge', unit: 'kPa', values: [0, undefined, 0.5] },
        { name: 'manifold', unit: 'kPa', values: [undefined, 94.1, undefined] },
      ],
    });
  });

  it('has no channel that was never typed', () => {
    expect(seriesOfTakes(step, {})).toEqual({ timeS: [], channels: [] });
  });
});

describe('risesOf', () => {
  it('counts absolute pressures from their first value, and leaves the gauge and gaps as they are', () => {
    const series = {
      timeS: [0, 1, 2],
      channels: [
        { name: 'gauge' as const, unit: 'kPa', values: [0, 0.5, 1] },
        { name: 'manifold' as const, unit: 'kPa', values: [94, undefined, 95] },
      ],
    };
    expect(risesOf(series, step).channels.map(({ values }) => values)).toEqual([
      [0, 0.5, 1],
      [0, undefined, 1],
    ]);
  });
});

describe('timeBase', () => {
  it('is the moment of the first point or mark of this claim', () => {
    const events = [
      event(1, 1_000, 'reading-recorded', { timeS: 0 }),
      event(5, 9_000, 'step-claimed', {}),
      event(6, 12_500, 'mark-placed', { timeS: 2.5 }),
    ];
    expect(timeBase(events, 5)).toBe(10_000);
  });

  it('is unknown before the first one', () => {
    expect(timeBase([event(1, 1_000, 'reading-recorded', {})], 0)).toBeUndefined();
  });
});

describe('stepsFor', () => {
  it.each([
    [0.1, [0.1, 0.5, 1]],
    [0.2, [0.2, 0.6, 1]],
    [0.5, [0.5, 1]],
    [1, [1, 2, 5]],
  ])('offers steps that a display of %p can show', (resolution, steps) => {
    expect(stepsFor(resolution)).toEqual(steps);
  });
});

describe('raised', () => {
  it('keeps the decimals of the display', () => {
    expect(raised('2.9', 0.1, 0.1)).toBe('3.0');
    expect(raised('2', 1, 1)).toBe('3');
    expect(raised('0.20', 0.05, 0.05)).toBe('0.25');
  });
});

describe('riseRate', () => {
  it('is taken over at least four seconds', () => {
    const series = {
      timeS: [0, 2, 6],
      channels: [{ name: 'gauge' as const, unit: 'kPa', values: [0, 0.2, 0.9] }],
    };
    expect(riseRate(series)).toBeCloseTo(0.175, 10);
  });

  it('is unknown while the points are too close together', () => {
    const series = { timeS: [0, 2], channels: [{ name: 'gauge' as const, unit: 'kPa', values: [0, 0.2] }] };
    expect(riseRate(series)).toBeUndefined();
  });
});

describe('valueAt', () => {
  const series = {
    timeS: [0, 1, 2],
    channels: [{ name: 'gauge' as const, unit: 'kPa', values: [0, undefined, 4] }],
  };

  it('reads between the samples that are known', () => {
    expect(valueAt(series, 'gauge', 1)).toBe(2);
    expect(valueAt(series, 'gauge', 2)).toBe(4);
  });

  it('says nothing outside of them', () => {
    expect(valueAt(series, 'gauge', 3)).toBeUndefined();
    expect(valueAt(series, 'boost', 1)).toBeUndefined();
  });
});
