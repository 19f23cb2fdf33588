import fc from 'fast-check';
import type { ProcedureDocument, Step } from '../../document';
import { canonicalJson, contentHash, exitsOf, type RunEventData, type RunEventType } from '..';
import type { CompiledProcedure } from '../../document';

/** Words that make records, parsers and patterns stumble. */
const oddWords = [
  '',
  ' ',
  '__proto__',
  'constructor',
  'hasOwnProperty',
  'toString',
  '9'.repeat(400),
  '1e999',
  '-0',
  'NaN',
  '12,5',
  '\u0000',
  '\ud800',
  'verdict',
] as const;

const oddText = fc.oneof(fc.constantFrom(...oddWords), fc.string({ maxLength: 12 }));

/** Anything that JSON can hold, prototype keys included, and numbers at the end of their range. */
export const anyJson: fc.Arbitrary<unknown> = fc.oneof(
  fc.jsonValue({ maxDepth: 3 }),
  oddText,
  fc.constantFrom(0, -1, 0.5, Number.MAX_VALUE, -Number.MAX_VALUE, Number.MIN_VALUE, 2 ** 53, 1e21, null, true),
  fc.constantFrom<unknown>([], {}, JSON.parse('{"__proto__":{"step":"start"}}'), [[[]]]),
);

const decimal = fc.oneof(
  fc.double({ min: -500, max: 500, noNaN: true }).map((value) => value.toFixed(2)),
  fc.constantFrom('0', '94.2', '1013.25', '-0.0', '9999999', '0.000001'),
  oddText,
);
const unit = fc.constantFrom('kPa', 'hPa', 'Pa', 'degC', 'K', 's', '1', 'dB', 'm', 'L');

/** The names of a document, so that events made from them mean something in a run. */
interface Vocabulary {
  readonly step: fc.Arbitrary<string>;
  readonly name: fc.Arbitrary<string>;
  readonly exit: fc.Arbitrary<string>;
  readonly role: fc.Arbitrary<string>;
  readonly item: fc.Arbitrary<string>;
}

function mostly(words: readonly string[]): fc.Arbitrary<string> {
  const known = [...new Set(words)];
  return known.length === 0
    ? oddText
    : fc.oneof({ weight: 9, arbitrary: fc.constantFrom(...known) }, { weight: 1, arbitrary: oddText });
}

function namesOf(step: Step): readonly string[] {
  switch (step.kind) {
    case 'reading':
    case 'wait':
      return step.reads.flatMap(({ name, ways }) => [name, ...(ways ?? []).map(({ id }) => id)]);
    case 'choice':
      return [step.name, ...step.options.map(({ name }) => name)];
    case 'drive':
      return [step.name, ...step.windows.map(({ name }) => name)];
    case 'listen':
      return [step.name, ...step.channels.map(({ name }) => name), ...step.finds.map(({ name }) => name)];
    case 'codes':
      return [step.name];
    default:
      return [];
  }
}

function vocabularyOf(procedure: CompiledProcedure): Vocabulary {
  const { document } = procedure;
  return {
    step: mostly(document.steps.map(({ id }) => id)),
    name: mostly([...document.steps.flatMap(namesOf), ...document.limits.map(({ id }) => id)]),
    exit: mostly(document.steps.flatMap((step) => exitsOf(procedure, step).map(({ exit }) => exit))),
    role: mostly(document.gear.map(({ role }) => role)),
    item: mostly(document.steps.flatMap(({ disturbs }) => (disturbs ?? []).map(({ item }) => item))),
  };
}

const openedData = (document: ProcedureDocument): RunEventData['opened'] => ({
  visit: {
    repairOrder: '4417',
    vin: '1ZZBT4CK4LR204817',
    car: 'Merrow Heron 1.6 turbo, silver',
    odometer: { text: '84210', unit: 'km' },
    concern: 'Whistle at idle',
    codes: ['P0068'],
  },
  siteName: 'Ossenholt',
  person: 'I. Okafor',
  inputs: Object.fromEntries(
    document.inputs.map(({ name, unit: own, default: text }) => [
      name,
      { text: text ?? '640', unit: own, source: '-' },
    ]),
  ),
});

/**
 * Data of every event type in the right shape, over a document's own names and some that it has not: in what order and
 * with what sense is left to chance.
 */
