import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: the noise comes back while the pressure is held', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['noiseAgain'] }],
      ['13', { choose: ['airAtValve'] }],
      ...gaugeAtZero,
      ['17b', { choose: ['missing'], text: 'an empty seat' }],
      ...codesClearedAfter,
      ['19', { choose: ['bothHalvesDone'] }],
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 12a 12b 13 14 15a 15b 15c 16 17a 17b 17c 18a 18b 19 F4',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('doesNotSeal');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'The manifold valve does not seal.',
        'The noise stopped at 3.4 ± 0.3 kPa (step 11), but came back while the pressure was held.',
        'Seen through the passage: no valve in its seat: an empty seat (step 17b).',
        'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5) and boost pressure 93.9 ± 0.6 kPa (step 6); the air of the place was 93.9 ± 0.3 kPa (step 4).',
        'Boost goes into the crankcase as air that the engine computer has counted and the cylinders never get.',
      ].join(' '),
      correction: [
        'Fit a manifold valve, and find the parts of the old one before the engine runs.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        "Tested cold, the crankcase valve does not close, so boost leaks into the engine's crankcase; the valve needs replacing.",
    });
  });
});
