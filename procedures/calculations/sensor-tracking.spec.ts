import * as fc from 'fast-check';
import { trackSensors } from './sensor-tracking';

const gaugeKpa = [0, 0.5, 1.1, 1.6, 2, 2.7, 3.3, 4.1, 4.8, 5.5];
const stationKpa = 93.9;
const sensor = (offset: number, gain: number) => gaugeKpa.map((gauge) => stationKpa + offset + gain * gauge);

describe('trackSensors', () => {
  it('finds the offset and the gain that the readings were made with', () => {
    const parts = fc.tuple(fc.double({ min: -3, max: 3, noNaN: true }), fc.double({ min: 0.5, max: 1.5, noNaN: true }));
    fc.assert(
      fc.property(parts, parts, (first, second) => {
        const tracking = trackSensors({
          gaugeKpa,
          firstKpa: sensor(...first),
          secondKpa: sensor(...second),
          stationKpa,
        });
        expect(tracking.first.offsetKpa).toBeCloseTo(first[0], 9);
        expect(tracking.first.gain).toBeCloseTo(first[1], 9);
        expect(tracking.second.offsetKpa).toBeCloseTo(second[0], 9);
        expect(tracking.between.offsetKpa).toBeCloseTo(second[0] - first[0], 9);
        expect(tracking.between.gain).toBeCloseTo(1 + second[1] - first[1], 9);
      }),
    );
  });

  it('gives the worst gap with its sign, and an uncertainty that covers the scatter', () => {
    const firstKpa = sensor(0.2, 1).map((value, index) => value + (index % 2 === 0 ? 0.05 : -0.05));
    const { first, between } = trackSensors({ gaugeKpa, firstKpa, secondKpa: sensor(-0.4, 1), stationKpa });
    expect(first.worstGapKpa).toBeCloseTo(0.25, 9);
    expect(between.worstGapKpa).toBeCloseTo(-0.65, 9);
    expect(Math.abs(first.offsetKpa - 0.2)).toBeLessThanOrEqual(first.offsetUncertaintyKpa);
    expect(Math.abs(first.gain - 1)).toBeLessThanOrEqual(first.gainUncertainty);
    expect(first.worstGapUncertaintyKpa).toBeGreaterThan(0.1);
  });

  it('shows a dead sensor as a gain of nothing', () => {
    const { first } = trackSensors({ gaugeKpa, firstKpa: sensor(0, 0), secondKpa: sensor(0, 1), stationKpa });
    expect(first.gain).toBeCloseTo(0, 9);
    expect(first.worstGapKpa).toBeCloseTo(-5.5, 9);
  });

  it('refuses series that do not belong together, one pressure alone and a place without air', () => {
    const good = { gaugeKpa, firstKpa: sensor(0, 1), secondKpa: sensor(0, 1), stationKpa };
    expect(() => trackSensors({ ...good, secondKpa: [1, 2] })).toThrow('length of secondKpa is 2; allowed: 10');
    expect(() => trackSensors({ ...good, gaugeKpa: gaugeKpa.map(() => 0) })).toThrow('gaugeKpa are all 0');
    expect(() => trackSensors({ ...good, stationKpa: 0 })).toThrow('stationKpa is 0; allowed: above 0');
    expect(() => trackSensors({ ...good, firstKpa: gaugeKpa.map(() => NaN) })).toThrow('firstKpa[0] is NaN');
  });
});
