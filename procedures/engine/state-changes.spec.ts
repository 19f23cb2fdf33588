import { applyEvent, replay, type InstrumentSnapshot, type RunState } from '.';
import { compileProcedure } from '../document';
import { longProcedure } from '../document/testing/long-procedure';
import {
  added,
  changedFrom,
  changingInPlace,
  countedUp,
  draftOf,
  entriesOfStep,
  lastChanged,
  withEntry,
  withoutEntry,
  withoutStep,
} from './state-changes';
import { RunWalk } from './testing/run-walk';

const compiled = compileProcedure(longProcedure(12, 3));
if (!compiled.ok) throw new Error(JSON.stringify(compiled.problems));
const { procedure } = compiled;

const gear = (role: string, kind: InstrumentSnapshot['kind']): InstrumentSnapshot => ({
  id: role,
  kind,
  label: role,
  shows: [{ unit: 'kPa', low: 0, high: 250, resolution: 0.1, accuracy: 0.25 }],
  dueOn: '2027-03-01',
});

/** A run with readings, limits of loops, steps taken again, ways overruled and a finding. */
function detouringRun(): RunWalk {
  const walk = new RunWalk(procedure);
  walk
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: gear('gauge', 'pressure-gauge') },
      { do: 'choose-gear', role: 'scanTool', instrument: gear('scanTool', 'scan-tool') },
      { do: 'confirm' },
    );
  const read = (text: string): void => {
    const name = walk.state.current?.id.replace('read', 'pressure') ?? '';
    walk.do({ do: 'record', name, text, unit: 'kPa' });
  };
  for (const text of ['5.0', '5.4', '10.4', '10.4', '10.4']) read(text);
  walk.do({ do: 'redo', step: 'read1', reason: 'the hose had slipped' });
  for (const text of ['5.2', '5.3', '5.2', '5.1']) read(text);
  walk.do({ do: 'overrule', exit: 'next-1', reason: 'it is off' });
  walk.do({ do: 'note', text: 'windy' }, { do: 'redo', step: 'read0', reason: 'from the start' });
  for (let reading = 0; reading < 12; reading += 1) read('5.5');
  while (walk.state.disturbed[0] !== undefined) walk.do({ do: 'restore', item: walk.state.disturbed[0].item });
  return walk;
}

function frozen<T>(value: T): T {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value);
    Object.values(value).forEach(frozen);
  }
  return value;
}

describe('a replay that changes in place', () => {
  it('gives the states that applying one event after the other gives, and leaves those as they are', () => {
    const { header, events, state } = detouringRun();
    expect(state.finding).toBeDefined();
    const states: RunState[] = [];
    for (const event of events) {
      const applied = applyEvent(procedure, header, states.at(-1), event);
      if (!applied.ok) throw new Error(applied.refusal.what);
      states.push(frozen(applied.state));
    }
    for (const [index, before] of states.entries()) {
      expect(replay(procedure, header, events.slice(0, index + 1))).toEqual({ ok: true, state: before });
      const after = replay(procedure, header, events.slice(index + 1), before);
      expect(after).toEqual({ ok: true, state });
    }
  });

  it('lets go of the state that it gives', () => {
    const { header, events } = detouringRun();
    const half = replay(procedure, header, events.slice(0, 40));
    if (!half.ok) throw new Error(half.refusal.what);
    const before = JSON.parse(JSON.stringify(half.state)) as RunState;
    replay(procedure, header, events.slice(40), half.state);
    applyEvent(procedure, header, half.state, events[40]!);
    expect(half.state).toEqual(before);
  });

  it('leaves nothing behind when an event is refused', () => {
    const { header, events } = detouringRun();
    expect(replay(procedure, header, [...events.slice(0, 20), events[25]!])).toMatchObject({ ok: false });
    const list: readonly number[] = [1];
    expect([added(list, 2), list]).toEqual([[1, 2], [1]]);
  });
});

describe('changes of lists and records', () => {
  const list = frozen([1, 2, 3, 4, 5, 6, 7, 8]);
  const record = frozen({ a: { step: 'one' }, b: { step: 'two' }, c: { step: 'one' } });

  const changes = (): unknown => {
    let counts: Readonly<Record<string, number>> = frozen({ a: 1 });
    for (const name of ['a', 'b', 'a']) counts = countedUp(counts, name);
    const moved = withEntry(withEntry(record, 'c', { step: 'two' }), 'd', { step: 'one' });
    const ofOne = entriesOfStep(moved, 'one').length;
    const again = withEntry(withoutStep(moved, 'one'), 'a', { step: 'two' });
    return {
      counts,
      list: changedFrom(added(added(list, 9), 10), 8, (entry) => entry * 10),
      nothing: [changedFrom([], -1, (entry: number) => entry), changedFrom(list, 8, (entry) => entry * 10)],
      ofOne,
      ofTwo: entriesOfStep(again, 'two').length,
      again: Object.entries(withoutEntry(again, 'b')),
      untouched: [withoutStep(record, 'three') === record, withoutEntry(record, 'z') === record],
    };
  };

  it('are the same in place and by copies', () => {
    const expected = {
      counts: { a: 3, b: 1 },
      list: [1, 2, 3, 4, 5, 6, 7, 8, 90, 100],
      nothing: [[], list],
      ofOne: 2,
      again: [
        ['c', { step: 'two' }],
        ['a', { step: 'two' }],
      ],
      ofTwo: 3,
      untouched: [true, true],
    };
    expect(changes()).toEqual(expected);
    expect(changingInPlace(changes)).toEqual(expected);
  });

  it('changes the last entry of a list, and no entry that was there before', () => {
    const claims = frozen(Array.from({ length: 9 }, (_, index) => ({ step: `s${index}`, count: 0 })));
    const twice = (): unknown => {
      const once = lastChanged(claims, (draft) => (draft.count += 1));
      const grown = added(once, { step: 's9', count: 10 });
      return lastChanged(
        lastChanged(grown, (draft) => (draft.count += 1)),
        (draft) => (draft.count += 1),
      );
    };
    const expected = [...claims.slice(0, 8), { step: 's8', count: 1 }, { step: 's9', count: 12 }];
    expect(twice()).toEqual(expected);
    expect(changingInPlace(twice)).toEqual(expected);
    expect(lastChanged([], () => undefined)).toEqual([]);
  });

  it('makes drafts that have every field of the state', () => {
    const { state } = detouringRun();
    expect(draftOf(frozen(state))).toEqual(state);
    expect(Object.keys(draftOf(state))).toEqual(Object.keys(state));
  });
});
