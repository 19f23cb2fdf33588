import { sealPointFromMarks } from './seal-marks';

describe('a typed ramp with a pause before the noise stops', () => {
  it.each([0, 5, 10, 30])('of %d s gives a seal point between the points on both sides of the mark', (pauseS) => {
    const gauges = [0, 0.5, 1, 1.5, 2, 2.5, 3];
    const typed = gauges.map((gaugeKpa, index) => ({ timeS: index * 1.3, gaugeKpa, mapKpa: 93.9 + gaugeKpa }));
    const noiseStopsS = 6 * 1.3 + 3 + pauseS;
    const samples = [...typed, { timeS: noiseStopsS + 1, gaugeKpa: 3.5, mapKpa: 97.4 }];
    const seal = sealPointFromMarks(samples, { noiseBeginsS: 1, noiseStopsS, stationKpa: 93.9, resolutionKpa: 0.1 });
    expect(seal.sealed && seal.aboveStationKpa).toBeGreaterThanOrEqual(3);
    expect(seal.sealed && seal.aboveStationKpa).toBeLessThanOrEqual(3.5);
  });
});
