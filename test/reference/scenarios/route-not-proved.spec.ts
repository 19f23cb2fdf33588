import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: the noise stops once the other routes are closed', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ['13', { choose: ['airAtDipstick'] }],
      ['13c', { read: { gaugeLeft: '0.0' } }],
      ['13g', { choose: ['routesIsolated'] }],
      ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }],
      ...gaugeAtZero,
      ['17b', { commands: [{ do: 'cannot-measure', reason: 'the borescope does not go round the bend' }] }],
      ...codesClearedAfter,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 13 13b 13c 13d 13f 13g 13h 9a 9b 9c 10 11 11b 14 15a 15b 15c 16 17a 17b 17c 18a 18b F7',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('crankcaseRouteNotProved');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes it up', () => {
    expect(writeUpTexts(walk)).toEqual({
      concern: [
        'Merrow Heron 1.6 turbo, silver, RO 4417, 84,210 km: Whistle at idle, hesitates under load.',
        'Trouble codes before the test: P0068 stored (step 3).',
      ].join(' '),
      cause: [
        'Pressure reaches the crankcase; the route is not proved.',
        'Air came out of the dipstick tube with 11.8 ± 0.3 kPa (step 11) on the intake.',
        'With the inlet-side port plugged and no intake valve open at overlap, the noise at the manifold valve stopped at 3.4 ± 0.3 kPa (step 11).',
        "What remains are the rings, the turbo's shaft seals and the inlet-side vent; no part is named.",
      ].join(' '),
      correction: [
        "Measure cylinder leak-down and look at the turbo's seals before a part is replaced.",
        'Codes after the test: P0068 stored, P0106 pending (step 18a); they were cleared.',
        'Tested by Crankcase valve seal under regulated pressure, version 1 with G-12, S-3, L-2, T-4.',
      ].join(' '),
      customer:
        'Boost pressure reaches the crankcase, but not by a way that this test could prove; the engine is measured further before a part is replaced.',
    });
  });
});
