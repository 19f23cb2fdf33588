import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { driveRun, judgements, wayWalked } from '../../support/run-driver';
import { coldToAir } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: boost pressure reads off at rest', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [...coldToAir, ['5', { read: { manifoldPressure: '94.2' } }], ['6', { read: { boostPressure: '98.1' } }]],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe('1 2d 2e 3 4 5 6 6a F9');
  });

  it('judges every reading', () => {
    expect(judgements(walk)).toEqual([
      'manifoldPressure 94.2 +- 0.6 kPa: in',
      'boostPressure 98.1 +- 0.6 kPa: out',
      'sensorGap -3.9 +- 0.8 kPa: out',
    ]);
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('sensorReadsOffAtRest');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'A pressure sensor reads off with the engine at rest.',
        'Boost pressure was 98.1 ± 0.6 kPa (step 6) where the air of the place was 93.9 ± 0.3 kPa (step 4).',
        'Manifold minus boost pressure was -3.9 ± 0.8 kPa (step 6a), where at most 1.5 kPa either way is usual.',
        'A pressure that is read wrong sets the same codes as a leak, and the valve is not judged by it.',
      ].join(' '),
      correction: [
        'Check connector, reference voltage and ground of the sensor before the sensor itself.',
        'The codes were left standing.',
        'After the repair both halves are run again, then clear, drive and prove.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'The boost pressure sensor reads wrong with the engine off; its wiring is checked first, then the sensor.',
    });
  });
});
