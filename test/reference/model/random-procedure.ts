import fc from 'fast-check';
import type { Branch, ProcedureDocument, ReadQuantity, Step } from '../../../procedures/document';
import { because, documentOf, stopped } from './random-document';

/** What a condition of a random procedure asks, beside its text: the model reads this, the engine the text. */
export type Asked =
  | { readonly ask: 'above' | 'below'; readonly name: string; readonly kpa: number }
  | { readonly ask: 'truth'; readonly name: string }
  | { readonly ask: 'out'; readonly name: string };

export interface RandomProcedure {
  readonly document: ProcedureDocument;
  readonly asked: ReadonlyMap<string, Asked>;
}

const kinds = [
  'action',
  'reading',
  'choice',
  'codes',
  'hold',
  'wait',
  'drive',
  'photo',
  'ramp',
  'listen',
  'compute',
  'call',
] as const;

const seed = fc.record({
  kind: fc.constantFrom(...kinds),
  pick: fc.nat({ max: 99 }),
  target: fc.nat({ max: 99 }),
  branch: fc.constantFrom('none', 'forward', 'back'),
  somebody: fc.constantFrom('nobody', 'nobody', 'nobody', 'release', 'verify'),
  disturbs: fc.boolean(),
  lasts: fc.boolean(),
});
type Seed = typeof seed extends fc.Arbitrary<infer T> ? T : never;

const source = 'common practice, no source';

/** Valid procedures with every kind of step, branches, bounded loops, a call, limits, disturbances and their restoring. */
export const randomProcedure: fc.Arbitrary<RandomProcedure> = fc
  .array(seed, { minLength: 2, maxLength: 8 })
  .map((seeds) => built(seeds));

function built(seeds: readonly Seed[]): RandomProcedure {
  const asked = new Map<string, Asked>([
    ['partPartPressure < partLeast', { ask: 'below', name: 'partPartPressure', kpa: 2 }],
    ['partPartPressure > 15 kPa', { ask: 'above', name: 'partPartPressure', kpa: 15 }],
  ]);
  const firstCall = seeds.findIndex(({ kind }) => kind === 'call');
  const ids = seeds.map(({ kind }, place) => (kind === 'call' && place === firstCall ? 'part' : `s${place}`));
  const idAt = (place: number): string => ids[place] ?? 'restore';
  const measured: string[] = [];
  const truths: string[] = [];
  const codesBefore: string[] = [];
  const steps = seeds.map((given, place): Step => {
    const id = idAt(place);
    const head = { id, number: String(place + 2), title: `Step ${place + 2}`, action: 'Do it.' };
    const otherwise = { to: idAt(place + 1), because };
    const own = content(given, place, id === 'part', { measured, truths, codesBefore });
    const next = branchOf(given, place, asked, { own, measured, truths, idAt, count: seeds.length });
    measured.push(...own.measured);
    truths.push(...own.truths);
    return {
      ...head,
      ...own.step,
      otherwise,
      ...(next === undefined ? {} : { next: [next] }),
      ...('needsWayOut' in own ? { cannotMeasure: stopped } : {}),
      ...(given.disturbs && own.step['kind'] !== 'call'
        ? { disturbs: [{ item: `item${place}`, label: `part ${place}`, restore: 'Put it back.' }] }
        : {}),
      ...(given.somebody === 'release' ? { release: { by: 'lead', evidence: 'Seen.' } } : {}),
      ...(given.somebody === 'verify' ? { verify: { how: 'independent', what: 'Seen.' } } : {}),
    } as unknown as Step;
  });
  return { asked, document: documentOf(steps, [...measured, ...steps.flatMap(ends)]) };
}

const ends = (step: Step): readonly string[] => (step.kind === 'hold' ? (step.ends ?? []).map(({ name }) => name) : []);

interface Content {
  readonly step: Record<string, unknown>;
  readonly measured: readonly string[];
  readonly truths: readonly string[];
  readonly needsWayOut?: true;
}

interface Known {
  readonly measured: readonly string[];
  readonly truths: readonly string[];
  readonly codesBefore: string[];
}

