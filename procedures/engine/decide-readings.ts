import { convert, isUnit, unitKind, type UnitName } from '../calculations/for-a-run';
import type { Channel, EntryWay, ReadQuantity, Step } from '../document';
import { CannotDo, type Drafting } from './drafting';
import { parseDecimal, tidyDecimal } from './figures';
import { completeStep, takeAgain } from './go-on';
import { staleAmong } from './validity';
import { waitsForSomebody } from './waits-for-somebody';
import { rangeFor } from './instrument-uncertainty';
import { truthOf } from './judge-quantity';
import { environmentOf, own } from './environment';
import { brokenLimit } from './limits';
import { measureQuantity } from './measure-quantity';
import { channelsOf, readQuantity, readsOf, wayOf } from './quantities';
import type { RunCommand } from './run-command';
import type { InstrumentSnapshot } from './run-event';
import { shownUnit } from './template';

type Record = Extract<RunCommand, { do: 'record' }>;

/** What a value is entered against: a quantity, the entry of one of its ways, or a channel of a ramp. */
interface Target {
  /** Of the quantity, of its way's entry, or of the channel. */
  readonly name: string;
  readonly label: string;
  readonly unit: UnitName;
  readonly sense?: 'absolute' | 'gauge';
  readonly plausible: { readonly low: number; readonly high: number };
  readonly gear: string | undefined;
}

/** One take: checked, recorded, held against the limits; the step goes on when nothing is missing. */
export function recordTake(drafting: Drafting, step: Step, command: Record): void {
  const way = wayWithoutEntry(step, command);
  if (way !== undefined) return recordDerived(drafting, step, way);
  requireItsTime(drafting, step, command.name);
  const target = targetOf(step, command);
  const text = tidyDecimal(command.text);
  const value = requirePlausible(target, text, command.unit);
  const instrument = requireInstrument(drafting, step, target, value, command.unit);
  const range = rangeFor(instrument, command.unit, target.sense);
  drafting.add({
    type: 'reading-recorded',
    data: {
      step: step.id,
      name: command.name,
      figure: { text, unit: command.unit, ...(target.sense === undefined ? {} : { sense: target.sense }) },
      source: command.source ?? 'typed',
      ...(command.way === undefined ? {} : { way: command.way }),
      ...(instrument === undefined ? {} : { instrument: instrument.id }),
      ...(range === undefined ? {} : { resolution: String(range.resolution) }),
      ...(command.timeS === undefined ? {} : { timeS: command.timeS }),
    },
  });
  requireFreshBasis(drafting, step, command);
  const sense = target.sense === undefined ? {} : { sense: target.sense };
  for (const name of new Set([target.name, command.name])) {
    const broken = brokenLimit(drafting.procedure, drafting.state, { name, value, unit: command.unit, ...sense });
    if (broken === undefined) continue;
    const figure = { text, unit: command.unit };
    drafting.add({ type: 'limit-exceeded', data: { step: step.id, limit: broken.id, name: command.name, figure } });
    return;
  }
  finishEntry(drafting, step);
}

/** Goes on with what is complete; a step that waits for somebody else keeps its readings and waits. */
export function finishEntry(drafting: Drafting, step: Step): void {
  if (waitsForSomebody(step, drafting.state.current) !== undefined || !isComplete(drafting, step)) return;
  completeStep(drafting, step);
}

/** What a reading is judged against, and what its way computes with, has to hold. */
function requireFreshBasis({ procedure, state }: Drafting, step: Step, command: Record): void {
  const quantity = readQuantity(step, command.name);
  const way = quantity === undefined ? undefined : wayOf(quantity, command.way);
  const { low, high, when } = quantity?.band ?? {};
  const sources = [low, high, when, way?.is, way?.uncertainty].filter((source) => source !== undefined);
  const names = sources.flatMap((source) => procedure.expression(source).names);
  const stale = staleAmong(state, names)[0];
  if (stale !== undefined) throw takeAgain(procedure, stale);
}

/** The quantity and the way by which it follows from the run's inputs alone, where the command names such a way. */
function wayWithoutEntry(
  step: Step,
  command: Record,
): { readonly quantity: ReadQuantity; readonly way: EntryWay } | undefined {
  const quantity = readQuantity(step, command.name);
  const way = quantity === undefined ? undefined : wayOf(quantity, command.way);
  return quantity === undefined || way === undefined || way.entry !== undefined ? undefined : { quantity, way };
}

function recordDerived(
  drafting: Drafting,
  step: Step,
  { quantity, way }: { readonly quantity: ReadQuantity; readonly way: EntryWay },
): void {
  const take = { seq: 0, text: '0', unit: quantity.unit, source: 'computed', way: way.id } as const;
  const provenance = { step: step.id, seq: 0, at: 0 };
  const value = measureQuantity(drafting.procedure, drafting.state, quantity, [take], provenance).at(-1);
  if (value === undefined) {
    throw new CannotDo(
      'not-known',
      `${way.label} cannot tell ${quantity.label.toLowerCase()} here. Choose another way.`,
      'way',
    );
  }
  const figure = { text: value.text, unit: value.unit, ...(value.sense === undefined ? {} : { sense: value.sense }) };
  const data = {
    step: step.id,
    name: quantity.name,
    figure,
    source: 'computed',
    way: way.id,
    uncertainty: value.uncertaintyText,
  } as const;
  drafting.add({ type: 'reading-recorded', data });
  finishEntry(drafting, step);
}

