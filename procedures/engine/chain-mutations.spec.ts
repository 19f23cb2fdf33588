import {
  applyEvent,
  brokenLink,
  canonicalJson,
  headerHash,
  replay,
  sealEvent,
  verifyChain,
  type EventDraft,
  type RunEvent,
  type RunState,
} from '.';
import { placesIn, replaced } from './testing/arbitrary-events';
import { RunWalk } from './testing/run-walk';
import { fineGauge, procedure, scanTool } from './testing/small-walks';

/** A real run of 200 events: most of them points of a ramp that were typed, with notes between. */
function longRun(): RunWalk {
  const walk = new RunWalk(procedure)
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: fineGauge },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
      { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.25', unit: 'hPa' },
    )
    .cautions(1)
    .do({ do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' }, { do: 'confirm' });
  for (let n = 0; walk.events.length < 200; n += 1) {
    if (n % 5 === 4) walk.do({ do: 'note', text: `note ${n}` });
    else walk.do({ do: 'record', name: 'gauge', text: (n * 0.1).toFixed(1), unit: 'kPa', timeS: n * 2 });
  }
  return walk;
}

/** Another value of the same kind: the smallest change that there is. */
function changed(value: unknown): unknown {
  switch (typeof value) {
    case 'string':
      return value === '' ? ' ' : `${value.slice(0, -1)}${value.endsWith('0') ? '1' : '0'}`;
    case 'number':
      return value + 1;
    case 'boolean':
      return !value;
    default:
      return Array.isArray(value) ? [...value, null] : { ...(value as object), added: null };
  }
}

describe('every single change of a run of 200 events', () => {
  const { header, events, state } = longRun();
  const head = state.head;

  let asked = 0;

  /** Where the chain breaks; undefined where it holds. Every tenth time replay is asked too, and has to say the same. */
  function breaksAt(mutated: readonly RunEvent[]): number | undefined {
    const verdict = verifyChain(header, mutated);
    const seq = verdict.ok ? undefined : verdict.seq;
    asked += 1;
    if (asked % 10 === 0) {
      const replayed = replay(procedure, header, mutated);
      expect(replayed.ok ? undefined : replayed.refusal.seq).toBe(seq);
    }
    return seq;
  }

  it('begins with a chain that holds', () => {
    expect(events).toHaveLength(200);
    expect(verifyChain(header, events)).toEqual({ ok: true, head });
  });

  it('of any field of any event, at any depth, is found at that event', () => {
    let mutations = 0;
    let before: RunState | undefined;
    events.forEach((event, index) => {
      for (const path of placesIn(event).slice(1)) {
        const value = path.reduce<unknown>((at, key) => (at as Record<string, unknown>)[key], event);
        for (const next of [changed(value), undefined]) {
          const wrong = replaced(event, path, next) as RunEvent;
          const prev = before?.head ?? headerHash(header);
          expect(brokenLink(header, wrong, index + 1, prev)).toMatch(/^event \d+ /);
          const result = applyEvent(procedure, header, before, wrong);
          expect(result.ok ? undefined : result.refusal.seq).toBe(index + 1);
          // The whole chain is read now and then: what comes before is the same each time.
          if (mutations % 50 === 0) expect(breaksAt(events.with(index, wrong))).toBe(index + 1);
          mutations += 1;
        }
      }
      const after = applyEvent(procedure, header, before, event);
      if (!after.ok) throw new Error(after.refusal.what);
      before = after.state;
    });
    expect(mutations).toBeGreaterThan(6000);
  }, 120_000);

  it('by leaving one out is found where it is missing; at the end only the known head tells', () => {
    events.forEach((_, index) => {
      const rest = events.toSpliced(index, 1);
      if (index < 199) expect(breaksAt(rest)).toBe(index + 1);
      else expect(verifyChain(header, rest)).not.toEqual({ ok: true, head });
    });
  });

  it('by changing two neighbours about is found at the first of them', () => {
    for (let index = 0; index < 199; index += 1) {
      const [first, second] = events.slice(index, index + 2) as [RunEvent, RunEvent];
      expect(breaksAt(events.toSpliced(index, 2, second, first))).toBe(index + 1);
    }
  });

  it('by putting an event in twice, or a foreign one, or one sealed for its place, is found', () => {
    for (let index = 0; index <= 199; index += 1) {
      const event = events[index]!;
      expect(breaksAt(events.toSpliced(index, 0, event))).toBe(index + 2);
      const other = sealEvent({ type: 'note-written', data: { step: 'listen', text: 'put in' } }, event);
      // Sealed for the place it takes, it holds itself; the one that it pushes on does not.
      expect(verifyChain(header, events.toSpliced(index, 0, other))).toMatchObject({ ok: false, seq: index + 2 });
      const elsewhere = sealEvent(other as EventDraft, { ...event, runId: '0190a7f0-0000-7000-8000-0000000000ff' });
      expect(breaksAt(events.toSpliced(index, 0, elsewhere))).toBe(index + 1);
    }
  });

  it('by writing one anew with its own hash put right is found at the next; the last only by the known head', () => {
    events.forEach((event, index) => {
      const anew = sealEvent({ type: 'note-written', data: { step: 'listen', text: 'written anew' } }, event);
      const verdict = verifyChain(header, events.with(index, anew));
      if (index < 199) expect(verdict).toMatchObject({ ok: false, seq: index + 2 });
      else expect(verdict).toEqual({ ok: true, head: expect.not.stringContaining(head) as string });
    });
  });

  it('by cutting off the end leaves a chain that holds with another head: a known head tells', () => {
    const heads = new Set<string>();
    for (let length = 0; length < 200; length += 1) {
      const verdict = verifyChain(header, events.slice(0, length));
      if (!verdict.ok) throw new Error(verdict.what);
      heads.add(verdict.head);
    }
    expect(heads.size).toBe(200);
    expect(heads.has(head)).toBe(false);
  });

  it('of any field of the header is found at the first event', () => {
    for (const path of placesIn(header).slice(1)) {
      const value = path.reduce<unknown>((at, key) => (at as Record<string, unknown>)[key], header);
      const other = replaced(header, path, changed(value)) as typeof header;
      expect(canonicalJson(other)).not.toBe(canonicalJson(header));
      expect(verifyChain(other, events)).toMatchObject({ ok: false, seq: 1 });
    }
  });
});
