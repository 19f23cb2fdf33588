import type { RunState } from './run-state';

/*
 * How the reducers change a run's state, and the lists and records in it that grow with the run.
 *
 * A state that anybody has seen is never changed: a change makes a copy. Over a long run those copies cost the square
 * of its length. The states inside of one replay are seen by nobody, so there a list or record is copied at its first
 * change only, and what the replay made itself is changed in place from then on.
 */

/** An entry that belongs to a step. */
interface OfStep {
  readonly step: string;
}

type Names = Map<string, Set<string>>;

interface Made {
  state: RunState | undefined;
  /** With the last entry that was put in, while only the list holds it. */
  readonly lists: Map<object, unknown>;
  /** With the names that each step gave. */
  readonly records: Map<object, Names>;
}

/** What the innermost replay made; undefined outside of one. */
let made: Made | undefined;

/** Does the work of one replay: it must give out no state but the last. What comes in from outside stays as it is. */
export function changingInPlace<T>(work: () => T): T {
  const outer = made;
  made = { state: undefined, lists: new Map(), records: new Map() };
  try {
    return work();
  } finally {
    made = outer;
  }
}

/** A new state that is still being made; it is given out as a `RunState`. */
export type StateDraft = { -readonly [Field in keyof RunState]: RunState[Field] };

/**
 * What the next state is made of: a copy, or inside of a replay the state itself, so a reducer reads what it needs of
 * the state before it sets a field.
 */
export function draftOf(state: RunState): StateDraft {
  if (made?.state === state) return state;
  const draft = { ...state };
  if (made !== undefined) made.state = draft;
  return draft;
}

/** Shorter lists are copied: there are many, and remembering each would cost more. */
const shortList = 8;

/** The list with one more entry. */
export function added<T>(list: readonly T[], entry: T): readonly T[] {
  const changed = changeableList(list);
  changed.push(entry);
  keepLast(changed, entry);
  return changed;
}

/** The list with its last entry changed; `change` sets fields of a draft. An empty list stays as it is. */
export function lastChanged<T extends object>(
  list: readonly T[],
  change: (draft: { -readonly [Field in keyof T]: T[Field] }) => void,
): readonly T[] {
  const last = list.at(-1);
  if (last === undefined) return list;
  const changed = changeableList(list);
  const draft = made?.lists.get(changed) === last ? last : { ...last };
  change(draft);
  changed[changed.length - 1] = draft;
  keepLast(changed, draft);
  return changed;
}

function keepLast(list: object, entry: unknown): void {
  if (made?.lists.has(list) === true) made.lists.set(list, entry);
}

/** The list with the entries from `start` on changed. */
export function changedFrom<T>(list: readonly T[], start: number, change: (entry: T) => T): readonly T[] {
  if (start >= list.length || list.length === 0) return list;
  const changed = changeableList(list);
  for (let index = Math.max(0, start); index < changed.length; index += 1) {
    const entry = changed[index];
    if (entry !== undefined) changed[index] = change(entry);
  }
  return changed;
}

function changeableList<T>(list: readonly T[]): T[] {
  if (made?.lists.has(list) === true) return list as T[];
  const copy = [...list];
  if (copy.length > shortList) made?.lists.set(copy, undefined);
  return copy;
}

/** The record with an entry set. */
export function withEntry<T extends OfStep>(
  record: Readonly<Record<string, T>>,
  name: string,
  entry: T,
): Readonly<Record<string, T>> {
  const known = made?.records.get(record);
  if (known === undefined && made === undefined) return { ...record, [name]: entry };
  const [changed, names] = known === undefined ? copied(record) : [record as Record<string, T>, known];
  changed[name] = entry;
  note(names, name, entry.step);
  return changed;
}

/** The record without one entry. */
export function withoutEntry<T extends OfStep>(
  record: Readonly<Record<string, T>>,
  name: string,
): Readonly<Record<string, T>> {
  return Object.hasOwn(record, name) ? without(record, [name]) : record;
}

/** The record without what a step gave. */
export function withoutStep<T extends OfStep>(
  record: Readonly<Record<string, T>>,
  step: string,
): Readonly<Record<string, T>> {
  const names = namesOfStep(record, step);
  return names.length === 0 ? record : without(record, names);
}

/** The record of counts with one of them raised by one. */
export function countedUp(record: Readonly<Record<string, number>>, name: string): Readonly<Record<string, number>> {
  const changed = made?.lists.has(record) === true ? (record as Record<string, number>) : { ...record };
  changed[name] = (changed[name] ?? 0) + 1;
  made?.lists.set(changed, undefined);
  return changed;
}

/** What a step gave. */
export function entriesOfStep<T extends OfStep>(record: Readonly<Record<string, T>>, step: string): readonly T[] {
  const entries: T[] = [];
  for (const name of namesOfStep(record, step)) {
    const entry = record[name];
    if (entry !== undefined) entries.push(entry);
  }
  return entries;
}

function without<T extends OfStep>(
  record: Readonly<Record<string, T>>,
  names: readonly string[],
): Readonly<Record<string, T>> {
  const isOwn = made?.records.has(record) === true;
  const changed = isOwn ? (record as Record<string, T>) : made === undefined ? { ...record } : copied(record)[0];
  for (const name of names) delete changed[name];
  return changed;
}

function namesOfStep<T extends OfStep>(record: Readonly<Record<string, T>>, step: string): readonly string[] {
  const known = made?.records.get(record);
  const names = known === undefined ? Object.keys(record) : known.get(step);
  const given: string[] = [];
  // A name may since have gone, or been given by another step.
  for (const name of names ?? []) if (record[name]?.step === step) given.push(name);
  return given;
}

/** A copy that belongs to the replay; only inside of one. */
function copied<T extends OfStep>(record: Readonly<Record<string, T>>): [Record<string, T>, Names] {
  const copy = { ...record };
  const names: Names = new Map();
  for (const [name, { step }] of Object.entries(copy)) note(names, name, step);
  made?.records.set(copy, names);
  return [copy, names];
}

function note(names: Names, name: string, step: string): void {
  const known = names.get(step);
  if (known === undefined) names.set(step, new Set([name]));
  else known.add(name);
}
