import type { CompiledProcedure, Validity } from '../document';
import { own } from './environment';
import { readsOf } from './quantities';
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

/** Marks the readings that no longer hold; from then on they have no value until they are taken again. */
export function endStaleReadings(procedure: CompiledProcedure, state: RunState, moment: Moment): RunState {
  let { values } = state;
  for (const [name, validity] of endingReadings(procedure)) {
    const value = own(values, name);
    if (value === undefined || value.stale !== undefined || !isOver(validity, value, moment)) continue;
    values = withEntry(values, name, { ...value, stale: { seq: moment.seq, because: validity.because } });
  }
  if (values === state.values) return state;
  const next = draftOf(state);
  next.values = values;
  return next;
}

function isOver({ minutes, until }: Validity, value: NamedValue, { at, done }: Moment): boolean {
  if (done !== undefined && done !== value.step && until?.includes(done) === true) return true;
  return minutes !== undefined && at - value.at > minutes * 60_000;
}

/** The readings among the names that no longer hold. */
export function staleAmong(state: RunState, names: readonly string[]): readonly NamedValue[] {
  return names.flatMap((name) => {
    const value = own(state.values, name);
    return value?.stale === undefined ? [] : [value];
  });
}
