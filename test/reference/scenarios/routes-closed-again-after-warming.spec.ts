import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked, type Row } from '../../support/run-driver';
import { codesClearedAfter, gaugeAtZero, otherHalfNext, sensorsInBand, warmToAir } from '../../support/valve-seal-rows';

/** Running the engine turns the crankshaft and frees the port: what was closed before no longer is. */
describe('crankcase valve seal, warm half: cooled after the other routes were closed', () => {
  const hissing: Row = ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }];
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'warm',
    gear: fineGear,
    table: [
      ...warmToAir,
      ...sensorsInBand,
      hissing,
      ['11a', { read: { coolantAtMark: '81' } }],
      ['13', { choose: ['airAtDipstick'] }],
      ['13c', { read: { gaugeLeft: '0.0' } }],
      ['13g', { choose: ['routesIsolated'] }],
      hissing,
      ['11a', { read: { coolantAtMark: '67' } }],
      ['2g', { read: { gaugeLeft: '0.0' } }],
      ['2b', { read: { coolantTemperature: '88' } }],
      ...sensorsInBand,
      ['13g', { choose: ['routesIsolated'] }],
      hissing,
      ['11a', { read: { coolantAtMark: '77' } }],
      ...gaugeAtZero,
      ['17b', { choose: ['notSeen'] }],
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });

  it('closes them again before it listens', () => {
    expect(wayWalked(walk)).toBe(
      [
        '1 2a 2b 2c 2d 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11a 11b 13 13b 13c 13d 13f 13g 13h 9a 9b 9c 10 11 11a',
        '2f 2g 2h 2i 2a 2b 2c 2d 5 6 6a 7 8a 8b 13f 13g 13h 9a 9b 9c 10 11 11a 11b',
        '14 15a 15b 15c 16 17a 17b 17c 18a 18b 19 F4',
      ].join(' '),
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('doesNotSeal');
    expect(walk.state.disturbed).toEqual([]);
  });
});
