import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { rampTruth } from '../../support/ramp-truth';
import { driveRun, judgements, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, otherHalfNext, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: the noise never stops and carbon is seen', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ['13', { choose: ['airAtValve'] }],
      ...gaugeAtZero,
      ['17b', { choose: ['carboned'], text: 'a crust on the seat and on the disc' }],
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 13 14 15a 15b 15c 16 17a 17b 17c 18a 18b 19 F4',
    );
  });

  it('has no seal point, and went as high as the ramp was drawn', () => {
    const truth = rampTruth('demo-cold-never-seals');
    const { value, uncertainty } = walk.state.values['highestGauge']!;
    expect(truth.seal).toBe(false);
    expect(walk.state.values['sealPoint']).toBeUndefined();
    expect(Math.abs(value / 1000 - truth.max_gauge_kpa)).toBeLessThanOrEqual(uncertainty / 1000);
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
        'Cold, with the coolant at 14 ± 1.3 °C (step 2e), air was still heard through the manifold valve at 7.1 ± 0.3 kPa (step 11) above the air of the place.',
        'Seen through the passage: carbon on it: a crust on the seat and on the disc (step 17b).',
        'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5) and boost pressure 93.9 ± 0.6 kPa (step 6); the air of the place was 93.9 ± 0.3 kPa (step 4).',
        'Boost goes into the crankcase as air that the engine computer has counted and the cylinders never get.',
      ].join(' '),
      correction: [
        'Replace the manifold valve: one that must be cleaned in order to close is not serviceable unless its maker says otherwise.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'The other half, warm, is still to be run.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        "Tested cold, the crankcase valve does not close, so boost leaks into the engine's crankcase; the valve needs replacing.",
    });
  });
});
