import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { driveRun, judgements, wayWalked } from '../../support/run-driver';
import { coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: stopped while the pressure is raised', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      [
        '11',
        {
          commands: [
            { do: 'stop', reason: '' },
            { do: 'leave-stop', how: 'not-completed', reason: 'the plug moved' },
          ],
        },
      ],
      ...gaugeAtZero,
      ['18a', { codes: [{ code: 'P0068', status: 'stored' }] }],
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe('1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 15a 15b 15c 16 18a F12');
  });

  it('judges every reading', () => {
    expect(judgements(walk)).toEqual([
      'manifoldPressure 94.2 +- 0.6 kPa: in',
      'boostPressure 93.9 +- 0.6 kPa: in',
      'sensorGap 0.3 +- 0.8 kPa: in',
    ]);
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('notCompleted');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'Not completed: whether the manifold valve seals is not known.',
        'The test was stopped at step 11, Raise slowly and listen: the plug moved.',
        'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5).',
        'Key on and engine off, boost pressure was 93.9 ± 0.6 kPa (step 6).',
      ].join(' '),
      correction: [
        'Nothing was replaced.',
        'What was taken apart is back in its place.',
        'No code was cleared.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'The test of the crankcase valve could not be completed, so nothing was replaced and the cause is still open.',
    });
  });
});
