import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: nothing is heard anywhere', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-warm-seals') }],
      ['12c', { choose: ['heardElsewhere'], text: 'nearer to the throttle' }],
      ['11', { listen: readRamp('demo-warm-seals') }],
      ['12c', { choose: ['heardNowhere'] }],
      ...gaugeAtZero,
      ['17b', { choose: ['notSeen'] }],
      ...codesClearedAfter,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 12c 9a 9b 9c 10 11 11b 12c 14 15a 15b 15c 16 17a 17b 17c 18a 18b F5',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('passageNotProved');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'Nothing proves that the crankcase passage is open.',
        'The pressure was raised to 11.8 ± 0.3 kPa (step 11), and no air was heard at the valve or anywhere else.',
        'A blocked passage is silent, and so is a valve that never lets go of its seat: the noise cannot tell them apart.',
        'The passage could not be looked through.',
      ].join(' '),
      correction: [
        'Clear the crankcase passage as its maker says, and run this half again.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'No air could be heard through the crankcase passage, up to 11.8 ± 0.3 kPa; it has to be opened and looked at.',
    });
  });
});
