import fc from 'fast-check';
import {
  applyEvent,
  readSnapshot,
  replay,
  replayFrom,
  takeSnapshot,
  verifyChain,
  type RunState,
} from '../../procedures/engine';
import { walkAtRandom } from '../support/random-walk';

/*
 * Laws of the engine over ways that nobody authored a test for: whatever a person answers, a run comes to a finding
 * within the authored bounds, closes with nothing disturbed, and replays to the same state.
 */

const runs = { seed: 20261201, numRuns: 150 };

describe('a random walk through the valve seal procedure', () => {
  const ways = fc.tuple(
    fc.constantFrom<'cold' | 'warm'>('cold', 'warm'),
    fc.array(fc.nat({ max: 9999 }), { minLength: 20, maxLength: 400 }),
  );

  it('comes to a finding and closes with nothing left apart', () => {
    const reached = new Set<string>();
    fc.assert(
      fc.property(ways, ([half, choices]) => {
        const walk = walkAtRandom(half, choices);
        expect(walk.state.disturbed).toEqual([]);
        walk.do({ do: 'close' });
        expect(walk.state.status).toBe('closed');
        reached.add(walk.state.finding ?? '');
      }),
      runs,
    );
    expect(reached.size).toBeGreaterThan(4);
  });

  it('replays to the same state, from any snapshot, with no discrepancy', () => {
    fc.assert(
      fc.property(ways, fc.nat(), ([half, choices], cut) => {
        const walk = walkAtRandom(half, choices);
        const { header, events, state, procedure } = walk;
        expect(verifyChain(header, events)).toEqual({ ok: true, head: state.head });
        expect(replay(procedure, header, events)).toEqual({ ok: true, state });
        expect(state.discrepancies).toEqual([]);
        const at = 1 + (cut % (events.length - 1));
        const snapshot = replay(procedure, header, events.slice(0, at));
        expect(snapshot.ok && replay(procedure, header, events.slice(at), snapshot.state)).toEqual({ ok: true, state });
      }),
      { ...runs, numRuns: 60 },
    );
  });

  it('is the same from a snapshot after any of its events, sent as text, as from the start', () => {
    let cuts = 0;
    fc.assert(
      fc.property(ways, ([half, choices]) => {
        const { header, events, state: end, procedure } = walkAtRandom(half, choices);
        const place = { procedure, header, build: 'spec' };
        let state: RunState | undefined;
        events.forEach((event, index) => {
          const next = applyEvent(procedure, header, state, event);
          if (!next.ok) throw new Error(next.refusal.what);
          state = next.state;
          const snapshot = JSON.parse(JSON.stringify(takeSnapshot(state, 'spec'))) as unknown;
          expect(readSnapshot(place, snapshot)).toStrictEqual({ ok: true, state });
          // What is read again is long: every eighth snapshot goes on to the end.
          if (index % 8 === 0) {
            expect(replayFrom(place, events, snapshot)).toStrictEqual({
              from: index + 1,
              result: { ok: true, state: end },
            });
          }
          cuts += 1;
        });
      }),
      { ...runs, numRuns: 12 },
    );
    expect(cuts).toBeGreaterThan(500);
  });
});
