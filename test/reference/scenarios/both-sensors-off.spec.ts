import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { driveRun, wayWalked, type Row } from '../../support/run-driver';
import { coldToAir } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

const off: readonly Row[] = [
  ['5', { read: { manifoldPressure: '98.2' } }],
  ['6', { read: { boostPressure: '97.9' } }],
];
const againOff: readonly Row[] = [['4', { read: { stationPressure: '93.9' }, way: 'barometer' }], ...off];

describe('crankcase valve seal, cold half: both sensors stay off', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [...coldToAir, ...off, ...againOff, ...againOff],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe('1 2d 2e 3 4 5 6 6a 4 5 6 6a 4 5 6 6a F9');
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('sensorReadsOffAtRest');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('looks at the air of the place twice, then says that both read wrong', () => {
    expect(writeUpTexts(walk).customer).toBe(
      'Both pressure sensors read wrong with the engine off; what they share is checked first.',
    );
    expect(writeUpTexts(walk).cause).toContain('Boost pressure was 97.9 ± 0.6 kPa (step 6)');
  });
});
