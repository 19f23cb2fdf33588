import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, judgements, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: a joint leaks that cannot be mended', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ['13', { choose: ['airAtJoint'], text: 'hose clamp at the charge cooler' }],
      ['13c', { read: { gaugeLeft: '0.0' } }],
      ['13e', { choose: ['jointMended'], text: 'clamp turned tight' }],
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ['13', { choose: ['airAtJoint', 'airAtDipstick'], text: 'hose at the charge cooler, split' }],
      ['13c', { read: { gaugeLeft: '0.1' } }],
      ['13e', { choose: ['jointNotMended'], text: 'the hose is not in stock' }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 13 13b 13c 13d 13e 9a 9b 9c 10 11 11b 13 13b 13c 13d 13e 14 15a 15b 15c 16 18a 18b F8',
    );
  });

  it('judges every reading', () => {
    expect(judgements(walk)).toEqual([
      'manifoldPressure 94.2 +- 0.6 kPa: in',
      'boostPressure 93.9 +- 0.6 kPa: in',
      'sensorGap 0.3 +- 0.8 kPa: in',
      'riseRate 0.090 +- 0.008 kPa: in',
      'manifoldGain 0.999 +- 0.003: in',
      'boostGain 0.998 +- 0.003: in',
      'worstGap -0.50 +- 0.18 kPa: in',
    ]);
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('leakMasksTest');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'A leak masks the test: the manifold valve was not judged.',
        'With 7.1 ± 0.3 kPa (step 11) on the intake, air came out at a joint, at the dipstick tube: hose at the charge cooler, split (step 13).',
        'The joint was not mended: the hose is not in stock (step 13e).',
        'The noise of this leak hides the one at the valve.',
      ].join(' '),
      correction: [
        'Mend the leak, and run this half again.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'The intake leaks air at a joint, at the dipstick tube: hose at the charge cooler, split; that is mended first, then the crankcase valve is tested again.',
    });
  });
});
