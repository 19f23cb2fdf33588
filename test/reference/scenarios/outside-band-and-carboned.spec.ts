import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, otherHalfNext, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

/** What is seen outweighs what was heard: carbon makes a valve that shut late one that does not seal. */
describe('crankcase valve seal, cold half: the noise stops outside the band and carbon is seen', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-seals-outside-band'), begins: 13, stops: 'suggested' }],
      ...gaugeAtZero,
      ['17b', { choose: ['carboned'], text: 'the disc sticks in its guide' }],
      ...codesClearedAfter,
      ...otherHalfNext,
    ],
  });

  it('heads for one finding after the ramp and for another after the look', () => {
    const heading = walk.state.walked.flatMap(({ way }) => way?.verdict ?? []);
    expect(heading).toEqual(['sealsOutsideBand', 'doesNotSeal']);
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 14 15a 15b 15c 16 17a 17b 17c 18a 18b 19 F4',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('doesNotSeal');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('writes both up', () => {
    const { cause, correction } = writeUpTexts(walk);
    expect(cause).toBe(
      [
        'The manifold valve does not seal.',
        'The noise stopped only at 6.2 ± 0.3 kPa (step 11); the band is 1.5 kPa to 5.0 kPa.',
        'Seen through the passage: carbon on it: the disc sticks in its guide (step 17b).',
        'Key on and engine off, manifold pressure was 94.2 ± 0.6 kPa (step 5) and boost pressure 93.9 ± 0.6 kPa (step 6); the air of the place was 93.9 ± 0.3 kPa (step 4).',
        'Boost goes into the crankcase as air that the engine computer has counted and the cylinders never get.',
      ].join(' '),
    );
    expect(correction).toContain('Replace the manifold valve: one that must be cleaned in order to close');
  });
});
