import { EventPlaces, mainBranch, type BranchEnds, type KeptEvent } from './event-place';

const header = 'h';
const main = (headSeq: number): BranchEnds => {
  return { branch: mainBranch, parent: null, fromSeq: 1, headSeq, head: `m${headSeq}` };
};
const kept = (branch: string, letter: string, from: number, to: number): KeptEvent[] =>
  Array.from({ length: to - from + 1 }, (_, i) => ({ branch, seq: from + i, hash: `${letter}${from + i}` }));
const event = (seq: number, hash: string, prev: string) => ({ seq, hash, prev });

describe('the place of an event', () => {
  it('is the beginning of the main branch where nothing is kept', () => {
    const places = new EventPlaces(header, [], []);
    expect(places.placeOf(event(1, 'm1', header))).toEqual({ what: 'append', branch: mainBranch });
    expect(places.placeOf(event(1, 'm1', 'other'))).toEqual({ what: 'broken-chain' });
    expect(places.placeOf(event(2, 'm2', 'm1'))).toEqual({ what: 'gap' });
  });

  it('is after the head, or where it is kept already', () => {
    const places = new EventPlaces(header, [main(3)], kept(mainBranch, 'm', 1, 3));
    expect(places.placeOf(event(2, 'm2', 'm1'))).toEqual({ what: 'kept', branch: mainBranch });
    expect(places.placeOf(event(4, 'm4', 'm3'))).toEqual({ what: 'append', branch: mainBranch });
    expect(places.placeOf(event(5, 'm5', 'm4'))).toEqual({ what: 'gap' });
    expect(places.placeOf(event(4, 'x4', 'x3'))).toEqual({ what: 'broken-chain' });
  });

  it('is a branch of its own after an event inside of a branch, and goes on there', () => {
    const places = new EventPlaces(header, [main(3)], kept(mainBranch, 'm', 1, 3));
    const first = event(2, 'x2', 'm1');
    const place = places.placeOf(first);
    expect(place).toEqual({ what: 'fork', branch: 'x2', parent: mainBranch });
    places.put(first, place);
    expect(places.branch('x2')).toEqual({ branch: 'x2', parent: mainBranch, fromSeq: 2, headSeq: 2, head: 'x2' });
    const second = event(3, 'x3', 'x2');
    places.put(second, places.placeOf(second));
    expect(places.branch('x2')).toMatchObject({ headSeq: 3, head: 'x3' });
    expect(places.branch(mainBranch)).toMatchObject({ headSeq: 3, head: 'm3' });
    expect(places.placeOf(event(3, 'y3', 'x2'))).toEqual({ what: 'fork', branch: 'y3', parent: 'x2' });
  });

  it('is a branch from the root for another first event', () => {
    const places = new EventPlaces(header, [main(1)], kept(mainBranch, 'm', 1, 1));
    expect(places.placeOf(event(1, 'x1', header))).toEqual({ what: 'fork', branch: 'x1', parent: mainBranch });
  });
});
