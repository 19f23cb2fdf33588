import { hotIdleWhistle } from '../shared/practice/hot-idle-whistle';
import { compiledLibraryProcedure, walkScenario } from '../shared/testing/walk-scenario';
import { rowsOf } from './story-rows';
import { tellStory } from './tell-story';

describe('the rows of a claim', () => {
  const procedure = compiledLibraryProcedure();
  const { header, events } = walkScenario(procedure, hotIdleWhistle, { choices: {}, until: 'still-quiet' });
  const { story } = tellStory(procedure, header, events);
  const rowsFor = (stepId: string) =>
    story.passages.filter(({ step }) => step?.id === stepId).flatMap((passage) => rowsOf(passage));

  it('put a lone reading into the step’s own row, called by the step’s title alone', () => {
    expect(rowsFor('manifold-pressure')[0]).toMatchObject({
      kind: 'value',
      isHead: true,
      label: undefined,
      text: '94.0 ± 0.6 kPa',
      words: 'in band',
    });
  });

  it('name a lone computed value, since the step’s title does not', () => {
    expect(rowsFor('sensors-at-rest')[0]).toMatchObject({ isHead: true, label: 'Manifold minus boost', unit: 'kPa' });
  });

  it('give each of several values a row of its own under the step', () => {
    const [head, ...rest] = rowsFor('raise-and-listen');
    expect(head?.kind).toBe('head');
    expect(rest.flatMap((row) => (row.kind === 'value' ? [row.label] : []))).toEqual([
      'Seal point',
      'Highest pressure reached',
      'Fastest rise in a second',
      'Manifold pressure per gauge',
      'Boost pressure per gauge',
      'Widest gap between the sensors',
    ]);
  });

  it('gather the cautions of a step into one row', () => {
    const cautions = rowsFor('start').filter((row) => row.kind === 'cautions');
    expect(cautions.map((row) => (row.kind === 'cautions' ? row.lines.length : 0))).toEqual([6]);
  });

  it('say by which way the air of the place became known', () => {
    const [, , place] = rowsFor('station-pressure');
    expect(place).toMatchObject({ kind: 'value', label: 'Air of the place', words: 'Barometer at the car' });
  });
});
