import fc from 'fast-check';
import { canonicalJson } from './canonical-json';
import { headerHash, sealEvent, verifyChain } from './chain';
import type { EventDraft, RunEvent, RunHeader } from './run-event';
import { sha256Hex } from './sha256';

const header: RunHeader = {
  runId: '0190a7f0-0000-7000-8000-000000000001',
  procedureId: 'crankcase-valve-seal',
  version: 1,
  contentHash: 'c0'.repeat(32),
  visitId: '0190a7f0-0000-7000-8000-000000000002',
  siteId: 'ossenholt',
  kind: 'real',
};

function chainOf(length: number): RunEvent[] {
  const events: RunEvent[] = [];
  let prev = headerHash(header);
  for (let seq = 1; seq <= length; seq += 1) {
    const draft: EventDraft = { type: 'note-written', data: { step: 'one', text: `note ${seq}` } };
    const event = sealEvent(draft, {
      runId: header.runId,
      seq,
      id: `id-${seq}`,
      at: 1_790_000_000_000 + seq,
      elapsed: seq,
      actor: 'okafor',
      device: 'B2',
      build: 'test',
      prev,
    });
    events.push(event);
    prev = event.hash;
  }
  return events;
}

describe('canonical JSON', () => {
  it('reproduces the example of RFC 8785, section 3.2.2 and 3.2.3', () => {
    const example = JSON.parse(
      '{"numbers":[333333333.33333329,1E30,4.50,2e-3,0.000000000000000000000000001],"string":"\\u20ac$\\u000F\\u000aA\'\\u0042\\u0022\\u005c\\\\\\"\\/","literals":[null,true,false]}',
    ) as unknown;
    expect(canonicalJson(example)).toBe(
      '{"literals":[null,true,false],"numbers":[333333333.3333333,1e+30,4.5,0.002,1e-27],"string":"\u20ac$\\u000f\\nA\'B\\"\\\\\\\\\\"/"}',
    );
  });

  it('refuses what JSON cannot hold', () => {
    expect(() => canonicalJson(undefined)).toThrow(TypeError);
    expect(() => canonicalJson({ a: Number.NaN })).toThrow();
  });
});

describe('SHA-256', () => {
  it.each([
    ['', 'e3b0c44298fc1c149afbf4c8996fb92427ae41e4649b934ca495991b7852b855'],
    ['abc', 'ba7816bf8f01cfea414140de5dae2223b00361a396177a9cb410ff61f20015ad'],
  ])('reproduces FIPS 180-4 example %j', (text, hash) => {
    expect(sha256Hex(text)).toBe(hash);
  });
});

describe('the chain', () => {
  const whole = chainOf(200);

  it('holds over a run of 200 events', () => {
    expect(verifyChain(header, whole)).toEqual({ ok: true, head: whole.at(-1)?.hash });
  });

  it('does not hold under another header', () => {
    expect(verifyChain({ ...header, kind: 'practice' }, whole)).toMatchObject({ ok: false, seq: 1 });
  });

  it('names the first wrong event of every single drop, insertion, swap and change', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 0, max: 198 }),
        fc.constantFrom('drop', 'insert', 'swap', 'change', 'rehash'),
        (at, how) => {
          const events = [...whole];
          const event = events[at] as RunEvent;
          const changed = { ...event, data: { step: 'one', text: 'another' } } as RunEvent;
          if (how === 'drop') events.splice(at, 1);
          if (how === 'insert') events.splice(at, 0, event);
          if (how === 'swap') events.splice(at, 2, events[at + 1] as RunEvent, event);
          if (how === 'change') events[at] = changed;
          if (how === 'rehash') {
            events[at] = sealEvent(changed as EventDraft, event);
          }
          const verdict = verifyChain(header, events);
          const first = { drop: at + 1, insert: at + 2, swap: at + 1, change: at + 1, rehash: at + 2 }[how];
          expect(verdict).toMatchObject({ ok: false, seq: first });
        },
      ),
      { seed: 20261201, numRuns: 400 },
    );
  });
});