export function dataOf(procedure: CompiledProcedure): Readonly<Record<RunEventType, fc.Arbitrary<unknown>>> {
  const { step, name, exit, role, item } = vocabularyOf(procedure);
  const words = fc.string({ maxLength: 8 });
  const figure = fc.record({ text: decimal, unit });
  const seq = fc.oneof(fc.integer({ min: 1, max: 40 }), fc.maxSafeNat());
  const seconds = fc.double({ min: 0, max: 1e6, noNaN: true });
  const source = fc.constantFrom('typed', 'file', 'simulated', 'computed');
  const range = fc.record({
    unit,
    low: fc.double({ min: -1e6, max: 0, noNaN: true }),
    high: fc.double({ min: 0, max: 1e6, noNaN: true }),
    resolution: fc.constantFrom(0, 0.1, 1),
    accuracy: fc.constantFrom(0, 0.25, 1e300),
  });
  const hash = fc.constant(contentHash(procedure.authored));
  return {
    opened: fc.constant(openedData(procedure.document)),
    'gear-chosen': fc.record({
      role,
      instrument: fc.record({
        id: words,
        kind: fc.constantFrom('pressure-gauge', 'scan-tool', 'listening-probe', 'barometer', 'thermometer'),
        label: words,
        shows: fc.array(range, { maxLength: 2 }),
        dueOn: fc.constantFrom('2026-12-10', '', 'soon'),
      }),
    }),
    'step-claimed': fc.record({ step }),
    'step-done': fc.record({ step }),
    'caution-acknowledged': fc.record({ step, caution: fc.nat({ max: 3 }) }),
    'reading-recorded': fc.record(
      { step, name, figure, source, way: name, uncertainty: decimal, timeS: seconds },
      { requiredKeys: ['step', 'name', 'figure', 'source'] },
    ),
    'not-measurable': fc.record({ step, reason: words }),
    'not-applicable': fc.record({ step, reason: words }),
    predicted: fc.record({ step, option: name }),
    'series-recorded': fc.record({
      step,
      name,
      sha256: hash,
      bytes: fc.nat(),
      samples: fc.nat(),
      durationS: seconds,
      channels: fc.constant([]),
      source,
      skipped: fc.nat(),
      problems: fc.constant([]),
    }),
    'mark-placed': fc.record({
      step,
      series: name,
      mark: fc.constantFrom('noise-begins', 'noise-stops'),
      timeS: seconds,
      by: fc.constantFrom('tap', 'pedal', 'suggested'),
    }),
    'codes-recorded': fc.record({
      step,
      name,
      codes: fc.array(fc.record({ code: words, status: fc.constant('stored') })),
    }),
    'timer-started': fc.record({ step, seconds }),
    'timer-ended': fc.record({ step, certain: fc.boolean() }),
    'choice-made': fc.record({ step, name, options: fc.array(name, { maxLength: 3 }) }),
    'photo-attached': fc.record({ step, sha256: hash, bytes: fc.nat(), mediaType: words }),
    'note-written': fc.record({ step, text: words }),
    'margin-note-written': fc.record({ step, text: words }),
    disturbed: fc.record({ step, item, label: words }),
    restored: fc.record({ step, item }),
    'branch-taken': fc.record(
      { step, to: step, exit, inputs: fc.constant([]), because: words, verdict: step, reason: words },
      { requiredKeys: ['step', 'to', 'exit', 'inputs', 'because'] },
    ),
    'branch-overruled': fc.record({ step, computed: exit, chosen: exit, reason: words }),
    'step-redone': fc.record({ step, reason: words }),
    undone: fc.record({ seq, reason: words }),
    'lead-called': fc.record({ step, question: words }),
    released: fc.record({ step, evidence: words }),
    'set-aside': fc.record({ reason: words }),
    resumed: fc.record(
      { from: fc.constantFrom('set-aside', 'stopped', 'reload', 'lead-called'), reason: words },
      { requiredKeys: ['from'] },
    ),
    'handed-over': fc.record({ to: words, reason: words }),
    'limit-exceeded': fc.record({ step, limit: name, name, figure }),
    'alert-raised': fc.record({ step, text: words }),
    'alert-acknowledged': fc.record({ seq }),
    stopped: fc.record({ step, reason: words }),
    'version-notice-answered': fc.record({ version: seq, answer: fc.constantFrom('go-on', 'end') }),
    'finding-reached': fc.record({ finding: step, verdict: words }),
    'write-up-written': fc.record({
      concern: words,
      cause: words,
      correction: words,
      customer: words,
      edited: fc.constant([]),
    }),
    closed: fc.record({ finding: step }),
    verified: fc.record({ step, by: words }),
    signed: fc.record({ head: hash, meaning: fc.constantFrom('performed', 'reviewed'), signature: words, key: words }),
    amended: fc.record({ text: words, reason: words }),
    joined: fc.record({ branch: words, head: hash }),
    'clock-jumped': fc.record({ byMs: fc.double({ noNaN: true, noDefaultInfinity: true }) }),
    transcribed: fc.record({ from: words }),
  };
}

/** A draft of any type: its data in the right shape, or with one place of it replaced by anything. */
export function anyDraft(
  procedure: CompiledProcedure,
): fc.Arbitrary<{ readonly type: string; readonly data: unknown }> {
  const types = Object.entries(dataOf(procedure));
  const right = fc.oneof(...types.map(([type, data]) => fc.record({ type: fc.constant(type), data })));
  const wrong = fc
    .tuple(right, fc.nat(), anyJson)
    .map(([{ type, data }, place, value]) => ({ type, data: withPlace(data, place, value) }));
  const odd = fc.record({ type: fc.oneof(oddText, fc.constantFrom(...types.map(([type]) => type))), data: anyJson });
  return fc.oneof({ weight: 8, arbitrary: right }, { weight: 3, arbitrary: wrong }, { weight: 1, arbitrary: odd });
}

/** Every place in a value, as paths of keys, the value itself first. */
export function placesIn(value: unknown, path: readonly string[] = []): readonly (readonly string[])[] {
  if (typeof value !== 'object' || value === null) return [path];
  return [path, ...Object.entries(value).flatMap(([key, member]) => placesIn(member, [...path, key]))];
}

/** A copy with the place of that number (counted round) replaced, or left out where `value` is undefined. */
export function withPlace(whole: unknown, place: number, value: unknown): unknown {
  const places = placesIn(whole);
  return replaced(whole, places[place % places.length] ?? [], value);
}

/** A copy with what stands at the path replaced, or left out where `value` is undefined. */
export function replaced(whole: unknown, [key, ...rest]: readonly string[], value: unknown): unknown {
  if (key === undefined) return value;
  const copy = JSON.parse(canonicalJson(whole)) as Record<string, unknown>;
  const next = rest.length === 0 ? value : replaced(copy[key], rest, value);
  if (next === undefined) delete copy[key];
  else Object.defineProperty(copy, key, { value: next, enumerable: true, configurable: true, writable: true });
  return copy;
}
