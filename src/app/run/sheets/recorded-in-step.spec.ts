import { viewOf, walkedTo } from '../testing/run-for-specs';
import { walkedBefore } from '../walked-steps';
import { recordedIn } from './recorded-in-step';

describe('recordedIn', () => {
  it('gives the values of a step, and what else was entered in words', () => {
    const run = viewOf(walkedTo('sensors-at-rest'));
    const places = walkedBefore(run);
    const at = (id: string) =>
      recordedIn(
        run,
        places.find(({ step }) => step.id === id)!,
      );
    expect(at('manifold-pressure').values.map(({ text }) => text)).toEqual(['94.2']);
    expect(at('manifold-pressure').lines).toEqual([]);
    expect(at('codes-before').lines).toEqual(['Codes: P0068 stored']);
    expect(at('start').lines[0]).toBe('Gear: G-12');
    expect(at('key-on')).toEqual({ values: [], lines: [] });
  });

  it('keeps a reading that a later one superseded in sight, at its own bead', () => {
    const walk = walkedTo('manifold-pressure').do(
      { do: 'record', name: 'manifoldPressure', text: '96.1', unit: 'kPa' },
      { do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' },
    );
    const run = viewOf(walk);
    const [first, second] = walkedBefore(run).filter(({ step }) => step.id === 'manifold-pressure');
    expect(recordedIn(run, first!)).toEqual({ values: [], lines: ['Manifold pressure: 96.1 kPa'] });
    expect(recordedIn(run, second!).values.map(({ text }) => text)).toEqual(['94.2']);
  });
});
