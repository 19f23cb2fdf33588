import type { RunEvent, RunEventData } from './run-event';
import { validateRunEvent } from './validate-event';

const hash = 'ab'.repeat(32);
const figure = { text: '93.90', unit: 'kPa', sense: 'absolute' } as const;

/** One of each type, with every field that it can have. */
const dataOf: RunEventData = {
  opened: {
    visit: {
      repairOrder: '4417',
      vin: '1ZZBT4CK4LR204817',
      car: 'Merrow Heron 1.6 turbo, silver',
      odometer: { text: '84210', unit: 'km' },
      concern: 'Whistle at idle',
      codes: ['P0068'],
    },
    siteName: 'Ossenholt',
    inputs: { elevation: { text: '640', unit: 'm', source: 'the site' } },
    person: 'I. Okafor',
    again: { because: 'Repaired since', besides: ['0197f3a0-0000-7000-8000-0000000000aa'] },
  },
  'gear-chosen': {
    role: 'gauge',
    instrument: {
      id: 'g-12',
      kind: 'pressure-gauge',
      label: 'G-12',
      shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
      dueOn: '2026-12-10',
    },
    overdueBecause: 'no other one',
  },
  'step-claimed': { step: 'start' },
  'step-done': { step: 'start' },
  'caution-acknowledged': { step: 'start', caution: 0 },
  'reading-recorded': {
    step: 'manifold-pressure',
    name: 'manifoldPressure',
    figure,
    source: 'typed',
    way: 'barometer',
    instrument: 's-3',
    resolution: '0.1',
    uncertainty: '0.6',
    timeS: 1.5,
  },
  'not-measurable': { step: 'a', reason: 'no signal' },
  'not-applicable': { step: 'a', reason: 'no such part' },
  predicted: { step: 'a', option: 'airAtJoint' },
  'series-recorded': {
    step: 'a',
    name: 'ramp',
    sha256: hash,
    bytes: 10,
    samples: 2,
    durationS: 0.5,
    channels: [{ name: 'gauge', unit: 'kPa', column: 'P' }],
    source: 'file',
    fileName: 'ramp.csv',
    skipped: 1,
    problems: ['line 3'],
  },
  'mark-placed': { step: 'a', series: 'ramp', mark: 'noise-begins', timeS: 3, by: 'pedal' },
  'codes-recorded': { step: 'a', name: 'codes', codes: [{ code: 'P0068', status: 'stored', freezeFrame: 'idle' }] },
  'timer-started': { step: 'a', seconds: 30 },
  'timer-ended': { step: 'a', certain: true },
  'choice-made': { step: 'a', name: 'airAt', options: ['airAtJoint'], text: 'clamp' },
  'photo-attached': { step: 'a', sha256: hash, bytes: 10, mediaType: 'image/jpeg' },
  'note-written': { step: 'a', text: 'a note' },
  'margin-note-written': { step: 'a', text: 'a note' },
  disturbed: { step: 'a', item: 'dipstick', label: 'dipstick' },
  restored: { step: 'a', item: 'dipstick' },
  'branch-taken': {
    step: 'a',
    to: 'b',
    exit: 'next-0',
    when: 'x > 2 kPa',
    inputs: [{ name: 'x', label: 'X', text: '3', unit: 'kPa', uncertainty: '0.1' }],
    because: 'it is',
    verdict: 'seals',
    reason: 'the plug moved',
  },
  'branch-overruled': { step: 'a', computed: 'next-0', chosen: 'otherwise', reason: 'heard it' },
  'step-redone': { step: 'a', reason: 'slipped' },
  undone: { seq: 3, reason: 'slipped' },
  'lead-called': { step: 'a', question: 'which port?' },
  released: { step: 'a', evidence: 'seen', by: 'lead' },
  'set-aside': { reason: 'lunch' },
  resumed: { from: 'stopped', reason: 'the plug sits again' },
  'handed-over': { to: 'adeyemi', reason: 'shift' },
  'limit-exceeded': { step: 'a', limit: 'ceiling', name: 'gauge', figure },
  'alert-raised': { step: 'a', text: 'hot' },
  'alert-acknowledged': { seq: 3 },
  stopped: { step: 'a', reason: 'plug moved' },
  'version-notice-answered': { version: 2, answer: 'go-on' },
  'finding-reached': { finding: 'seals', verdict: 'It seals.' },
  'write-up-written': { concern: 'c', cause: 'c', correction: 'c', customer: 'c', edited: ['cause'] },
  closed: { finding: 'seals' },
  verified: { step: 'a', by: 'adeyemi' },
  signed: { head: hash, meaning: 'performed', signature: 'c2ln', key: 'a2V5' },
  amended: { text: 'the other bank', reason: 'mixed up' },
  joined: { branch: 'tail-2', head: hash },
  'clock-jumped': { byMs: -3_600_000 },
  transcribed: { from: 'paper' },
};
const types = Object.keys(dataOf) as (keyof RunEventData)[];

