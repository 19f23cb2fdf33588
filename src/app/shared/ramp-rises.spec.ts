import type { Series } from '../../../procedures/engine';
import { risesAbove } from './ramp-rises';

const series: Series = {
  timeS: [0, 1],
  channels: [
    { name: 'gauge', unit: 'kPa', values: [0, 3.4] },
    { name: 'manifold', unit: 'kPa', values: [93.9, 97.3] },
    { name: 'boost', unit: 'hPa', values: [undefined, 973] },
    { name: 'sound', unit: 'dB', values: [45, 60] },
  ],
};

describe('a ramp’s rises above the air of the place', () => {
  it('are the absolute pressures less that air, each in its own unit, gaps kept', () => {
    const [gauge, manifold, boost, sound] = risesAbove(series, 93.9).channels;
    expect(gauge?.values).toEqual([0, 3.4]);
    expect(manifold?.values[0]).toBeCloseTo(0, 10);
    expect(manifold?.values[1]).toBeCloseTo(3.4, 10);
    expect(boost?.values[0]).toBeUndefined();
    expect(boost?.values[1]).toBeCloseTo(34, 10);
    expect(sound?.values).toEqual([45, 60]);
  });

  it('leave the series as it is where the air of the place is not known', () => {
    expect(risesAbove(series, undefined)).toBe(series);
  });
});
