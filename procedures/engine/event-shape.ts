import { count, flag, listOf, number, objectOf, oneOf, recordOf, size, text, unit, type Shape } from './shape';
import type { RunEventType } from './run-event';

const sense = oneOf('absolute', 'gauge');
const source = oneOf('typed', 'file', 'simulated', 'computed');
const figure = objectOf({ text, unit, 'sense?': sense });
const range = objectOf({ unit, 'sense?': sense, low: number, high: number, resolution: size, accuracy: size });
const instrument = objectOf({
  id: text,
  kind: oneOf('pressure-gauge', 'scan-tool', 'listening-probe', 'barometer', 'thermometer'),
  label: text,
  shows: listOf(range),
  dueOn: text,
});
const visit = objectOf({
  repairOrder: text,
  vin: text,
  car: text,
  odometer: figure,
  concern: text,
  codes: listOf(text),
});
const code = objectOf({ code: text, status: oneOf('stored', 'pending', 'permanent'), 'freezeFrame?': text });
const decisionInput = objectOf({ name: text, label: text, text, 'unit?': unit, 'uncertainty?': text });
const channel = objectOf({ name: text, unit: text, column: text });
const parts = oneOf('concern', 'cause', 'correction', 'customer');
const step = objectOf({ step: text });
const stepAndReason = objectOf({ step: text, reason: text });
const stepAndText = objectOf({ step: text, text });

/**
 * What the rules of the engine rely on in each type's data. Wider than `run-event.schema.json` (no lengths, no
 * patterns), so that whatever the schema accepts has its shape; a spec holds the two together.
 */
const dataShapes: Readonly<Record<RunEventType, Shape>> = {
  opened: objectOf({
    visit,
    siteName: text,
    inputs: recordOf(objectOf({ text, unit, 'sense?': sense, source: text })),
    person: text,
    'again?': objectOf({ because: text, besides: listOf(text) }),
  }),
  'gear-chosen': objectOf({ role: text, instrument, 'overdueBecause?': text }),
  'step-claimed': step,
  'step-done': step,
  'caution-acknowledged': objectOf({ step: text, caution: count }),
  'reading-recorded': objectOf({
    step: text,
    name: text,
    figure,
    source,
    'way?': text,
    'instrument?': text,
    'resolution?': text,
    'uncertainty?': text,
    'timeS?': size,
  }),
  'not-measurable': stepAndReason,
  'not-applicable': stepAndReason,
  predicted: objectOf({ step: text, option: text }),
  'series-recorded': objectOf({
    step: text,
    name: text,
    sha256: text,
    bytes: count,
    samples: count,
    durationS: size,
    channels: listOf(channel),
    source,
    'fileName?': text,
    skipped: count,
    problems: listOf(text),
  }),
  'mark-placed': objectOf({
    step: text,
    series: text,
    mark: oneOf('noise-begins', 'noise-stops'),
    timeS: size,
    by: oneOf('tap', 'pedal', 'suggested'),
  }),
  'codes-recorded': objectOf({ step: text, name: text, codes: listOf(code) }),
  'timer-started': objectOf({ step: text, seconds: size }),
  'timer-ended': objectOf({ step: text, certain: flag }),
  'choice-made': objectOf({ step: text, name: text, options: listOf(text), 'text?': text }),
  'photo-attached': objectOf({ step: text, sha256: text, bytes: count, mediaType: text }),
  'note-written': stepAndText,
  'margin-note-written': stepAndText,
  disturbed: objectOf({ step: text, item: text, label: text }),
  restored: objectOf({ step: text, item: text }),
  'branch-taken': objectOf({
    step: text,
    to: text,
    exit: text,
    'when?': text,
    inputs: listOf(decisionInput),
    because: text,
    'verdict?': text,
    'reason?': text,
  }),
  'branch-overruled': objectOf({ step: text, computed: text, chosen: text, reason: text }),
  'step-redone': stepAndReason,
  undone: objectOf({ seq: count, reason: text }),
  'lead-called': objectOf({ step: text, question: text }),
  released: objectOf({ step: text, evidence: text, by: oneOf('lead', 'manager') }),
  'set-aside': objectOf({ reason: text }),
  resumed: objectOf({ from: oneOf('set-aside', 'stopped', 'reload', 'lead-called'), 'reason?': text }),
  'handed-over': objectOf({ to: text, reason: text }),
  'limit-exceeded': objectOf({ step: text, limit: text, name: text, figure }),
  'alert-raised': stepAndText,
  'alert-acknowledged': objectOf({ seq: count }),
  stopped: stepAndReason,
  'version-notice-answered': objectOf({ version: count, answer: oneOf('go-on', 'end') }),
  'finding-reached': objectOf({ finding: text, verdict: text }),
  'write-up-written': objectOf({
    concern: text,
    cause: text,
    correction: text,
    customer: text,
    edited: listOf(parts),
  }),
  closed: objectOf({ finding: text }),
  verified: objectOf({ step: text, by: text }),
  signed: objectOf({ head: text, meaning: oneOf('performed', 'reviewed'), signature: text, key: text }),
  amended: objectOf({ text, reason: text }),
  joined: objectOf({ branch: text, head: text }),
  'clock-jumped': objectOf({ byMs: number }),
  transcribed: objectOf({ from: text }),
};

const envelope = objectOf({
  runId: text,
  seq: count,
  id: text,
  at: count,
  elapsed: size,
  actor: text,
  device: text,
  build: text,
  schema: oneOf(1),
  prev: text,
  hash: text,
  type: text,
});

/** What keeps a value from being an event that the engine can read; undefined when nothing does. Never throws. */
export function problemWithShape(event: unknown): string | undefined {
  const problem = envelope(event, 'the event');
  if (problem !== undefined) return problem;
  const { type, data } = event as { readonly type: string; readonly data: unknown };
  const shape = Object.hasOwn(dataShapes, type) ? dataShapes[type as RunEventType] : undefined;
  return shape === undefined ? `its type ${type} is none that this build knows` : shape(data, 'data');
}

const runHeader = objectOf({
  runId: text,
  procedureId: text,
  version: count,
  contentHash: text,
  visitId: text,
  siteId: text,
  kind: oneOf('real', 'practice'),
  'half?': oneOf('cold', 'warm'),
  'pairId?': text,
});

/** The same for a run's header. */
export function problemWithHeader(header: unknown): string | undefined {
  return runHeader(header, 'the header');
}
