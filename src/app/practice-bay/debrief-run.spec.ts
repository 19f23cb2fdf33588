import { afterTheRepair } from '../shared/practice/after-the-repair';
import { coldMorning } from '../shared/practice/cold-morning';
import { hotIdleWhistle } from '../shared/practice/hot-idle-whistle';
import type { PracticeScenario } from '../shared/practice/practice-scenario';
import { compiledLibraryProcedure, walkScenario, type WalkOptions } from '../shared/testing/walk-scenario';
import { debriefRun } from './debrief-run';

const careful = {
  'still-quiet': ['stillQuiet'],
  'where-it-comes-out': ['airAtValve'],
  look: ['carboned'],
  'clear-codes': ['codesCleared'],
  'other-half': ['otherHalfToCome'],
};

describe('the debrief of a practice run', () => {
  const procedure = compiledLibraryProcedure();
  const debriefOf = (scenario: PracticeScenario, options: Partial<WalkOptions> = {}) => {
    const { events, state } = walkScenario(procedure, scenario, { choices: careful, ...options });
    return debriefRun(procedure, scenario, events, state);
  };

  it('says that the planted fault was found', () => {
    const { finding, mark, figures } = debriefOf(hotIdleWhistle);
    expect(finding).toMatchObject({ result: 'in', reached: 'Seals', planted: 'Seals' });
    expect(mark.result).toBe('in');
    expect(figures.length).toBeGreaterThan(4);
    expect(figures.every(({ isSame }) => isSame)).toBe(true);
  });

  it('says that another finding was reached than what was planted', () => {
    const choices = {
      ...careful,
      'where-it-comes-out': ['airAtDipstick'],
      'turn-crankshaft': ['notIsolated'],
      look: ['clean'],
    };
    const { finding } = debriefOf(coldMorning, { choices });
    expect(finding).toMatchObject({
      result: 'out',
      reached: 'Pressure reaches the crankcase, route not proved',
      planted: 'Does not seal',
    });
  });

  it('leaves the fault open where the run was not brought to its end', () => {
    const { finding } = debriefOf(hotIdleWhistle, {
      before: (step, walk) => {
        if (step.id === 'manifold-pressure') walk.do({ do: 'stop', reason: 'enough' });
        if (walk.state.status === 'stopped') walk.do({ do: 'leave-stop', how: 'not-completed' });
      },
    });
    expect(finding).toMatchObject({ result: 'not-judged', reached: 'Not completed' });
  });

  it('says by how much a mark was too early, and where the noise stops', () => {
    const { mark } = debriefOf(hotIdleWhistle, { noiseStopsS: 44.424 });
    expect(mark).toEqual({
      result: 'out',
      words:
        'You marked the end of the noise at 44.4 s, 10.0 s too early; it stops at 54.4 s, 3.4 kPa above the air of the place.',
    });
  });

  it('takes a mark within two seconds for right', () => {
    expect(debriefOf(hotIdleWhistle, { noiseStopsS: 56.4 }).mark.result).toBe('in');
    expect(debriefOf(hotIdleWhistle, { noiseStopsS: 56.5 }).mark.result).toBe('out');
  });

  it('praises no mark where the noise never stops, and says so where one was placed', () => {
    expect(debriefOf(coldMorning).mark).toMatchObject({ result: 'in' });
    const { mark } = debriefOf(coldMorning, { noiseStopsS: 80, choices: { ...careful, look: ['carboned'] } });
    expect(mark).toEqual({ result: 'out', words: 'You marked an end of the noise at 80.0 s; it never stops.' });
  });

  it('finds the late valve, whose noise does stop', () => {
    const { finding, mark } = debriefOf(afterTheRepair, { choices: { ...careful, look: ['clean'] } });
    expect(finding).toMatchObject({ result: 'in', planted: 'Seals outside the band' });
    expect(mark.result).toBe('in');
  });

  it('lists a figure that was written down otherwise than the instrument showed it', () => {
    let isWritten = false;
    const { figures } = debriefOf(hotIdleWhistle, {
      before: (step, walk) => {
        if (step.id !== 'boost-pressure' || isWritten) return;
        isWritten = true;
        walk.do({ do: 'record', name: 'boostPressure', text: '93.1', unit: 'kPa' });
      },
    });
    expect(figures.filter(({ isSame }) => !isSame)).toEqual([
      { label: 'Scan tool, boost pressure', written: '93.1 kPa', shown: '93.7 kPa', isSame: false },
    ]);
  });

  it('takes the same pressure in another unit for the same', () => {
    const { figures } = debriefOf(hotIdleWhistle, {
      before: (step, walk) => {
        if (step.id === 'boost-pressure') walk.do({ do: 'record', name: 'boostPressure', text: '937', unit: 'hPa' });
      },
    });
    expect(figures.find(({ label }) => label.includes('boost'))).toMatchObject({ written: '937 hPa', isSame: true });
  });
});
