import fc from 'fast-check';
import {
  applyEvent,
  canonicalJson,
  headerHash,
  replay,
  sealEvent,
  type EventDraft,
  type Refusal,
  type ReplayResult,
  type RunEvent,
  type RunEventType,
  type RunHeader,
  type RunState,
} from '.';
import { problemWithShape } from './event-shape';
import { anyDraft, anyJson, dataOf, placesIn, replaced, withPlace } from './testing/arbitrary-events';
import { RunWalk } from './testing/run-walk';
import { atListen, procedure, record, series } from './testing/small-walks';
import { validateRunEvent } from './validate-event';

const options = { seed: 20261201 };

/** A whole run with a ramp, a limit exceeded, a pause, a step taken again and one overruled, closed. */
function wholeRun(): RunWalk {
  return atListen().do(
    { do: 'record', name: 'gauge', text: '36.0', unit: 'kPa', timeS: 4 },
    { do: 'acknowledge-limit' },
    { do: 'set-aside', reason: 'phone call' },
    { do: 'resume' },
    { do: 'import-series', record, series },
    { do: 'mark', mark: 'noise-begins', timeS: 5, by: 'tap' },
    { do: 'finish-listening', series },
    { do: 'choose', options: ['airAtJoint'], text: 'hose at the cooler' },
    { do: 'redo', step: 'listen', reason: 'a slip' },
    { do: 'cannot-measure', reason: 'no light' },
    { do: 'restore', item: 'dipstick' },
    { do: 'close' },
  );
}

/** The state after each of its events. */
function statesOf({ header, events }: RunWalk): readonly RunState[] {
  let state: RunState | undefined;
  return events.map((event) => {
    const result = applyEvent(procedure, header, state, event);
    if (!result.ok) throw new Error(result.refusal.what);
    state = result.state;
    return state;
  });
}

function sealed(
  draft: unknown,
  header: RunHeader,
  state: RunState | undefined,
  place: Partial<RunEvent> = {},
): RunEvent {
  const seq = (state?.seq ?? 0) + 1;
  return sealEvent(draft as EventDraft, {
    runId: header.runId,
    seq,
    id: `0190a7f0-0000-7000-8000-${String(seq).padStart(12, '0')}`,
    at: 1_790_000_000_000 + seq * 1000,
    elapsed: seq * 1000,
    actor: 'okafor',
    device: 'B2',
    build: 'spec',
    prev: state?.head ?? headerHash(header),
    ...place,
  });
}

