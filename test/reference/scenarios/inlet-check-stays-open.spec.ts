import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, judgements, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: the inlet-side check valve stays open', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ['13', { choose: ['airAtInletVent'] }],
      ['13a', { choose: ['pulseStaysOpen'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe('1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 13 13a 14 15a 15b 15c 16 18a 18b F6');
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
    expect(walk.state.finding).toBe('inletCheckStaysOpen');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'The inlet-side check valve stays open after a pulse.',
        'Air came at the inlet-side vent up to 7.1 ± 0.3 kPa (step 11), and went on coming after a short pulse that should have shut the valve.',
        'The manifold valve was not judged: this leak hides it.',
      ].join(' '),
      correction: [
        'Replace the inlet-side check valve.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'The check valve between crankcase and inlet duct stays open and needs replacing; the test goes on after that.',
    });
  });
});