/** The newest take of this claim no longer counts; the record keeps it, with the reason that the person gave. */
export function takeBack(drafting: Drafting, { name, reason }: Extract<RunCommand, { do: 'take-back' }>): void {
  const seq = own(drafting.state.current?.takes ?? {}, name)?.at(-1)?.seq;
  if (seq === undefined) throw new CannotDo('nothing-taken', 'Nothing is recorded here yet that could be taken back.');
  drafting.add({ type: 'undone', data: { seq, reason: reason.trim() } });
}

/** Whether everything that the step reads has its value, its time is over, and what it waits for is true. */
export function isComplete({ procedure, state }: Drafting, step: Step): boolean {
  const reads = readsOf(step);
  const isTimed = step.kind === 'hold' || (step.kind === 'wait' && step.atLeastSeconds !== undefined);
  if (reads.length === 0 && !isTimed) return false;
  if (!reads.every(({ name }) => own(state.values, name)?.step === step.id)) return false;
  const timer = state.current?.timer;
  if (isTimed && !(timer?.ended === true && timer.certain)) return false;
  return step.kind !== 'wait' || truthOf(procedure, step.until, environmentOf(state)) === true;
}

/** What a hold ends with is read when its time is over, and not before. */
function requireItsTime({ state }: Drafting, step: Step, name: string): void {
  if (step.kind !== 'hold') return;
  const timer = state.current?.timer;
  const isOver = timer?.ended === true && timer.certain;
  if (!isOver && step.ends?.some((quantity) => quantity.name === name) === true) {
    throw new CannotDo('not-yet', 'That is read when the time is over.');
  }
  if (timer !== undefined && step.begins?.some((quantity) => quantity.name === name) === true) {
    throw new CannotDo('too-late', 'The clock runs already: that belongs to its beginning. Take the step again.');
  }
}

function targetOf(step: Step, command: Record): Target {
  const quantity = readQuantity(step, command.name);
  if (quantity !== undefined) return quantityTarget(quantity, command.way);
  const channel = channelsOf(step).find((candidate) => candidate.name === command.name);
  if (channel !== undefined && command.timeS !== undefined) return channelTarget(channel);
  throw new CannotDo('unknown-name', `Step ${step.number} does not ask for ${command.name}.`);
}

function quantityTarget(quantity: ReadQuantity, wayId: string | undefined): Target {
  if (quantity.ways === undefined) return { ...quantity, gear: quantity.gear };
  const way = wayOf(quantity, wayId);
  if (way === undefined) throw new CannotDo('choose-way', `Choose first how ${quantity.label.toLowerCase()} is known.`);
  const entry = way.entry;
  if (entry === undefined) throw new CannotDo('choose-way', `${way.label} takes no entry.`);
  return { ...entry, gear: entry.gear };
}

function channelTarget(channel: Channel): Target {
  if (!isUnit(channel.unit)) throw new CannotDo('unknown-name', `${channel.label} cannot be typed.`);
  const { name, label, unit, sense, gear } = channel;
  return {
    name,
    label,
    unit,
    ...(sense === undefined ? {} : { sense }),
    plausible: sense === 'absolute' ? { low: 10, high: 400 } : { low: -5, high: 100 },
    gear,
  };
}

function requirePlausible(target: Target, text: string, unit: UnitName): number {
  const value = parseDecimal(text);
  if (value === undefined) {
    throw new CannotDo(
      'no-number',
      `Enter ${target.label.toLowerCase()} as a number, digits and one point: 94.2`,
      'text',
    );
  }
  if (unitKind(unit) !== unitKind(target.unit)) {
    throw new CannotDo('other-unit', `${target.label} is not measured in ${shownUnit(unit)}.`, 'unit');
  }
  const { low, high } = target.plausible;
  const inUnit = convert(value, unit, target.unit);
  if (inUnit < low || inUnit > high) {
    throw new CannotDo(
      'not-plausible',
      `${text} ${shownUnit(unit)} cannot be right: ${target.label.toLowerCase()} lies between ${low} and ${high} ${shownUnit(target.unit)}. Read it again.`,
      'text',
    );
  }
  return value;
}

function requireInstrument(
  drafting: Drafting,
  step: Step,
  target: Target,
  value: number,
  unit: UnitName,
): InstrumentSnapshot | undefined {
  if (target.gear === undefined) return undefined;
  const instrument = own(drafting.state.gear, target.gear);
  if (instrument === undefined) {
    const need = drafting.procedure.document.gear.find(({ role }) => role === target.gear);
    throw new CannotDo(
      'gear-first',
      `Step ${step.number} is read with ${need?.label.toLowerCase() ?? target.gear}: choose it first.`,
      'gear',
    );
  }
  const range = rangeFor(instrument, unit, target.sense);
  if (range === undefined)
    throw new CannotDo(
      'gear-cannot',
      `${instrument.label} does not show ${target.label.toLowerCase()}. Choose another instrument.`,
      'gear',
    );
  const shown = convert(value, unit, range.unit);
  if (shown < range.low || shown > range.high) {
    throw new CannotDo(
      'beyond-range',
      `${instrument.label} shows ${range.low} to ${range.high} ${shownUnit(range.unit)} only. Read it again, or choose another instrument.`,
      'text',
    );
  }
  return instrument;
}
