import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { gzipSync } from 'node:zlib';
import { compileProcedure, type CompiledProcedure, type Step } from '../../../../procedures/document';
import {
  applyEvent,
  cautionCount,
  contentHash,
  decide,
  encodeSeries,
  headerHash,
  openRun,
  sealEvent,
  sha256Hex,
  type EventDraft,
  type InstrumentSnapshot,
  type RunCommand,
  type RunEvent,
  type RunHeader,
  type RunState,
  type Series,
} from '../../../../procedures/engine';
import { crankcaseValveSeal } from '../../../../procedures/library';
import type { PracticeScenario } from '../practice/practice-scenario';

/** A run that was walked through the engine, as a tablet would have stored it. */
export interface WalkedRun {
  readonly procedure: CompiledProcedure;
  readonly header: RunHeader;
  readonly events: readonly RunEvent[];
  readonly state: RunState;
  readonly series: Series;
  /** The series as it is stored: what the record names by its hash. */
  readonly bytes: Uint8Array;
}

export interface WalkOptions {
  readonly kind?: RunHeader['kind'];
  /** Step id -> the options that are chosen there. */
  readonly choices: Readonly<Record<string, readonly string[]>>;
  /** Words where an option asks for some. */
  readonly text?: string;
  /** Where the noise is marked; the planted place where absent. */
  readonly noiseStopsS?: number;
  /** Called before each step's own command: may do more, or walk differently by doing the step itself. */
  readonly before?: ((step: Step, walk: Walk) => void) | undefined;
  /** Walk no further than this step. */
  readonly until?: string;
  readonly startedAt?: number;
  /** What the header says otherwise than a practice run's. */
  readonly header?: Partial<RunHeader>;
  /** Who walks it, on which tablet. */
  readonly by?: WalkedBy;
}

export interface WalkedBy {
  readonly personId: string;
  readonly displayName: string;
  readonly tabletId: string;
}

export interface Walk {
  readonly state: RunState;
  readonly do: (command: RunCommand) => void;
}

/** A compiled library procedure, once for all specs of a file. */
export function compiledLibraryProcedure(): CompiledProcedure {
  const compiled = compileProcedure(crankcaseValveSeal);
  if (!compiled.ok) throw new Error(compiled.problems[0]?.message);
  return compiled.procedure;
}

/** Reads a sample ramp as the listen step would have it: four channels, kilopascals and decibels. */
export function sampleRamp({ ramp }: PracticeScenario): Series {
  const text = readFileSync(join(__dirname, '../../../public', ramp.path), 'utf8');
  const rows = text.trim().split('\n').slice(1);
  const columns = rows.map((row) => row.split(',').map(Number));
  const column = (index: number): number[] => columns.map((row) => row[index] as number);
  return {
    timeS: column(0),
    channels: [
      { name: 'gauge', unit: 'kPa', values: column(1) },
      { name: 'manifold', unit: 'kPa', values: column(2) },
      { name: 'boost', unit: 'kPa', values: column(3) },
      { name: 'sound', unit: 'dB', values: column(4) },
    ],
  };
}

export const bench: readonly InstrumentSnapshot[] = [
  {
    id: 'g-12',
    kind: 'pressure-gauge',
    label: 'G-12',
    shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
    dueOn: '2027-03-10',
  },
  {
    id: 's-3',
    kind: 'scan-tool',
    label: 'S-3',
    shows: [
      { unit: 'kPa', sense: 'absolute', low: 0, high: 300, resolution: 0.1, accuracy: 0.5 },
      { unit: 'degC', low: -40, high: 215, resolution: 1, accuracy: 1 },
    ],
    dueOn: '2027-06-01',
  },
  { id: 'l-2', kind: 'listening-probe', label: 'L-2', shows: [], dueOn: '2027-06-01' },
  {
    id: 'b-1',
    kind: 'barometer',
    label: 'B-1',
    shows: [{ unit: 'kPa', sense: 'absolute', low: 85, high: 108, resolution: 0.1, accuracy: 0.15 }],
    dueOn: '2027-01-15',
  },
  {
    id: 't-4',
    kind: 'thermometer',
    label: 'T-4',
    shows: [{ unit: 'degC', low: -30, high: 60, resolution: 1, accuracy: 1 }],
    dueOn: '2027-01-15',
  },
];

const okaforOnTablet: WalkedBy = { personId: 'p-okafor', displayName: 'I. Okafor', tabletId: 't-1' };

/** Walks a scenario from its first step with what its bench shows, until its finding and the close. */
export function walkScenario(
  procedure: CompiledProcedure,
  scenario: PracticeScenario,
  options: WalkOptions,
): WalkedRun {
  const header = { ...headerOf(procedure, scenario, options.kind ?? 'practice'), ...options.header };
  const by = options.by ?? okaforOnTablet;
  const series = sampleRamp(scenario);
  const bytes = new Uint8Array(gzipSync(encodeSeries(series)));
  const book = new Book(procedure, header, by, options.startedAt ?? Date.UTC(2026, 11, 2, 8, 0));
  const opening = openRun(procedure, {
    visit: scenario.visit,
    siteName: scenario.place.name,
    person: by.displayName,
    elevationM: scenario.place.elevationM,
    displacementL: scenario.displacementL,
  });
  if (!opening.ok) throw new Error(opening.message);
  book.write(opening.drafts);
  for (let turns = 0; turns < 200; turns += 1) {
    const step = book.step;
    if (step === undefined || step.id === options.until) break;
    options.before?.(step, book);
    if (book.step === step) doStep(book, step, scenario, { series, bytes }, options);
  }
  if (options.until === undefined) book.do({ do: 'close' });
  return { procedure, header, events: book.events, state: book.state, series, bytes };
}

