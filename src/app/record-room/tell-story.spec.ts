import { roundTo } from '../../../procedures/engine/testing/walk-round-walk';
import { coldMorning } from '../shared/practice/cold-morning';
import { hotIdleWhistle } from '../shared/practice/hot-idle-whistle';
import { compiledLibraryProcedure, walkScenario, type Walk } from '../shared/testing/walk-scenario';
import type { Passage, SaidLine, Story, ValueLine } from './story-line';
import { tellStory } from './tell-story';

const procedure = compiledLibraryProcedure();
const choices = {
  'still-quiet': ['stillQuiet'],
  'where-it-comes-out': ['airAtValve'],
  look: ['carboned'],
  'clear-codes': ['codesCleared'],
  'other-half': ['otherHalfToCome'],
};

function storyOf(scenario: typeof coldMorning, before?: (step: { readonly id: string }, walk: Walk) => void): Story {
  const { header, events } = walkScenario(procedure, scenario, { choices, before });
  return tellStory(procedure, header, events).story;
}

function passages(story: Story, stepId: string): readonly Passage[] {
  return story.passages.filter(({ step }) => step?.id === stepId);
}

function values(passage: Passage | undefined): readonly ValueLine[] {
  return (passage?.lines ?? []).filter((line) => line.kind === 'value');
}

function said(passage: Passage | undefined): readonly string[] {
  return (passage?.lines ?? [])
    .filter((line): line is SaidLine => line.kind === 'said')
    .map(({ what, words }) => (words === undefined ? what : `${what}: ${words}`));
}

describe('the story of a run', () => {
  it('tells each step once for each time it was claimed, in the order of the run', () => {
    const story = storyOf(hotIdleWhistle);
    const numbers = story.passages.map(({ step }) => step?.number ?? '');
    expect(numbers.slice(0, 8)).toEqual(['', '1', '2a', '2b', '2c', '2d', '3', '4']);
    expect(numbers.at(-1)).toBe('F1');
  });

  it('gives a reading with its digits, its uncertainty and how it was judged', () => {
    const [line] = values(passages(storyOf(hotIdleWhistle), 'manifold-pressure')[0]);
    expect(line?.value).toMatchObject({
      text: '94.0',
      unit: 'kPa',
      judgement: { result: 'in', lowText: '91.9', highText: '95.9' },
    });
  });

  it('says which way was taken, by which condition, with the numbers that decided and why', () => {
    const story = storyOf(hotIdleWhistle);
    const way = passages(story, 'what-was-heard')[0]?.lines.find((line) => line.kind === 'way');
    expect(way).toMatchObject({
      kind: 'way',
      to: { id: 'hold-pressure' },
      way: { when: 'noiseStopped and inBand(sealPoint)', verdict: 'seals' },
    });
    const inputs = way?.kind === 'way' ? way.way.inputs.map(({ name }) => name) : [];
    expect(inputs).toEqual(['noiseStopped', 'sealPoint']);
  });

  it('keeps a reading that was taken again, and says when', () => {
    const story = storyOf(hotIdleWhistle, (step, walk) => {
      const isFirst = walk.state.walked.filter((claim) => claim.step === 'manifold-pressure').length === 1;
      if (step.id === 'manifold-pressure' && isFirst)
        walk.do({ do: 'record', name: 'manifoldPressure', text: '95.6', unit: 'kPa' });
    });
    const [first, second] = passages(story, 'manifold-pressure');
    expect(first?.result).toBe('too-close');
    expect(values(first)[0]).toMatchObject({ value: { text: '95.6' }, takenAgainAt: second?.lines[0]?.at });
    expect(values(second)[0]?.takenAgainAt).toBeUndefined();
  });

  it('tells of a stop, a pause, a note and what was disturbed and restored', () => {
    const story = storyOf(coldMorning, (step, walk) => {
      if (step.id !== 'duct-off') return;
      walk.do({ do: 'note', text: 'clamp is rusty' });
      walk.do({ do: 'set-aside', reason: 'phone' });
      walk.do({ do: 'resume' });
      walk.do({ do: 'stop', reason: 'hose slipped' });
      walk.do({ do: 'leave-stop', how: 'go-back' });
    });
    expect(said(passages(story, 'duct-off')[0]).slice(0, 6)).toEqual([
      'Note: clamp is rusty',
      'Set aside: phone',
      'Gone on after being set aside',
      'Stopped, supply off: hose slipped',
      // What the stopped step opens may be open: the engine counts it from the stop on.
      'Disturbed: inlet duct',
      'Gone on after the stop',
    ]);
    expect(said(passages(story, 'duct-off')[0])).toContain('Disturbed: inlet duct');
    expect(said(passages(story, 'restore')[0])).toContain('Restored: inlet duct');
  });

  it('shows where a person overruled the way, with both ways and the reason', () => {
    let isOverruled = false;
    const story = storyOf(coldMorning, (step, walk) => {
      if (step.id !== 'sensors-under-pressure' || isOverruled) return;
      isOverruled = true;
      walk.do({ do: 'overrule', exit: 'otherwise', reason: 'it was at the joint beside it' });
    });
    const [, overruled] = passages(story, 'where-it-comes-out');
    expect(said(overruled)).toEqual(['Way overruled by hand: it was at the joint beside it']);
    expect(overruled?.lines.find((line) => line.kind === 'way')).toMatchObject({
      insteadOf: 'Sensors under pressure, heading for Does not seal',
      way: { exit: 'otherwise', verdict: 'placeNotFound' },
    });
    expect(passages(story, 'sensors-under-pressure')[0]?.isLeft).toBe(true);
  });

  it('draws a series with the marks that stood when its step was left', () => {
    const story = storyOf(hotIdleWhistle);
    const series = passages(story, 'raise-and-listen')[0]?.lines.find((line) => line.kind === 'series');
    expect(series).toMatchObject({
      record: { samples: 381, fileName: 'hot-idle-whistle.csv' },
      marks: { 'noise-begins': { timeS: 11 }, 'noise-stops': { timeS: 54.424 } },
    });
  });

  it('compares the codes after with those before', () => {
    const codes = passages(storyOf(coldMorning), 'codes-after')[0]?.lines.find((line) => line.kind === 'codes');
    expect(codes).toMatchObject({
      codes: [{ code: 'P0068' }, { code: 'P0171' }],
      before: [{ code: 'P0068' }, { code: 'P0171' }],
    });
  });

  it('ends where an event does not fit, and says which', () => {
    const { header, events } = walkScenario(procedure, hotIdleWhistle, { choices });
    const changed = events.map((event) =>
      event.type === 'reading-recorded' && event.data.name === 'boostPressure'
        ? { ...event, data: { ...event.data, figure: { ...event.data.figure, text: '99.9' } } }
        : event,
    );
    const { story } = tellStory(procedure, header, changed);
    const at = events.find((event) => event.type === 'reading-recorded' && event.data.name === 'boostPressure');
    expect(story.brokenOff).toEqual({ seq: at?.seq, what: `event ${at?.seq} was changed after it was written` });
    expect(story.passages.at(-1)?.step?.id).toBe('boost-pressure');
  });
});

