import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { rampTruth } from '../../support/ramp-truth';
import { driveRun, judgements, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, gaugeAtZero, sensorsInBand, warmToAir } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, warm half: the noise stops outside the band', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'warm',
    gear: fineGear,
    table: [
      ...warmToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-seals-outside-band'), begins: 13, stops: 'suggested' }],
      ['11a', { read: { coolantAtMark: '74' } }],
      ...gaugeAtZero,
      ['17b', { choose: ['clean'], text: 'a dry valve, its spring upright' }],
      ...codesClearedAfter,
      ['19', { choose: ['bothHalvesDone'] }],
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2a 2b 2c 2d 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11a 11b 14 15a 15b 15c 16 17a 17b 17c 18a 18b 19 F2',
    );
  });

  it('finds the seal point that the ramp was drawn with', () => {
    const { value, uncertainty } = walk.state.values['sealPoint']!;
    const truth = rampTruth('demo-seals-outside-band').seal_gauge_kpa!;
    expect(Math.abs(value / 1000 - truth)).toBeLessThanOrEqual(uncertainty / 1000);
    expect(uncertainty / 1000).toBeLessThan(0.5);
  });

  it('judges every reading', () => {
    expect(judgements(walk)).toEqual([
      'manifoldPressure 94.2 +- 0.6 kPa: in',
      'boostPressure 93.9 +- 0.6 kPa: in',
      'sensorGap 0.3 +- 0.8 kPa: in',
      'sealPoint 6.2 +- 0.3 kPa: out',
      'riseRate 0.090 +- 0.008 kPa: in',
      'manifoldGain 1.000 +- 0.002: in',
      'boostGain 1.001 +- 0.002: in',
      'worstGap -0.50 +- 0.19 kPa: in',
    ]);
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('sealsOutsideBand');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'The manifold valve seals outside its band, at 6.2 ± 0.3 kPa (step 11) above the air of the place.',
        'Warm, with the coolant at 74 ± 1.3 °C (step 11a), the noise at the valve stopped outside its band, 1.5 kPa to 5.0 kPa.',
        'Seen through the passage: in place and clean: a dry valve, its spring upright (step 17b).',
        'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5) and boost pressure 93.9 ± 0.6 kPa (step 6); the air of the place was 93.9 ± 0.3 kPa (step 4).',
        'Until it shuts, boost goes into the crankcase as air that the engine computer has counted and the cylinders never get.',
      ].join(' '),
      correction: [
        'Replace the manifold valve.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2.',
      ].join(' '),
      customer:
        'Tested warm, the crankcase valve closes only at 6.2 ± 0.3 kPa, outside its usual range, and should be replaced.',
    });
  });
});
