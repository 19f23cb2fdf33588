import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, otherHalfNext, sensorsInBand } from '../../support/valve-seal-rows';

describe('crankcase valve seal, cold half: the inlet-side valve shuts on a pulse and is plugged', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ['13', { choose: ['airAtInletVent'] }],
      ['13a', { choose: ['pulseShuts'] }],
      ['13c', { read: { gaugeLeft: ['0.6', '0.1'] } }],
      ['11', { listen: readRamp('demo-warm-seals'), begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 13 13a 13b 13c 13d 13f 9a 9b 9c 10 11 11b 12a 12b 14 15a 15b 15c 16 18a 18b 19 F1',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('seals');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('had the plug of the port on the list until it was taken out', () => {
    const disturbed = walk.events.flatMap((event) => (event.type === 'disturbed' ? [event.data.item] : []));
    const restored = walk.events.flatMap((event) => (event.type === 'restored' ? [event.data.item] : []));
    expect(disturbed).toEqual(['dipstick', 'inlet-duct', 'inlet-plug', 'vent-plug']);
    // What was opened last goes back first.
    expect(restored).toEqual([...disturbed].reverse());
  });
});
