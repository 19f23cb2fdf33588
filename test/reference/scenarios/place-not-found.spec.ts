import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: the noise never stops and no place is found', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ['13', { choose: ['airNowhere'] }],
      ...gaugeAtZero,
      ['18a', { codes: [{ code: 'P0068', status: 'stored' }] }],
      ['18b', { choose: ['codesLeft'], text: 'the inspection is tomorrow' }],
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe('1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 13 14 15a 15b 15c 16 18a 18b F11');
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('placeNotFound');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'Not completed: air is lost and no place was found.',
        'Air was heard up to 7.1 ± 0.3 kPa (step 11) above the air of the place, and nowhere could it be heard to come out.',
        'So the manifold valve was not judged.',
      ].join(' '),
      correction: [
        'Nothing was replaced.',
        'What was taken apart is back in its place.',
        'Codes after the test: P0068 stored (step 18a); they are left standing: the inspection is tomorrow (step 18b).',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'The test lost air and the place could not be found, so nothing was replaced and the cause is still open.',
    });
  });
});
