import type { CompiledProcedure, Step } from '../../procedures/document';
import {
  cautionCount,
  suggestMark,
  type InstrumentSnapshot,
  type RunCommand,
  type Series,
} from '../../procedures/engine';
import { RunWalk } from '../../procedures/engine/testing/run-walk';
import { importOf } from './ramp-file';

/** One row of a hand-walked table: the step by its number, and what the person answers there. */
export type Row = readonly [number: string, answer: Answer];

export type Answer =
  /** Texts in the quantities' own units; a list is entered one after the other. */
  | { readonly read: Readonly<Record<string, string | readonly string[]>>; readonly way?: string }
  | { readonly choose: readonly string[]; readonly text?: string }
  | { readonly codes: Extract<RunCommand, { do: 'record-codes' }>['codes'] }
  /** A series with its marks in seconds; `suggested` takes the mark that the calculation offers. */
  | { readonly listen: Series; readonly begins?: number; readonly stops?: number | 'suggested' }
  /** Anything else, as it is; cautions are not acknowledged for it. */
  | { readonly commands: readonly RunCommand[] };

export interface Drive {
  readonly procedure: CompiledProcedure;
  readonly half: 'cold' | 'warm';
  readonly gear: Readonly<Record<string, InstrumentSnapshot>>;
  /** In the order in which the steps that ask for something are walked. */
  readonly table: readonly Row[];
}

/** More than any way through a procedure with all its loops. */
const mostSteps = 400;

/**
 * Walks a run by a table of answers, through commands alone. Steps that ask for nothing are confirmed, holds timed and
 * disturbed things restored without a row. Throws where the way walked and the table differ, or a row is left over.
 */
export function driveRun({ procedure, half, gear, table }: Drive): RunWalk {
  const walk = new RunWalk(procedure, { half });
  const rows = [...table];
  for (let walked = 0; walk.state.current !== undefined; walked += 1) {
    if (walked > mostSteps) throw new Error('the run does not come to an end');
    const step = procedure.step(walk.state.current.id);
    if (step === undefined) throw new Error(`no step ${walk.state.current.id}`);
    const row = rows[0];
    if (row !== undefined && row[0] === step.number) {
      rows.shift();
      answer(walk, step, row[1]);
    } else {
      passBy(walk, step, gear, row);
    }
  }
  const left = rows[0];
  if (left !== undefined) throw new Error(`the way ended before step ${left[0]} of the table`);
  return walk;
}

/** The numbers of the steps as they were claimed, the finding's last. */
export function wayWalked(walk: RunWalk): string {
  return walk.state.walked.map(({ step }) => walk.procedure.step(step)?.number ?? step).join(' ');
}

/** What was judged, step by step: `5 manifoldPressure 94.2 +- 0.6 in`, in the order of the events. */
export function judgements(walk: RunWalk): readonly string[] {
  return Object.values(walk.state.values)
    .filter(({ judgement }) => judgement !== undefined)
    .map(({ name, text, uncertaintyText, unit, judgement }) => {
      const figure = `${text} +- ${uncertaintyText}${unit === '1' ? '' : ` ${unit}`}`;
      return `${name} ${figure}: ${judgement?.result ?? 'not judged'}`;
    });
}

function answer(walk: RunWalk, step: Step, given: Answer): void {
  if ('commands' in given) {
    walk.do(...given.commands);
    return;
  }
  acknowledge(walk, step);
  if ('choose' in given) {
    walk.do({ do: 'choose', options: given.choose, ...(given.text === undefined ? {} : { text: given.text }) });
  } else if ('codes' in given) {
    walk.do({ do: 'record-codes', codes: given.codes });
  } else if ('listen' in given) {
    listen(walk, given);
  } else {
    read(walk, step, given);
  }
}

function read(walk: RunWalk, step: Step, { read: readings, way }: Extract<Answer, { read: unknown }>): void {
  if (step.kind !== 'reading' && step.kind !== 'wait') throw new Error(`step ${step.number} reads nothing`);
  const reads = Object.entries(readings).map(([name, given]) => {
    const quantity = step.reads.find((candidate) => candidate.name === name);
    const entry = quantity?.ways?.find(({ id }) => id === way)?.entry;
    if (quantity === undefined) throw new Error(`step ${step.number} does not read ${name}`);
    const texts: readonly string[] = typeof given === 'string' ? [given] : given;
    return { name, unit: entry?.unit ?? quantity.unit, texts };
  });
  const rounds = Math.max(...reads.map(({ texts }) => texts.length));
  for (let round = 0; round < rounds; round += 1) {
    for (const { name, unit, texts } of reads) {
      const text = texts[round];
      if (text !== undefined) walk.do({ do: 'record', name, text, unit, ...(way === undefined ? {} : { way }) });
    }
  }
}

function listen(walk: RunWalk, { listen: series, begins, stops }: Extract<Answer, { listen: unknown }>): void {
  walk.do(importOf(series, 'ramp.csv'));
  if (begins !== undefined) walk.do({ do: 'mark', mark: 'noise-begins', timeS: begins, by: 'tap' });
  if (stops === 'suggested') {
    const offered = suggestMark(walk.procedure, walk.state, series);
    if (!offered.ok) throw new Error(`no mark is offered: ${offered.reason}`);
    walk.do({ do: 'mark', mark: 'noise-stops', timeS: offered.timeS, by: 'suggested' });
  } else if (stops !== undefined) {
    walk.do({ do: 'mark', mark: 'noise-stops', timeS: stops, by: 'tap' });
  }
  walk.do({ do: 'finish-listening', series });
}

function passBy(walk: RunWalk, step: Step, gear: Drive['gear'], row: Row | undefined): void {
  acknowledge(walk, step);
  switch (step.kind) {
    case 'start':
      for (const [role, instrument] of Object.entries(gear)) walk.do({ do: 'choose-gear', role, instrument });
      walk.do({ do: 'confirm' });
      return;
    case 'action':
    case 'compute':
      walk.do({ do: 'confirm' });
      return;
    case 'hold':
      walk.do({ do: 'start-timer' }, { do: 'end-timer', certain: true });
      return;
    case 'restore':
      restore(walk);
      return;
    default:
      throw new Error(`step ${step.number} asks for an answer; the table's next row is ${row?.[0] ?? 'none'}`);
  }
}

function restore(walk: RunWalk): void {
  const items = walk.state.disturbed.map(({ item }) => item);
  if (items.length === 0) walk.do({ do: 'confirm' });
  for (const item of items) walk.do({ do: 'restore', item });
}

function acknowledge(walk: RunWalk, step: Step): void {
  walk.cautions(cautionCount(walk.procedure, step));
}
