import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { endedAt, readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: the pressure cannot be raised past the band', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: endedAt(readRamp('demo-cold-never-seals'), 4.0), begins: 13 }],
      ['11', { listen: endedAt(readRamp('demo-cold-never-seals'), 4.0), begins: 13 }],
      ['11', { listen: endedAt(readRamp('demo-cold-never-seals'), 4.0), begins: 13 }],
      [
        '13',
        {
          commands: [
            { do: 'acknowledge-caution', caution: 0 },
            { do: 'cannot-measure', reason: 'the compressor runs dry' },
          ],
        },
      ],
      ...gaugeAtZero,
      ['18a', { commands: [{ do: 'cannot-measure', reason: 'the scan tool has no charge left' }] }],
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 9a 9b 9c 10 11 11b 9a 9b 9c 10 11 11b 13 15a 15b 15c 16 18a F12',
    );
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
        'The test ended at step 13, Where the air comes out: the compressor runs dry.',
        'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5).',
        'Key on and engine off, boost pressure was 93.9 ± 0.6 kPa (step 6).',
        'The pressure had been raised to 4.0 ± 0.3 kPa (step 11) above the air of the place.',
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