describe('the story of a run with photos, a call, a release and readings that end', () => {
  const walk = roundTo('decide').do({ do: 'redo', step: 'coolant', reason: 'its reading no longer holds' });
  const story = tellStory(walk.procedure, walk.header, walk.events).story;

  it('tells the called steps as part of the step that called, and what was found there', () => {
    const called = story.passages.filter(({ within }) => within !== undefined);
    expect(called.map(({ step, within }) => [step?.number, within?.number])).toEqual([
      ['4.1', '4'],
      ['4.2', '4'],
      ['4.3', '4'],
      ['4.4', '4'],
    ]);
    const [call] = passages(story, 'plug-test');
    expect(said(call)).toContainEqual(expect.stringMatching(/^What the called procedure found: The plug holds 4\.2/));
    expect(values(call).map(({ value }) => [value.name, value.judgement?.result])).toEqual([['plugThere', 'in']]);
  });

  it('names who looked and who released, on what', () => {
    const lines = passages(story, 'show')[0]?.lines.filter((line): line is SaidLine => line.kind === 'said');
    expect(lines?.map(({ what, words, person }) => [what, words, person])).toEqual([
      ['A second person has looked', 'The plug sits square and is secured.', 'brandt'],
      ['Released by the lead', 'Two clamps.', 'okafor'],
    ]);
  });

  it('shows a photo by its hash, and says which reading ended with which step', () => {
    expect(passages(story, 'photo')[0]?.lines.find(({ kind }) => kind === 'photo')).toMatchObject({
      record: { mediaType: 'image/jpeg', bytes: 1 },
    });
    expect(said(passages(story, 'stand')[0])).toContain('No longer holds: Coolant temperature: A warm engine cools.');
    expect(said(passages(story, 'decide')[0]).join()).not.toContain('No longer holds');
  });
});