function headerOf(procedure: CompiledProcedure, scenario: PracticeScenario, kind: RunHeader['kind']): RunHeader {
  return {
    runId: '0193b0a0-1000-7000-8000-000000000001',
    procedureId: procedure.document.id,
    version: 1,
    contentHash: contentHash(procedure.authored),
    visitId: scenario.visitId,
    siteId: 's-ossenholt',
    kind,
    half: scenario.half,
  };
}

/** The run so far; does a command by deciding, sealing and applying. */
class Book implements Walk {
  readonly events: RunEvent[] = [];
  private current: RunState | undefined;

  constructor(
    readonly procedure: CompiledProcedure,
    readonly header: RunHeader,
    private readonly by: WalkedBy,
    private readonly startedAt: number,
  ) {}

  get state(): RunState {
    if (this.current === undefined) throw new Error('The run is not opened');
    return this.current;
  }

  get step(): Step | undefined {
    const id = this.state.current?.id;
    return id === undefined ? undefined : this.procedure.step(id);
  }

  do(command: RunCommand): void {
    const outcome = decide(this.procedure, this.state, command);
    if (!outcome.ok) throw new Error(`${command.do} at ${this.step?.id}: ${outcome.message}`);
    this.write(outcome.drafts);
  }

  write(drafts: readonly EventDraft[]): void {
    const elapsed = this.events.length * 20_000;
    for (const draft of drafts) {
      const seq = this.events.length + 1;
      const event = sealEvent(draft, {
        runId: this.header.runId,
        seq,
        id: `${this.header.runId.slice(0, 23)}-${String(seq).padStart(12, '0')}`,
        at: this.startedAt + elapsed,
        elapsed,
        actor: this.by.personId,
        device: this.by.tabletId,
        build: '0.1.0+spec',
        prev: this.events.at(-1)?.hash ?? headerHash(this.header),
      });
      const result = applyEvent(this.procedure, this.header, this.current, event);
      if (!result.ok) throw new Error(result.refusal.what);
      this.current = result.state;
      this.events.push(event);
    }
  }
}

function doStep(book: Book, step: Step, scenario: PracticeScenario, ramp: KeptRamp, options: WalkOptions): void {
  for (let caution = 0; caution < cautionCount(book.procedure, step); caution += 1) {
    book.do({ do: 'acknowledge-caution', caution });
  }
  const shown = scenario.bench[step.id] ?? [];
  switch (step.kind) {
    case 'start':
      for (const { role, kind } of book.procedure.document.gear) {
        const instrument = bench.find((candidate) => candidate.kind === kind);
        if (instrument !== undefined) book.do({ do: 'choose-gear', role, instrument });
      }
      return book.do({ do: 'confirm' });
    case 'action':
    case 'compute':
      return book.do({ do: 'confirm' });
    case 'reading':
    case 'wait':
      for (const entry of shown) {
        if (entry.what !== 'figure' || entry.name === 'altimeterSetting') continue;
        const { text, unit } = entry;
        const isBarometer = entry.name === 'barometerPressure';
        const name = isBarometer ? 'stationPressure' : entry.name;
        book.do({ do: 'record', name, text, unit, ...(isBarometer ? { way: 'barometer' } : {}) });
      }
      if (book.step === step) book.do({ do: 'confirm' });
      return;
    case 'codes': {
      const codes = shown.flatMap((entry) => (entry.what === 'codes' ? entry.codes : []));
      return book.do({ do: 'record-codes', codes });
    }
    case 'choice': {
      const chosen = options.choices[step.id];
      if (chosen === undefined) throw new Error(`What is chosen at ${step.id}?`);
      return book.do({ do: 'choose', options: chosen, text: options.text ?? 'as seen' });
    }
    case 'listen':
      return listen(book, scenario, ramp, options);
    case 'hold':
      book.do({ do: 'start-timer' });
      return book.do({ do: 'end-timer', certain: true });
    case 'restore':
      if (book.state.disturbed.length === 0) return book.do({ do: 'confirm' });
      for (const { item } of book.state.disturbed) book.do({ do: 'restore', item });
      return;
    default:
      throw new Error(`The walk does not know how to do ${step.kind}`);
  }
}

interface KeptRamp {
  readonly series: Series;
  readonly bytes: Uint8Array;
}

function listen(
  book: Book,
  { ramp, planted }: PracticeScenario,
  { series, bytes }: KeptRamp,
  options: WalkOptions,
): void {
  const record = {
    sha256: sha256Hex(bytes),
    bytes: bytes.length,
    samples: series.timeS.length,
    durationS: series.timeS.at(-1) ?? 0,
    channels: series.channels.map(({ name, unit }) => ({ name, unit, column: name })),
    source: 'file' as const,
    fileName: ramp.fileName,
    skipped: 0,
    problems: [],
  };
  book.do({ do: 'import-series', record, series });
  book.do({ do: 'mark', mark: 'noise-begins', timeS: 11, by: 'tap' });
  const stopsS = options.noiseStopsS ?? planted.noiseStops?.timeS;
  if (stopsS !== undefined) book.do({ do: 'mark', mark: 'noise-stops', timeS: stopsS, by: 'tap' });
  book.do({ do: 'finish-listening', series });
}
