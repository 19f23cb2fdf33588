import type { CompiledProcedure, Validity } from '../document';
import { takenOf } from '../document/step-parts';
import { own } from './environment';
import { readsOf, resultsOf } from './quantities';
import type { NamedValue, RunState } from './run-state';
import { draftOf, withEntry } from './state-changes';

/** The moment at which readings are asked whether they still hold. */
interface Moment {
  readonly seq: number;
  /** Milliseconds since 1970, by the device's clock. */
  readonly at: number;
  /** A step that has just been done. */
  readonly done?: string;
}

const validities = new WeakMap<CompiledProcedure, readonly (readonly [name: string, validity: Validity])[]>();

/** The readings of a procedure that do not hold for the whole run. */
function endingReadings(procedure: CompiledProcedure): readonly (readonly [name: string, validity: Validity])[] {
  const known = validities.get(procedure);
  if (known !== undefined) return known;
  const found = procedure.document.steps.flatMap((step) =>
    readsOf(step).flatMap(({ name, validity }) => (validity === undefined ? [] : [[name, validity] as const])),
  );
  validities.set(procedure, found);
  return found;
}

/** A value that follows from others: a result, or what a call takes over. */
interface Derived {
  readonly name: string;
  readonly step: string;
  readonly from: readonly string[];
}

const derivations = new WeakMap<CompiledProcedure, readonly Derived[]>();

function derivedValues(procedure: CompiledProcedure): readonly Derived[] {
  const known = derivations.get(procedure);
  if (known !== undefined) return known;
  const found = procedure.document.steps.flatMap((step): readonly Derived[] => [
    ...resultsOf(step).map(({ name, is }) => ({ name, step: step.id, from: procedure.expression(is).names })),
    ...takenOf(step).map(({ name, from }) => ({ name, step: step.id, from: [from] })),
  ]);
  derivations.set(procedure, found);
  return found;
}

/**
 * Marks the readings that no longer hold, and what was computed from them; from then on they have no value until they
 * are taken again.
 */
export function endStaleReadings(procedure: CompiledProcedure, state: RunState, moment: Moment): RunState {
  const ending = endingReadings(procedure);
  if (ending.length === 0) return state;
  let { values } = state;
  const ended = new Set<string>();
  for (const [name, validity] of ending) {
    const value = own(values, name);
    if (value === undefined || value.stale !== undefined || !isOver(validity, value, state, moment)) continue;
    values = withEntry(values, name, { ...value, stale: { seq: moment.seq, because: validity.because } });
    ended.add(name);
  }
  if (ended.size === 0) return state;
  // In the order of the document, until nothing changes: a result may rest on a result.
  for (let isChanged = true; isChanged;) {
    isChanged = false;
    for (const { name, step, from } of derivedValues(procedure)) {
      const value = own(values, name);
      if (value === undefined || value.stale !== undefined || value.step !== step) continue;
      const source = from.find((other) => ended.has(other));
      const stale = source === undefined ? undefined : own(values, source)?.stale;
      if (stale === undefined) continue;
      values = withEntry(values, name, { ...value, stale });
      ended.add(name);
      isChanged = true;
    }
  }
  const next = draftOf(state);
  next.values = values;
  return next;
}

/** What a clock may be off without anybody noting it, milliseconds: network time corrects as much every day. */
const unnotedJumpMs = 120_000;

/** A time that cannot be told, since the clock was set back, is over: the reading is taken again. */
function isOver(
  { minutes, until }: Validity,
  value: NamedValue,
  { clockJumps }: RunState,
  { at, done }: Moment,
): boolean {
  if (done !== undefined && done !== value.step && until?.includes(done) === true) return true;
  if (minutes === undefined) return false;
  const jumped = clockJumps.filter(({ seq }) => seq > value.seq).reduce((sum, { byMs }) => sum + byMs, 0);
  const ageMs = at - value.at - jumped;
  return ageMs > minutes * 60_000 || ageMs < -unnotedJumpMs;
}

/** The readings among the names that no longer hold. */
export function staleAmong(state: RunState, names: readonly string[]): readonly NamedValue[] {
  return names.flatMap((name) => {
    const value = own(state.values, name);
    return value?.stale === undefined ? [] : [value];
  });
}