function content({ kind, pick, lasts }: Seed, place: number, isCall: boolean, known: Known): Content {
  const read = (name: string, more: object = {}): ReadQuantity => ({
    name,
    label: `Reading ${name}`,
    unit: 'kPa',
    sense: 'gauge',
    gear: 'gauge',
    plausible: { low: 0, high: 60 },
    ...(lasts ? { validity: { minutes: 5, because: 'It changes.' } } : {}),
    ...more,
  });
  const needsWayOut = true as const;
  const channels = [{ name: 'gauge', label: 'Gauge', unit: 'kPa', sense: 'gauge', gear: 'gauge', needed: true }];
  const series = { name: `series${place}`, target: 10, channels };
  const none = { measured: [], truths: [] };
  switch (kind === 'call' && !isCall ? 'action' : kind) {
    case 'action':
      return { step: { kind: 'action' }, ...none };
    case 'reading': {
      const band = { band: { low: '5.5 kPa', high: '20.5 kPa', source } };
      const reads = [read(`r${place}`, { ...band, ...(pick % 3 === 0 ? { takes: 2 } : {}) })];
      return { step: { kind: 'reading', reads }, measured: [`r${place}`], truths: [], needsWayOut };
    }
    case 'wait': {
      const least = pick % 2 === 0 ? { atLeastSeconds: 30 } : {};
      const step = {
        kind: 'wait',
        reads: [read(`w${place}`)],
        until: `w${place} <= 30 kPa`,
        meanwhile: 'Wait.',
        ...least,
      };
      return { step, measured: [`w${place}`], truths: [], needsWayOut };
    }
    case 'choice': {
      const options = ['a', 'b'].map((letter) => ({ name: `o${place}${letter}`, label: letter }));
      return {
        step: { kind, name: `choice${place}`, options },
        measured: [],
        truths: options.map(({ name }) => name),
        needsWayOut,
      };
    }
    case 'codes': {
      const before = known.codesBefore.at(-1);
      known.codesBefore.push(`codes${place}`);
      const compared = before === undefined ? {} : { comparedWith: before, newCodes: `new${place}` };
      return {
        step: { kind, name: `codes${place}`, ...compared },
        measured: [],
        truths: before === undefined ? [] : [`new${place}`],
        needsWayOut,
      };
    }
    case 'hold': {
      const results = [{ name: `l${place}`, label: 'Lost', unit: 'kPa', is: `h${place} - e${place}` }];
      const step = { kind, seconds: 30, begins: [read(`h${place}`)], ends: [read(`e${place}`)], results };
      return { step, measured: [`h${place}`], truths: [], needsWayOut };
    }
    case 'drive': {
      const windows = [{ name: `d${place}`, label: 'Idle', what: '60 s at idle' }];
      return { step: { kind, name: `drive${place}`, windows }, measured: [], truths: [`d${place}`], needsWayOut };
    }
    case 'photo':
      return { step: { kind, name: `photo${place}`, shows: ['All of it.'] }, ...none, needsWayOut };
    case 'ramp': {
      const finds = [{ what: 'highest-gauge', name: `g${place}`, label: 'Highest', unit: 'kPa', sense: 'gauge' }];
      return { step: { kind, ...series, finds }, measured: [`g${place}`], truths: [], needsWayOut };
    }
    case 'listen': {
      const finds = [
        { what: 'noise-heard', name: `n${place}` },
        { what: 'noise-stopped', name: `q${place}` },
      ];
      return { step: { kind, ...series, finds }, measured: [], truths: [`n${place}`, `q${place}`], needsWayOut };
    }
    case 'compute': {
      const from = known.measured[pick % Math.max(1, known.measured.length)];
      const results =
        from === undefined ? [] : [{ name: `k${place}`, label: 'Computed', unit: 'kPa', sense: 'gauge', is: from }];
      return { step: { kind, results }, measured: from === undefined ? [] : [`k${place}`], truths: [] };
    }
    case 'call': {
      const takes = [{ from: 'partPressure', name: 'taken', label: 'Taken', unit: 'kPa', sense: 'gauge' }];
      const finds = [{ finding: 'tight', name: 'itHeld' }];
      return {
        step: { kind, procedure: 'part-test', version: 1, takes, finds },
        measured: ['taken'],
        truths: ['itHeld'],
      };
    }
  }
}

interface Around {
  readonly own: Content;
  readonly measured: readonly string[];
  readonly truths: readonly string[];
  readonly idAt: (place: number) => string;
  readonly count: number;
}

function branchOf(given: Seed, place: number, asked: Map<string, Asked>, around: Around): Branch | undefined {
  const { own, measured, truths, idAt, count } = around;
  if (given.branch === 'none') return undefined;
  const when = condition(given.pick, own.measured, [...measured, ...own.measured], [...truths, ...own.truths], asked);
  if (when === undefined) return undefined;
  const verdict = given.pick % 2 === 0 ? { verdict: 'second' } : {};
  if (given.branch === 'forward') {
    return { when, to: idAt(place + 1 + (given.target % (count - place))), because, ...verdict };
  }
  const thenceforth = { to: idAt(place + 1), because };
  return { when, to: idAt(given.target % (place + 1)), because, atMost: 1 + (given.pick % 2), thenceforth };
}

function condition(
  pick: number,
  own: readonly string[],
  names: readonly string[],
  truths: readonly string[],
  asked: Map<string, Asked>,
): string | undefined {
  const truth = truths[pick % Math.max(1, truths.length)];
  if (truth !== undefined && pick % 3 === 0) return noted(truth, { ask: 'truth', name: truth }, asked);
  const ownReading = own.find((name) => name.startsWith('r'));
  if (ownReading !== undefined && pick % 3 === 1) {
    return noted(`outOfBand(${ownReading})`, { ask: 'out', name: ownReading }, asked);
  }
  const name = names[pick % Math.max(1, names.length)];
  if (name === undefined) return undefined;
  const above = { ask: 'above', name, kpa: 12.5 } as const;
  return noted(`measured(${name}) and ${name} > 12.5 kPa`, above, asked);
}

function noted(text: string, question: Asked, asked: Map<string, Asked>): string {
  asked.set(text, question);
  return text;
}
