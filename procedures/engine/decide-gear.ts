import { convert, unitKind } from '../calculations/for-a-run';
import type { GearNeed } from '../document';
import { CannotDo, type Drafting } from './drafting';
import { own } from './environment';
import type { RunCommand } from './run-command';
import type { InstrumentSnapshot } from './run-event';

/** Takes an instrument for a role: of the right kind, with enough range; an overdue one costs a reason. */
export function chooseGear(drafting: Drafting, command: Extract<RunCommand, { do: 'choose-gear' }>): void {
  const { role, instrument, overdueBecause } = command;
  const need = drafting.procedure.document.gear.find((candidate) => candidate.role === role);
  if (need === undefined) throw new CannotDo('unknown-role', 'The procedure does not ask for that.');
  if (instrument.kind !== need.kind)
    throw new CannotDo('wrong-kind', `${instrument.label} is no ${need.label.toLowerCase()}.`, 'gear');
  const short = missingRange(need, instrument);
  if (short !== undefined) throw new CannotDo('range', short, 'gear');
  const reason = (overdueBecause ?? '').trim();
  if (isOverdue(instrument, drafting.state.lastAt) && reason === '') {
    throw new CannotDo(
      'overdue',
      `The check of ${instrument.label} ran out on ${instrument.dueOn}. Take another one, or say why this one is used all the same.`,
      'overdueBecause',
    );
  }
  drafting.add({
    type: 'gear-chosen',
    data: { role, instrument, ...(reason === '' ? {} : { overdueBecause: reason }) },
  });
}

/** Whether the instrument's check has run out on the day of `at` (milliseconds since 1970). */
export function isOverdue(instrument: Pick<InstrumentSnapshot, 'dueOn'>, at: number): boolean {
  return new Date(at).toISOString().slice(0, 10) > instrument.dueOn;
}

/** Says that an instrument's display is coarser than the bands need; undefined when it is fine enough. */
export function coarseness(
  need: GearNeed,
  instrument: Pick<InstrumentSnapshot, 'label' | 'shows'>,
): string | undefined {
  const shows = need.shows;
  if (shows === undefined) return undefined;
  const range = instrument.shows.find((candidate) => unitKind(candidate.unit) === unitKind(shows.unit));
  if (range === undefined) return undefined;
  const step = convert(range.resolution, range.unit, shows.unit) - convert(0, range.unit, shows.unit);
  if (step <= shows.resolution * 1.000001) return undefined;
  return `${instrument.label} shows ${trim(step)} ${shows.unit} steps where ${shows.resolution} ${shows.unit} are needed: near a band's edge the result will be too close to call.`;
}

function trim(value: number): string {
  return String(Number(value.toPrecision(3)));
}

function missingRange(need: GearNeed, instrument: InstrumentSnapshot): string | undefined {
  const shows = need.shows;
  if (shows === undefined) return undefined;
  const reaches = instrument.shows.some(
    (range) =>
      unitKind(range.unit) === unitKind(shows.unit) &&
      convert(range.low, range.unit, shows.unit) <= shows.low &&
      convert(range.high, range.unit, shows.unit) >= shows.high,
  );
  return reaches
    ? undefined
    : `${instrument.label} does not reach from ${shows.low} to ${shows.high} ${shows.unit}. Choose another one.`;
}

/** Refuses to begin while something that the procedure needs was not chosen. */
export function requireGear(drafting: Drafting): void {
  const missing = drafting.procedure.document.gear.filter(
    (need) => need.optional !== true && own(drafting.state.gear, need.role) === undefined,
  );
  if (missing.length > 0) {
    throw new CannotDo(
      'gear-first',
      `Choose first: ${missing.map(({ label }) => label.toLowerCase()).join(', ')}.`,
      'gear',
    );
  }
}
