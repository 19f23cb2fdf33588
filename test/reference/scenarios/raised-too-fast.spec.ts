import type { Series } from '../../../procedures/engine';
import { compiledValveSeal } from '../../support/compiled-valve-seal';
import { fineGear } from '../../support/ossenholt-gear';
import { readRamp } from '../../support/ramp-file';
import { driveRun, judgements } from '../../support/run-driver';
import { codesClearedAfter, coldToAir, gaugeAtZero, sensorsInBand } from '../../support/valve-seal-rows';

/** The ramp so many times as fast: at most 0.090 kPa a second as it was drawn, where 0.2 is allowed. */
const hurried = (series: Series, times: number): Series => ({ ...series, timeS: series.timeS.map((s) => s / times) });

const raised = (times: number) =>
  driveRun({
    procedure: compiledValveSeal(),
    half: 'cold',
    gear: fineGear,
    table: [
      ...coldToAir,
      ...sensorsInBand,
      ['11', { listen: hurried(readRamp('demo-cold-never-seals'), times), begins: 13 / times }],
      ['13', { choose: ['airNowhere'] }],
      ...gaugeAtZero,
      ...codesClearedAfter,
    ],
  });

describe('crankcase valve seal, cold half: how fast the pressure is raised', () => {
  it.each([
    [2, /^riseRate 0\.1[67]\d? \+- 0\.008 kPa: in$/],
    [2.4, /^riseRate 0\.(19|20)\d? \+- 0\.008 kPa: too-close$/],
    [4, /^riseRate 0\.3\d+ \+- 0\.008 kPa: out$/],
  ])('is judged: %d times as fast', (times, judged) => {
    expect(judgements(raised(times)).filter((line) => line.startsWith('riseRate'))).toEqual([
      expect.stringMatching(judged),
    ]);
  });

  it('shows on the step that was raised too fast, and leaves the way to the seal alone', () => {
    const walk = raised(4);
    expect(walk.state.walked.find(({ step }) => step === 'raise-and-listen')?.result).toBe('out');
    expect(walk.state.finding).toBe('placeNotFound');
  });
});
