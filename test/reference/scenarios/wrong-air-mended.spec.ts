import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, gaugeAtZero, otherHalfNext, sensorsInBand } from '../../support/valve-seal-rows';

describe('crankcase valve seal, cold half: both sensors off because the air of the place was mistyped', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ['2e', { read: { coolantTemperature: '14', ambientTemperature: '12' } }],
      ['3', { codes: [] }],
      ['4', { read: { stationPressure: '1060' }, way: 'altimeter-setting' }],
      ...sensorsInBand,
      ['4', { read: { stationPressure: '94.0' }, way: 'barometer' }],
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 12a 12b 14 15a 15b 15c 16 18a 18b 19 F1',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('seals');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('says why the air of the place was looked at again', () => {
    const ways = walk.state.walked.filter(({ step }) => step === 'sensors-at-rest').map(({ way }) => way?.because);
    expect(ways[0]).toBe('Both sensors are off: the air of the place is looked at first.');
    expect(ways[1]).toBe('The two sensors agree with each other: manifold minus boost is 0.3 ± 0.8 kPa.');
  });
});
