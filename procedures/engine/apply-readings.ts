import { unitKind } from '../calculations/for-a-run';
import type { CompiledProcedure, Step } from '../document';
import { isSeriesStep } from '../document/step-parts';
import { own } from './environment';
import { parseDecimal } from './figures';
import { added, draftOf, withEntry, withoutEntry } from './state-changes';
import { computedValue, measureQuantity } from './measure-quantity';
import { channelsOf, foundQuantitiesOf, readQuantity, takesNeeded, wayOf } from './quantities';
import { RefusedEvent } from './refusal';
import { requireCurrent, requireStep } from './apply-walk';
import { endStaleReadings } from './validity';
import type { EventOf, RunEventData } from './run-event';
import type { NamedValue, RunState, SeriesState, Take } from './run-state';

/** One take: when the quantity has all it needs, its value follows. */
export function recordReading(
  procedure: CompiledProcedure,
  state: RunState,
  event: EventOf<'reading-recorded'>,
): RunState {
  const { step: stepId, name, figure, source, way, timeS } = event.data;
  const step = requireStep(procedure, stepId);
  const current = requireCurrent(state, stepId);
  requireFigure(step, event.data);
  const found = foundQuantitiesOf(step).find((candidate) => candidate.name === name);
  if (found !== undefined && source === 'computed') {
    const provenance = { step: step.id, seq: event.seq, at: event.at };
    const figureWithSpread = { text: figure.text, uncertainty: event.data.uncertainty ?? '0' };
    return withValues(state, [computedValue(procedure, state, found, figureWithSpread, provenance)]);
  }
  const quantity = readQuantity(step, name);
  const take: Take = {
    seq: event.seq,
    text: figure.text,
    unit: figure.unit,
    source,
    ...(way === undefined ? {} : { way }),
    ...(timeS === undefined ? {} : { timeS }),
  };
  const takes = added(own(current.takes, name) ?? [], take);
  const draft = draftOf(state);
  draft.current = { ...current, takes: { ...current.takes, [name]: takes } };
  const next = endStaleReadings(procedure, draft, event);
  return quantity === undefined ? next : remeasure(procedure, next, step, name, event);
}

/** The figure has to be a decimal in a unit of what is read: a quantity, the entry of its way, or a channel. */
function requireFigure(step: Step, { name, figure, way: wayId, uncertainty }: RunEventData['reading-recorded']): void {
  const quantity = readQuantity(step, name);
  const way = quantity === undefined ? undefined : wayOf(quantity, wayId);
  if (quantity !== undefined && (way === undefined) !== (quantity.ways === undefined)) {
    throw new RefusedEvent('unknown-name', `${name} is not known by the way ${wayId ?? 'of reading it directly'}`);
  }
  const read =
    way?.entry ??
    quantity ??
    foundQuantitiesOf(step).find((found) => found.name === name) ??
    channelsOf(step).find((channel) => channel.name === name);
  if (read === undefined) throw new RefusedEvent('unknown-name', `step ${step.number} takes no reading ${name}`);
  if (parseDecimal(figure.text) === undefined || unitKind(figure.unit) !== unitKind(read.unit)) {
    throw new RefusedEvent('malformed', `the reading ${name} is no decimal number in a unit such as ${read.unit}`);
  }
  if (uncertainty !== undefined && !((parseDecimal(uncertainty) ?? -1) >= 0)) {
    throw new RefusedEvent('malformed', `the uncertainty of ${name} is no decimal number from 0`);
  }
}

/** Names the value of a quantity from its takes in this claim, once there are enough. */
function remeasure(
  procedure: CompiledProcedure,
  state: RunState,
  step: Step,
  name: string,
  { seq, at }: { readonly seq: number; readonly at: number },
): RunState {
  const quantity = readQuantity(step, name);
  const takes = state.current?.takes[name] ?? [];
  if (quantity === undefined || takes.length < takesNeeded(quantity)) return withoutValue(state, name);
  return withValues(
    state,
    measureQuantity(procedure, state, quantity, takes.slice(-takesNeeded(quantity)), { step: step.id, seq, at }),
  );
}

function withValues(state: RunState, values: readonly NamedValue[]): RunState {
  const next = draftOf(state);
  for (const value of values) next.values = withEntry(next.values, value.name, value);
  return next;
}

function withoutValue(state: RunState, name: string): RunState {
  const next = draftOf(state);
  next.values = withoutEntry(state.values, name);
  return next;
}

/** A take that went over a limit is evidence, but does not count as a reading. */
export function dropLastTake(state: RunState, name: string): RunState {
  const current = state.current;
  const takes = current === undefined ? undefined : own(current.takes, name);
  if (current === undefined || takes === undefined) return state;
  return withoutValue(
    { ...state, current: { ...current, takes: { ...current.takes, [name]: takes.slice(0, -1) } } },
    name,
  );
}

/** The takes and marks that an undone event gave no longer count. */
export function undo(procedure: CompiledProcedure, state: RunState, event: EventOf<'undone'>): RunState {
  const current = state.current;
  if (current === undefined) throw new RefusedEvent('not-current', 'there is no current step to undo anything in');
  for (const [name, takes] of Object.entries(current.takes)) {
    if (!takes.some((take) => take.seq === event.data.seq)) continue;
    const rest = takes.filter((take) => take.seq !== event.data.seq);
    const next = { ...state, current: { ...current, takes: { ...current.takes, [name]: rest } } };
    return remeasure(procedure, next, requireStep(procedure, current.id), name, event);
  }
  for (const [name, series] of Object.entries(state.series)) {
    const marks = Object.entries(series.marks).filter(([, mark]) => mark.seq !== event.data.seq);
    if (marks.length < Object.keys(series.marks).length) {
      return { ...state, series: withEntry(state.series, name, { ...series, marks: Object.fromEntries(marks) }) };
    }
  }
  throw new RefusedEvent('unknown-name', `event ${event.data.seq} gave nothing that the current step still holds`);
}

export function recordSeries(
  procedure: CompiledProcedure,
  state: RunState,
  event: EventOf<'series-recorded'>,
): RunState {
  const step = requireStep(procedure, event.data.step);
  requireCurrent(state, step.id);
  if (!isSeriesStep(step) || step.name !== event.data.name) {
    throw new RefusedEvent('unknown-name', `step ${step.number} takes no series ${event.data.name}`);
  }
  const marks = own(state.series, step.name)?.marks ?? {};
  const series: SeriesState = { step: step.id, seq: event.seq, record: event.data, marks };
  return { ...state, series: withEntry(state.series, step.name, series) };
}

export function placeMark(procedure: CompiledProcedure, state: RunState, event: EventOf<'mark-placed'>): RunState {
  const { step: stepId, series: name, mark, timeS, by } = event.data;
  const step = requireStep(procedure, stepId);
  requireCurrent(state, step.id);
  if (step.kind !== 'listen' || step.name !== name) {
    throw new RefusedEvent('unknown-name', `step ${step.number} takes no marks on ${name}`);
  }
  const series = own(state.series, name);
  const marks = { ...series?.marks, [mark]: { timeS, seq: event.seq, by } };
  const record = series?.record;
  const marked = { step: step.id, seq: series?.seq ?? event.seq, marks, ...(record === undefined ? {} : { record }) };
  return { ...state, series: withEntry(state.series, name, marked) };
}
