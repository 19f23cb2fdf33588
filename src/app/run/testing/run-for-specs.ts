import { compileProcedure, type CompiledProcedure, type Step } from '../../../../procedures/document';
import type { InstrumentSnapshot, RunCommand, RunHeader, Series } from '../../../../procedures/engine';
import { RunWalk } from '../../../../procedures/engine/testing/run-walk';
import { crankcaseValveSeal } from '../../../../procedures/library';
import type { StepOf } from '../step-entry';
import { cautionsOf } from '../step-cautions';
import type { RunView } from '../run-view';

const compilation = compileProcedure(crankcaseValveSeal);
if (!compilation.ok) throw new Error(JSON.stringify(compilation.problems));

/** The crankcase valve seal, compiled once for all specs. */
export const valveSeal: CompiledProcedure = compilation.procedure;

const absolute = { unit: 'kPa', sense: 'absolute', low: 10, high: 300, resolution: 0.1, accuracy: 0.5 } as const;
const celsius = { unit: 'degC', low: -40, high: 150, resolution: 1, accuracy: 1 } as const;

export const instruments: Readonly<Record<string, InstrumentSnapshot>> = {
  gauge: {
    id: 'g-12',
    kind: 'pressure-gauge',
    label: 'G-12',
    dueOn: '2027-03-01',
    shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
  },
  scanTool: { id: 's-3', kind: 'scan-tool', label: 'S-3', dueOn: '2027-03-01', shows: [absolute, celsius] },
  probe: { id: 'l-2', kind: 'listening-probe', label: 'L-2', dueOn: '2027-03-01', shows: [] },
  thermometer: { id: 't-4', kind: 'thermometer', label: 'T-4', dueOn: '2027-03-01', shows: [celsius] },
};

const plainWay: Readonly<Record<string, readonly RunCommand[]>> = {
  start: Object.entries(instruments)
    .map(([role, instrument]): RunCommand => ({ do: 'choose-gear', role, instrument }))
    .concat({ do: 'confirm' }),
  'cold-enough': [
    { do: 'record', name: 'coolantTemperature', text: '15', unit: 'degC' },
    { do: 'record', name: 'ambientTemperature', text: '16', unit: 'degC' },
  ],
  'codes-before': [{ do: 'record-codes', codes: [{ code: 'P0068', status: 'stored' }] }],
  'station-pressure': [
    { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.2', unit: 'hPa' },
  ],
  'manifold-pressure': [{ do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' }],
  'boost-pressure': [{ do: 'record', name: 'boostPressure', text: '94.1', unit: 'kPa' }],
};

/** A cold half, walked the plain way up to a step, whose cautions are acknowledged too unless it is told otherwise. */
export function walkedTo(stepId: string, options: { cautions?: boolean; header?: Partial<RunHeader> } = {}): RunWalk {
  const walk = new RunWalk(valveSeal, { half: 'cold', ...options.header });
  for (let steps = 0; walk.state.current?.id !== stepId; steps += 1) {
    if (steps > 40) throw new Error(`the plain way does not lead to ${stepId}`);
    const id = walk.state.current?.id ?? '';
    acknowledgeAll(walk);
    walk.do(...(plainWay[id] ?? [{ do: 'confirm' } as const]));
  }
  if (options.cautions !== false) acknowledgeAll(walk);
  return walk;
}

function acknowledgeAll(walk: RunWalk): void {
  walk.cautions(cautionsOf({ procedure: walk.procedure }, currentStep(walk)).length);
}

function currentStep(walk: RunWalk): Step {
  const step = walk.procedure.step(walk.state.current?.id ?? '');
  if (step === undefined) throw new Error('the walk stands at no step');
  return step;
}

/** The walk as the screens see it. */
export function viewOf({ procedure, header, events, state }: RunWalk): RunView {
  return { procedure, header, events, state };
}

/** The walk's current step, known to be of a kind. */
export function stepOf<K extends Step['kind']>(walk: RunWalk, kind: K): StepOf<K> {
  const step = currentStep(walk);
  if (step.kind !== kind) throw new Error(`the walk stands at a step of kind ${step.kind}`);
  return step as StepOf<K>;
}

/** A ramp of the gauge alone, 0.2 kPa a second from rest, a sample a second. */
export function rampTo(gaugeKpa: number): Series {
  const values = Array.from({ length: Math.round(gaugeKpa / 0.2) + 6 }, (_, s) => Math.max(0, (s - 5) * 0.2));
  return { timeS: values.map((_, s) => s), channels: [{ name: 'gauge', unit: 'kPa', values }] };
}

/** A cold half after its ramp, with the noise heard between these pressures; at step 11b. */
export function listenedTo(gaugeKpa: number, heard: { begins?: number; stops?: number } = {}): RunWalk {
  const series = rampTo(gaugeKpa);
  const at = (kpa: number): number => 5 + kpa / 0.2;
  const marks = (['begins', 'stops'] as const).flatMap((name): RunCommand[] => {
    const kpa = heard[name];
    return kpa === undefined ? [] : [{ do: 'mark', mark: `noise-${name}`, timeS: at(kpa), by: 'tap' }];
  });
  const record = {
    bytes: 1,
    samples: series.timeS.length,
    durationS: series.timeS.at(-1) ?? 0,
    sha256: '0'.repeat(64),
  };
  return walkedTo('raise-and-listen').do(
    {
      do: 'import-series',
      series,
      record: {
        ...record,
        channels: [{ name: 'gauge', unit: 'kPa', column: 'gauge' }],
        source: 'file',
        skipped: 0,
        problems: [],
      },
    },
    ...marks,
    { do: 'finish-listening', series },
  );
}
