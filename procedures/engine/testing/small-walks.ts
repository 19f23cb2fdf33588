import { compileProcedure, type CompiledProcedure } from '../../document';
import type { InstrumentSnapshot, Series } from '..';
import { changedDocument } from '../../document/testing/changed-document';
import { RunWalk } from './run-walk';
import { smallProcedure } from './small-procedure';

export const fineGauge: InstrumentSnapshot = {
  id: 'g-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  dueOn: '2027-03-01',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.25 }],
};
export const scanTool: InstrumentSnapshot = {
  id: 's-3',
  kind: 'scan-tool',
  label: 'S-3',
  dueOn: '2027-03-01',
  shows: [{ unit: 'kPa', sense: 'absolute', low: 0, high: 400, resolution: 0.1, accuracy: 0.5 }],
};

function compiled(): CompiledProcedure {
  const result = compileProcedure(smallProcedure);
  if (!result.ok) throw new Error(JSON.stringify(result.problems));
  return result.procedure;
}

export const procedure = compiled();

/** Up to step 3, with the air of the place from the altimeter setting 1013.25 hPa at 640 m. */
export function atManifold(): RunWalk {
  return new RunWalk(procedure)
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: fineGauge },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
      { do: 'record', name: 'stationPressure', way: 'altimeter-setting', text: '1013.25', unit: 'hPa' },
    );
}

/** A ramp of invented figures: 1 kPa in 10 s, noise from 10 s until 30 s. */
export const series: Series = {
  timeS: Array.from({ length: 121 }, (_, i) => i * 0.5),
  channels: [{ name: 'gauge', unit: 'kPa', values: Array.from({ length: 121 }, (_, i) => Math.round(i * 0.5) / 10) }],
};
export const record = {
  sha256: 'ab'.repeat(32),
  bytes: 10,
  samples: 121,
  durationS: 60,
  channels: [],
  source: 'typed',
  skipped: 0,
  problems: [],
} as const;

/** Up to the ramp, with a sound sensor and the dipstick out. */
export function atListen(): RunWalk {
  return atManifold()
    .cautions(1)
    .do({ do: 'record', name: 'manifoldPressure', text: '94.2', unit: 'kPa' }, { do: 'confirm' });
}

/** The small procedure with parts of it changed, compiled. */
export function changedProcedure(
  ...changes: Parameters<typeof changedDocument> extends [unknown, ...infer R] ? R : never
): CompiledProcedure {
  const result = compileProcedure(changedDocument(smallProcedure, ...changes));
  if (!result.ok) throw new Error(JSON.stringify(result.problems));
  return result.procedure;
}

/** Up to step 2 of a changed small procedure. */
export function begunWith(changed: CompiledProcedure): RunWalk {
  return new RunWalk(changed)
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: fineGauge },
      { do: 'choose-gear', role: 'scanTool', instrument: scanTool },
      { do: 'confirm' },
    );
}
