import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, gaugeAtZero, otherHalfNext } from '../../support/valve-seal-rows';

describe('crankcase valve seal, cold half: the air of the place is known from the elevation alone', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ['2e', { read: { coolantTemperature: '14', ambientTemperature: '12' } }],
      ['3', { codes: [] }],
      ['4', { read: { stationPressure: '640' }, way: 'elevation' }],
      ['5', { read: { manifoldPressure: '96.4' } }],
      ['6', { read: { boostPressure: '96.1' } }],
      ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 12a 12b 14 15a 15b 15c 16 18a 18b 19 F1',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('seals');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('judges the sensors against each other only, and says why', () => {
    const { stationPressure, manifoldPressure, boostPressure, sensorGap } = walk.state.values;
    // U.S. Standard Atmosphere 1976: 93.87 kPa at 640 m.
    expect([stationPressure!.text, stationPressure!.uncertaintyText]).toEqual(['94', '2']);
    expect(stationPressure!.value / 1000).toBeCloseTo(93.87, 2);
    for (const sensor of [manifoldPressure!, boostPressure!]) {
      expect(sensor.judgement?.result).toBeUndefined();
      expect(sensor.judgement?.unjudged).toBe(
        'The air of the place is not known well enough: this sensor is judged against the other one only.',
      );
    }
    expect(sensorGap!.judgement?.result).toBe('in');
  });
});
