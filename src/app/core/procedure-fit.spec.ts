import type { PublishedProcedure } from './wire';
import { fitsOf, isFit, readyOffline, startable } from './procedure-fit';

const procedure = (id: string, version: number, change: Partial<PublishedProcedure> = {}, applies = {}) =>
  ({
    id,
    version,
    status: 'published',
    document: { title: id, appliesTo: { codes: [], symptoms: [], engine: [], ...applies } },
    ...change,
  }) as unknown as PublishedProcedure;

describe('startable', () => {
  it('takes the newest published version of each procedure, never a withdrawn one', () => {
    const all = [
      procedure('seal', 1),
      procedure('seal', 3, { status: 'withdrawn' }),
      procedure('seal', 2),
      procedure('drop', 1, { status: 'withdrawn' }),
    ];
    expect(startable(all).map(({ id, version }) => `${id} ${version}`)).toEqual(['seal 2']);
  });
});

describe('readyOffline', () => {
  const calling = (id: string, ...calls: readonly string[]) =>
    procedure(id, 1, {
      document: {
        title: id,
        steps: calls.map((called) => ({ kind: 'call', procedure: called, version: 1 })),
      },
    } as unknown as Partial<PublishedProcedure>);

  it('leaves out what calls a version that is not here, at any depth; a withdrawn one is here', () => {
    const plug = { ...calling('plug'), status: 'withdrawn' as const };
    const all = [calling('seal', 'plug'), plug, calling('round', 'hold'), calling('hold', 'vent')];
    expect(readyOffline(all).map(({ id }) => id)).toEqual(['seal']);
    expect(readyOffline([...all, calling('vent')]).map(({ id }) => id)).toEqual(['hold', 'round', 'seal', 'vent']);
  });
});

describe('fitsOf', () => {
  const seal = procedure('seal', 1, {}, { codes: ['P0068', 'P0171'], symptoms: ['whistle at idle', 'oil mist'] });
  const trims = procedure('trims', 1, {}, { codes: ['P0171'], symptoms: ['hesitates when cold'] });
  const fit = (codes: string[], concern: string) =>
    fitsOf([trims, seal], { codes, concern })
      .filter(isFit)
      .map((found) => [found.procedure.id, ...found.codes, ...found.symptoms]);

  it('finds by code', () => expect(fit(['P0068'], 'none')).toEqual([['seal', 'P0068']]));

  it('finds by what the customer says, however the words are bent', () => {
    expect(fit([], 'Whistles at idle')).toEqual([['seal', 'whistle at idle']]);
    expect(fit([], 'some hesitation while it is cold')).toEqual([['trims', 'hesitates when cold']]);
  });

  it('puts what fits best first', () => {
    expect(fit(['P0171'], 'whistle at idle').map(([id]) => id)).toEqual(['seal', 'trims']);
  });

  it('finds nothing in words that only half fit', () => expect(fit([], 'idle is rough')).toEqual([]));
});
