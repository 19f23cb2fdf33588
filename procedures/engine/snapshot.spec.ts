import fc from 'fast-check';
import { compileProcedure } from '../document';
import { readSnapshot, replay, replayFrom, snapshotFormat, takeSnapshot } from '.';
import { canonicalJson } from './canonical-json';
import { sha256Hex } from './sha256';
import { anyJson, withPlace } from './testing/arbitrary-events';
import { RunWalk } from './testing/run-walk';
import { smallProcedure } from './testing/small-procedure';
import { atListen, procedure, record, series } from './testing/small-walks';

const walk = atListen()
  .do({ do: 'import-series', record, series }, { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' })
  .do({ do: 'stop', reason: 'plug moved' }, { do: 'leave-stop', how: 'not-completed' });
const place = { procedure, header: walk.header, build: 'spec' };
const snapshot = takeSnapshot(walk.state, 'spec');

/** The same with its own hash put right again. */
function rehashed(changed: Record<string, unknown>): unknown {
  const { hash: _old, ...rest } = changed;
  return { ...rest, hash: sha256Hex(canonicalJson(rest)) };
}

describe('a snapshot', () => {
  it('is text that holds the state, the document, the run, the build and the head of the chain', () => {
    const { format, build, contentHash, seq, head } = JSON.parse(JSON.stringify(snapshot)) as typeof snapshot;
    expect({ format, build, contentHash, seq, head }).toEqual({
      format: snapshotFormat,
      build: 'spec',
      contentHash: walk.header.contentHash,
      seq: walk.events.length,
      head: walk.events.at(-1)?.hash,
    });
  });

  it('spares the events before it', () => {
    const later = new RunWalk(procedure);
    later.events.splice(0, later.events.length, ...walk.events);
    later.state = walk.state;
    later.do({ do: 'restore', item: 'dipstick' }, { do: 'close' });
    expect(replayFrom(place, later.events, snapshot)).toStrictEqual({
      from: walk.events.length,
      result: { ok: true, state: later.state },
    });
  });

  const other = compileProcedure({ ...smallProcedure, title: 'Another one' });
  if (!other.ok) throw new Error(JSON.stringify(other.problems));

  it.each([
    ['of another form', 'other-format', place, rehashed({ ...snapshot, format: snapshotFormat + 1 })],
    ['of another build', 'other-build', { ...place, build: 'newer' }, snapshot],
    ['of another document', 'other-document', { ...place, procedure: other.procedure }, snapshot],
    ['of another run', 'other-run', { ...place, header: { ...walk.header, kind: 'practice' as const } }, snapshot],
    ['that was changed', 'damaged', place, { ...snapshot, state: { ...snapshot.state, finding: 'seals' } }],
    ['whose head is another', 'damaged', place, rehashed({ ...snapshot, head: 'ab'.repeat(32) })],
    ['that is none', 'malformed', place, null],
  ])('%s is not used, and the replay begins at the start', (_words, code, where, given) => {
    const read = readSnapshot(where, given);
    expect(read).toMatchObject({
      ok: false,
      problem: { code, what: expect.stringMatching(/^the snapshot /) as string },
    });
    const replayed = replayFrom(where, walk.events, given);
    expect(replayed).toMatchObject({ from: 0, problem: { code } });
    expect(replayed.result).toStrictEqual(replay(where.procedure, where.header, walk.events));
  });

  it('of a chain that went another way is not used', () => {
    const events = walk.events.slice(0, -1);
    expect(replayFrom(place, events, snapshot)).toMatchObject({ from: 0, problem: { code: 'other-chain' } });
    expect(replayFrom(place, events, snapshot).result).toStrictEqual(replay(procedure, walk.header, events));
  });

  it('with anything wrong in any place gives what the start gives, and never throws', () => {
    const expected = replay(procedure, walk.header, walk.events);
    let refused = 0;
    fc.assert(
      fc.property(fc.nat(), anyJson, fc.boolean(), (at, value, isLeftOut) => {
        const damaged = withPlace(snapshot, at, isLeftOut ? undefined : value);
        const replayed = replayFrom(place, walk.events, damaged);
        expect(replayed.result).toStrictEqual(expected);
        refused += replayed.problem === undefined ? 0 : 1;
      }),
      { seed: 20261201, numRuns: 400 },
    );
    expect(refused).toBeGreaterThan(380);
  });

  it('has the members that its form stands for: whoever changes one counts the form up', () => {
    const members = Object.keys(walk.state).sort().join(' ');
    expect({ form: snapshotFormat, members }).toEqual({
      form: 4,
      members:
        'alarm branchCounts choices clockJumps codes current discrepancies disturbed due exceeded finding gear head header inputs lastAt openedAt openedBy overruled pause personName photos seq series siteName status truths values verdict visit walked writeUp',
    });
  });
});
