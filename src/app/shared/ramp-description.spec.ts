import { describeRamp } from './ramp-description';

describe('describeRamp', () => {
  it('says in words what the drawing shows', () => {
    const series = {
      timeS: [0, 1, 2],
      channels: [
        { name: 'gauge' as const, unit: 'kPa', values: [0, 4.26, 2] },
        { name: 'sound' as const, unit: 'dB', values: [undefined, -40, -60] },
        { name: 'boost' as const, unit: 'kPa', values: [undefined, undefined, undefined] },
      ],
    };
    expect(describeRamp(series, [{ label: 'noise stops', timeS: 1.5 }], { gauge: 'Gauge' })).toBe(
      '3 samples over 2 s; Gauge from 0 to 2 kPa, highest 4.3; sound from -40 to -60 dB, highest -40; noise stops at 1.5 s',
    );
  });

  it('says that there is nothing yet', () => {
    expect(describeRamp({ timeS: [], channels: [] }, [], {})).toBe('No samples yet');
  });
});