function eventOf(type: keyof RunEventData): Record<string, unknown> & { data: Record<string, unknown> } {
  const event = {
    runId: '0190a7f0-0000-7000-8000-000000000001',
    seq: 1,
    id: '0190a7f0-0000-7000-8000-000000000002',
    at: 1_790_000_000_000,
    elapsed: 0,
    actor: 'okafor',
    device: 'B2',
    build: '0.1.0',
    schema: 1,
    prev: hash,
    hash,
    type,
    data: dataOf[type],
  } as RunEvent;
  return JSON.parse(JSON.stringify(event)) as ReturnType<typeof eventOf>;
}

/** The fields that an event's data may do without. */
const optional: Readonly<Partial<Record<keyof RunEventData, readonly string[]>>> = {
  opened: ['again'],
  'gear-chosen': ['overdueBecause'],
  'reading-recorded': ['way', 'instrument', 'resolution', 'uncertainty', 'timeS'],
  'series-recorded': ['fileName'],
  'choice-made': ['text'],
  'branch-taken': ['when', 'verdict', 'reason'],
  resumed: ['reason'],
};

describe.each(types)('%s', (type) => {
  it('is accepted as it is', () => {
    expect(validateRunEvent(eventOf(type))).toMatchObject({ ok: true });
  });

  it('is refused with a field that it does not have', () => {
    const event = eventOf(type);
    expect(validateRunEvent({ ...event, extra: 1 }).ok).toBe(false);
    expect(validateRunEvent({ ...event, data: { ...event.data, extra: 1 } }).ok).toBe(false);
  });

  it('is refused without a field that it needs', () => {
    const event = eventOf(type);
    for (const field of Object.keys(event)) {
      const without = { ...event } as Record<string, unknown>;
      delete without[field];
      expect([field, validateRunEvent(without).ok]).toEqual([field, false]);
    }
    for (const field of Object.keys(event.data)) {
      const data = { ...event.data };
      delete data[field];
      expect([field, validateRunEvent({ ...event, data }).ok]).toEqual([
        field,
        optional[type]?.includes(field) ?? false,
      ]);
    }
  });

  it('is refused with another kind of value in any field', () => {
    const event = eventOf(type);
    for (const field of Object.keys(event.data)) {
      expect([field, validateRunEvent({ ...event, data: { ...event.data, [field]: { odd: true } } }).ok]).toEqual([
        field,
        false,
      ]);
    }
  });
});

it('refuses the data of another type, and what is no event at all, with the place', () => {
  expect(validateRunEvent({ ...eventOf('closed'), type: 'stopped' })).toMatchObject({ ok: false });
  expect(validateRunEvent({ ...eventOf('closed'), type: 'erased' })).toMatchObject({
    ok: false,
    problems: [{ pointer: '/type' }],
  });
  for (const value of [null, 3, 'closed', [], {}]) expect(validateRunEvent(value).ok).toBe(false);
});

it('answers with at most 20 problems', () => {
  const codes = Array.from({ length: 200 }, () => ({ code: 1, status: 2 }));
  const answer = validateRunEvent({ ...eventOf('codes-recorded'), data: { step: 'a', name: 'codes', codes } });
  if (answer.ok) throw new Error('accepted');
  expect(answer.problems).toHaveLength(20);
});
