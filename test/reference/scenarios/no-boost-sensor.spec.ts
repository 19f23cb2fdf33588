import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp, withoutChannel } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, otherHalfNext } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

describe('crankcase valve seal, cold half: the car shows no boost pressure', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ['5', { read: { manifoldPressure: '94.2' } }],
      ['6', { commands: [{ do: 'cannot-measure', reason: 'the car has no such sensor' }] }],
      ['11', { listen: withoutChannel(readRamp('demo-warm-seals'), 'boost'), begins: 13, stops: 'suggested' }],
      ['12b', { choose: ['stillQuiet'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 12a 12b 14 15a 15b 15c 16 18a 18b 19 F1',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('seals');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('leaves out of the write-up what was not measured', () => {
    const { cause } = writeUpTexts(walk);
    expect(cause).toContain(
      'It stayed quiet for 30 s (step 12a) after the pressure had been raised to 11.8 ± 0.3 kPa (step 11).',
    );
    expect(cause).not.toMatch(/boost pressure|\{/);
  });
});
