import { compileProcedure, type CompiledProcedure } from '../../document';
import { plugHold } from '../../document/testing/plug-hold';
import { walkRound } from '../../document/testing/walk-round';
import { cautionCount, sha256Hex, type InstrumentSnapshot, type RunCommand, type RunHeader } from '..';
import { RunWalk } from './run-walk';

const compilation = compileProcedure(walkRound, (id) => (id === plugHold.id ? plugHold : undefined));
if (!compilation.ok) throw new Error(JSON.stringify(compilation.problems));

/** The walk-round with the plug hold test written in, compiled once for all specs of a file. */
export const walkRoundCompiled: CompiledProcedure = compilation.procedure;

const gauge: InstrumentSnapshot = {
  id: 'g-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
  dueOn: '2099-01-01',
};

const read = (name: string, text: string, unit: 'kPa' | 'degC'): RunCommand => ({ do: 'record', name, text, unit });

/** What the plain way through does at each step. */
const plainWay: Readonly<Record<string, readonly RunCommand[]>> = {
  start: [{ do: 'choose-gear', role: 'gauge', instrument: gauge }, { do: 'confirm' }],
  coolant: [read('coolantTemperature', '88', 'degC')],
  'plug-test-press': [read('plugTestPlugPressure', '4.2', 'kPa')],
  'plug-test-back': [{ do: 'restore', item: 'vent' }],
  show: [{ do: 'verify', by: 'brandt' }, { do: 'release', role: 'lead', evidence: 'Two clamps.' }, { do: 'confirm' }],
  hold: [
    read('heldFrom', '6.0', 'kPa'),
    { do: 'start-timer' },
    { do: 'end-timer', certain: true },
    read('heldTo', '5.7', 'kPa'),
  ],
  where: [{ do: 'choose', options: ['nowhere'] }],
  photo: [
    { do: 'attach-photo', sha256: sha256Hex(new Uint8Array([1])), bytes: 1, mediaType: 'image/jpeg' },
    { do: 'confirm' },
  ],
  raise: [{ do: 'cannot-measure', reason: 'no log' }],
  stand: [{ do: 'start-timer' }, { do: 'end-timer', certain: true }, read('gaugeLeft', '0.2', 'kPa')],
};

/** A walk-round the plain way up to a step, its cautions acknowledged. */
export function roundTo(stepId: string, header: Partial<RunHeader> = {}): RunWalk {
  const walk = new RunWalk(walkRoundCompiled, header);
  for (let steps = 0; steps < 40; steps += 1) {
    const id = walk.state.current?.id ?? '';
    const step = walk.procedure.step(id);
    if (step !== undefined) walk.cautions(cautionCount(walk.procedure, step));
    if (id === stepId) return walk;
    walk.do(...(plainWay[id] ?? [{ do: 'confirm' } as const]));
  }
  throw new Error(`the plain way does not lead to ${stepId}`);
}
