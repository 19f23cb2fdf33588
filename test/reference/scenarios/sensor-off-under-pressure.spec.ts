import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp, withChannel } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

/** A boost sensor that rises by four fifths of what it should. */
const lagging = withChannel(readRamp('demo-warm-seals'), 'boost', (boostKpa, gaugeKpa) => boostKpa - 0.2 * gaugeKpa);

describe('crankcase valve seal, cold half: boost pressure does not follow the gauge', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: lagging, begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe('1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 12a 12b 14 15a 15b 15c 16 18a 18b F10');
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('sensorReadsOffUnderPressure');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'A pressure sensor reads off under pressure.',
        'Boost pressure rose by 0.800 ± 0.002 (step 11) of what the gauge rose; the band is 0.90 to 1.10.',
        'The widest gap of boost to manifold pressure was -2.8 ± 0.2 kPa (step 11), where at most 1.5 kPa either way is usual.',
        'By the gauge, the manifold valve sealed at 3.4 ± 0.3 kPa (step 11) above the air of the place.',
        'A pressure that is read wrong sets the same codes as a leak.',
      ].join(' '),
      correction: [
        'Check connector, reference voltage and ground of the sensor before the sensor itself.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'A pressure sensor does not follow the pressure as it should; its wiring is checked first, then the sensor.',
    });
  });
});
