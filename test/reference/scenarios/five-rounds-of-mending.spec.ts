import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, wayWalked, type Row } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';
import { writeUpTexts } from '../../support/write-up-texts';

/** One joint named, mended, and the ramp again. */
const round = (clamp: string): readonly Row[] => [
  ['13', { choose: ['airAtJoint'], text: `clamp ${clamp}` }],
  ['13c', { read: { gaugeLeft: '0.0' } }],
  ['13e', { choose: ['jointMended'], text: 'turned tight' }],
  ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
];

describe('crankcase valve seal, cold half: a joint still leaks after five rounds', () => {
  const walk = driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: readRamp('demo-cold-never-seals'), begins: 13 }],
      ...round('a'),
      ...round('b'),
      ...round('c'),
      ...round('d'),
      ...round('e'),
      ['13', { choose: ['airAtJoint'], text: 'clamp f' }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    ],
  });

  it('walks the way of the table', () => {
    expect(wayWalked(walk)).toBe(
      '1 2d 2e 3 4 5 6 6a 7 8a 8b 9a 9b 9c 10 11 11b 13 13b 13c 13d 13e 9a 9b 9c 10 11 11b 13 13b 13c 13d 13e 9a 9b 9c 10 11 11b 13 13b 13c 13d 13e 9a 9b 9c 10 11 11b 13 13b 13c 13d 13e 9a 9b 9c 10 11 11b 13 13b 13c 13d 13e 9a 9b 9c 10 11 11b 13 14 15a 15b 15c 16 18a 18b F8',
    );
  });

  it('reaches its finding with nothing left apart', () => {
    expect(walk.state.finding).toBe('leakMasksTest');
    expect(walk.state.disturbed).toEqual([]);
  });

  it('says so in the way and in the write-up', () => {
    const last = walk.state.walked.filter(({ step }) => step === 'where-it-comes-out').at(-1);
    expect(last?.way?.because).toBe('A joint still leaks after five rounds of mending.');
    expect(writeUpTexts(walk).cause).toContain('air came out at a joint: clamp f (step 13)');
  });
});