/** A refusal names the place, and says why in words; a state is one that JSON can hold. */
function expectTotal(result: ReplayResult, seq: number): void {
  if (result.ok) {
    expect(JSON.parse(canonicalJson(result.state))).toBeTruthy();
    return;
  }
  const { what, seq: at, id, code }: Refusal = result.refusal;
  expect({ at, id: typeof id, code: typeof code }).toEqual({
    at: seq,
    id: expect.stringMatching(/string|undefined/),
    code: 'string',
  });
  expect(what).toMatch(/[a-z]+ [a-z]+/i);
  expect(what).not.toMatch(/undefined|\[object/);
}

describe('any events at all', () => {
  const { header } = new RunWalk(procedure);

  it('in any shape give a refusal of the first, with its place', () => {
    fc.assert(
      fc.property(fc.array(fc.oneof(anyJson, fc.anything()), { maxLength: 5 }), (events) => {
        const result = replay(procedure, header, events as RunEvent[]);
        expect(result.ok).toBe(false);
        expectTotal(result, 1);
      }),
      { ...options, numRuns: 2000 },
    );
  });

  it('under any header give a refusal', () => {
    const [first] = new RunWalk(procedure).events;
    fc.assert(
      fc.property(fc.oneof(anyJson, fc.anything()), (odd) => {
        expectTotal(replay(procedure, odd as RunHeader, [first!]), 1);
      }),
      { ...options, numRuns: 500 },
    );
  });

  it('well chained, in any order, with any data, go on or are refused where they stand', () => {
    let accepted = 0;
    const codes = new Set<string>();
    const prefixes = statesOf(wholeRun());
    fc.assert(
      fc.property(fc.nat(), fc.array(anyDraft(procedure), { minLength: 1, maxLength: 30 }), (cut, drafts) => {
        let state = prefixes[cut % prefixes.length]!;
        for (const draft of drafts) {
          const result = applyEvent(procedure, header, state, sealed(draft, header, state));
          expectTotal(result, state.seq + 1);
          if (result.ok) {
            accepted += 1;
            state = result.state;
          } else codes.add(result.refusal.code);
        }
      }),
      { ...options, numRuns: 1000 },
    );
    expect(accepted).toBeGreaterThan(1000);
    expect(codes.size).toBeGreaterThan(8);
  });
});

describe('a run with one wrong thing in it', () => {
  const walk = wholeRun();
  const states = statesOf(walk);

  it('at any place of any event, left out or replaced, sealed as if it were right: a state or a refusal', () => {
    let refused = 0;
    const garbage = [undefined, null, '', '__proto__', 1e308, -1, [], {}, '9'.repeat(400), true];
    walk.events.forEach((event, index) => {
      const before = states[index - 1];
      for (const path of placesIn(event.data)) {
        for (const value of garbage) {
          const draft = { type: event.type, data: replaced(event.data, path, value) };
          const wrong = sealed(draft, walk.header, before);
          const result = applyEvent(procedure, walk.header, before, wrong);
          expectTotal(result, index + 1);
          if (!result.ok) refused += 1;
        }
      }
    });

    expect(refused).toBeGreaterThan(1500);
  });

  it('in the envelope of any event is refused with its place', () => {
    fc.assert(
      fc.property(
        fc.nat(),
        fc.constantFrom('seq', 'id', 'at', 'prev', 'runId', 'schema', 'type', 'data'),
        anyJson,
        (n, field, odd) => {
          const index = n % walk.events.length;
          const event = { ...walk.events[index]!, [field]: odd } as RunEvent;
          expectTotal(applyEvent(procedure, walk.header, states[index - 1], event), index + 1);
        },
      ),
      { ...options, numRuns: 500 },
    );
  });

  it('in another order of its events is refused where the order breaks', () => {
    fc.assert(
      fc.property(fc.shuffledSubarray([...walk.events], { minLength: 1 }), (events) => {
        const result = replay(procedure, walk.header, events);
        const broken = events.findIndex((event, index) => event.seq !== index + 1);
        if (broken < 0) expect(result.ok).toBe(true);
        else expect(result).toMatchObject({ ok: false, refusal: { seq: broken + 1, code: 'chain' } });
      }),
      { ...options, numRuns: 300 },
    );
  });
});

describe('what the engine relies on in an event', () => {
  const types = Object.entries(dataOf(procedure)) as [RunEventType, fc.Arbitrary<unknown>][];
  const anyEvent = fc
    .tuple(
      fc.oneof(...types.map(([type, data]) => fc.record({ type: fc.constant(type), data }))),
      fc.nat(),
      anyJson,
      fc.boolean(),
    )
    .map(([draft, place, value, isWrong]) => {
      const event = sealed(draft, new RunWalk(procedure).header, undefined);
      return isWrong ? withPlace(event, place, value) : event;
    });

  it('is never more than the published schema asks: what the schema accepts has its shape', () => {
    let accepted = 0;
    fc.assert(
      fc.property(anyEvent, (event) => {
        const isValid = validateRunEvent(event).ok;
        if (isValid) expect(problemWithShape(event)).toBeUndefined();
        accepted += isValid ? 1 : 0;
      }),
      { ...options, numRuns: 2000 },
    );
    expect(accepted).toBeGreaterThan(500);
  });
});
