import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half, the later one: sealed, cleared and driven', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
      ['19', { choose: ['bothHalvesDone'] }],
      ['19a', { choose: ['fitToDrive'] }],
      ['19b', { choose: ['droveIdle', 'droveSteady'] }],
      ['19c', { codes: [] }],
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 12a 12b 14 15a 15b 15c 16 18a 18b 19 19a 19b 19c F1',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('seals');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'The manifold valve seals at 3.4 ± 0.3 kPa (step 11) above the air of the place.',
        'Cold, with the coolant at 14 ± 1.3 °C (step 2e), the noise at the valve stopped inside its band, 1.5 kPa to 5.0 kPa.',
        'It stayed quiet for 30 s (step 12a) after the pressure had been raised to 11.8 ± 0.3 kPa (step 11).',
        'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5) and boost pressure 93.9 ± 0.6 kPa (step 6); the air of the place was 93.9 ± 0.3 kPa (step 4).',
        'In this half the valve is not where air or boost is lost.',
      ].join(' '),
      correction: [
        'Nothing was replaced.',
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'Driven: idle, steady ride (step 19b); codes after the road test: no code (step 19c).',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'The crankcase valve was tested cold and closed as it should, at 3.4 ± 0.3 kPa; no part was replaced for it.',
    });
  });
});
