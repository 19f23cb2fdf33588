import { walkRound } from '../../../procedures/document/testing/walk-round';
import { factsOf } from './step-facts';
import { quantitiesOf } from './step-quantities';

function facts(id: string): Record<string, readonly string[]> {
  const step = walkRound.steps.find((candidate) => candidate.id === id);
  if (step === undefined) throw new Error(`no step ${id}`);
  return Object.fromEntries(factsOf(walkRound, step).map(({ title, lines }) => [title, lines]));
}

function named(id: string): readonly (readonly [string, string])[] {
  const step = walkRound.steps.find((candidate) => candidate.id === id);
  return step === undefined ? [] : quantitiesOf(step, (text) => text).map(({ label, how }) => [label, how]);
}

describe('what a step says beside its sentence', () => {
  it('is nothing for a step that has nothing of it', () => {
    expect(factsOf(walkRound, walkRound.steps[0]!)).toEqual([]);
  });

  it('names how long a reading holds, and why', () => {
    expect(facts('coolant')).toEqual({
      'In few words': ['Coolant temperature.'],
      'How long its readings hold': [
        'Coolant temperature: for 30 min, and at most until step 10 is done. A warm engine cools.',
      ],
    });
  });

  it('names who looks and who releases, on what', () => {
    expect(facts('show')).toEqual({
      'A second person looks, by themselves': ['The plug sits square and is secured.'],
      'Released by the lead, on this evidence': ['How the plug is secured.'],
    });
  });

  it('names what a photo must show, what is called, and least times', () => {
    expect(facts('photo')).toEqual({
      'The photo must show': ['The whole plug, in focus.', 'The gauge beside it, so that its figure can be read.'],
    });
    expect(facts('plug-test')).toEqual({
      Calls: ['plug-hold, version 1'],
      'Its findings are asked for as': ['plugHolds: plugHeld', 'plugLeaks: plugLeaked'],
    });
    expect(facts('stand')).toEqual({ 'Lasts at least': ['20 s'] });
    expect(facts('hold')).toEqual({ Lasts: ['30 s'] });
    expect(facts('plug')).toMatchObject({ 'Stays at the car': [expect.stringContaining('while this step is open')] });
  });
});

describe('the quantities of a step', () => {
  it('are those of a hold at both its ends, of a ramp, and what is taken over from a call', () => {
    expect(named('hold')).toEqual([
      ['Gauge as it begins', 'read once, as it begins'],
      ['Gauge as it ends', 'read once, as it ends'],
      ['Lost while it was held', '= heldFrom - heldTo'],
    ]);
    expect(named('raise')).toEqual([['Highest pressure', 'found in the series']]);
    expect(named('plug-test')).toEqual([['Pressure at the plug', 'taken over: plugPressure there']]);
  });
});
