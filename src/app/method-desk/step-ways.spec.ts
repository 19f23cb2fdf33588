import { crankcaseValveSeal } from '../../../procedures/library';
import { nameBook } from './condition-words';
import { waysOf } from './step-ways';

describe('where a step goes on', () => {
  const names = nameBook(crankcaseValveSeal);
  const waysFrom = (id: string, document = crankcaseValveSeal) =>
    waysOf(
      document,
      names,
      document.steps.find((step) => step.id === id)!,
    );

  it('lists every exit in the order in which they are tried, the honest one last', () => {
    expect(waysFrom('manifold-pressure').map(({ lead, to }) => `${lead} -> ${to.label}`)).toEqual([
      'if -> 5 again',
      'else -> 6',
      'if it cannot be measured -> 6',
    ]);
  });

  it('says how often a way back may be taken, and what then', () => {
    expect(waysFrom('manifold-pressure')[0]?.bound).toBe('At most 2 times, then 6');
    expect(waysFrom('what-was-heard')[3]?.bound).toBe('At most 2 times, then 12a, as Seals, too close to call');
  });

  it('names the finding that a way heads for', () => {
    expect(waysFrom('sensors-at-rest')[1]).toMatchObject({
      verdict: 'A sensor reads off at rest',
      to: { label: 'the finding it heads for', isMissing: false },
    });
  });

  it('marks a way that leads to a step which is not there', () => {
    const steps = crankcaseValveSeal.steps.filter(({ id }) => id !== 'boost-pressure');
    const [, otherwise] = waysFrom('manifold-pressure', { ...crankcaseValveSeal, steps });
    expect(otherwise?.to).toEqual({ id: undefined, label: 'boost-pressure', isMissing: true });
  });

  it('has no way on from a finding', () => {
    expect(waysFrom('seals')).toEqual([]);
  });
});
