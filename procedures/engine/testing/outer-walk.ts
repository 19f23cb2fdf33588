import { compileProcedure, type CompiledProcedure, type ProcedureDocument } from '../../document';
import { partTest } from '../../document/testing/part-test';
import type { InstrumentSnapshot, RunCommand, Series } from '..';
import { outerProcedure } from './outer-procedure';
import { RunWalk } from './run-walk';

const gauge: InstrumentSnapshot = {
  id: 'G-12',
  kind: 'pressure-gauge',
  label: 'G-12',
  shows: [{ unit: 'kPa', sense: 'gauge', low: 0, high: 60, resolution: 0.1, accuracy: 0.1 }],
  dueOn: '2099-01-01',
};
const probe: InstrumentSnapshot = {
  id: 'L-01',
  kind: 'listening-probe',
  label: 'L-01',
  shows: [],
  dueOn: '2099-01-01',
};

export function read(name: string, text: string, unit: 'kPa' | 'degC'): RunCommand {
  return { do: 'record', name, text, unit };
}

/** A ramp from rest to 9 kPa, sampled once a second. */
export const rise: Series = {
  timeS: Array.from({ length: 31 }, (_, index) => index),
  channels: [
    { name: 'gauge', unit: 'kPa', values: Array.from({ length: 31 }, (_, index) => 0.3 * index) },
    { name: 'manifold', unit: 'kPa', values: Array.from({ length: 31 }, (_, index) => 94 + 0.3 * index) },
  ],
};

export function logged(series: Series): RunCommand {
  const channels = series.channels.map(({ name, unit }) => ({ name, unit, column: name }));
  const samples = series.timeS.length;
  const sha256 = 'a'.repeat(64);
  const record = {
    sha256,
    bytes: 900,
    samples,
    durationS: 30,
    channels,
    source: 'file',
    skipped: 0,
    problems: [],
  } as const;
  return { do: 'import-series', record, series };
}

function compiledOuter(document: ProcedureDocument): CompiledProcedure {
  const compiled = compileProcedure(document, (id) => (id === partTest.id ? partTest : undefined));
  if (!compiled.ok) throw new Error(compiled.problems.map(({ message }) => message).join('\n'));
  return compiled.procedure;
}

/** A run of the outer procedure, its called one written in, at its first step after the start card. */
export function outerWalk(document: ProcedureDocument = outerProcedure): RunWalk {
  return new RunWalk(compiledOuter(document))
    .cautions(1)
    .do(
      { do: 'choose-gear', role: 'gauge', instrument: gauge },
      { do: 'choose-gear', role: 'probe', instrument: probe },
      { do: 'confirm' },
    );
}

/** The same with the coolant read and the plug in, at the first step of the called procedure. */
export function inPartTest(document?: ProcedureDocument): RunWalk {
  return outerWalk(document)
    .do(read('coolant', '88', 'degC'), { do: 'confirm' })
    .cautions(1)
    .do({ do: 'confirm' });
}

/** Through the called procedure with one pressure. */
export function partWith(walk: RunWalk, pressure: string): RunWalk {
  return walk.do({ do: 'confirm' }, read('partPartPressure', pressure, 'kPa'), { do: 'restore', item: 'cap' });
}
