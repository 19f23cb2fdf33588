import { isUnit } from '../calculations/for-a-run';

/**
 * Says what keeps a value from having a shape, with the place in it (`data/figure/text is no text`); undefined when it
 * has it. Never throws on a value that JSON can hold.
 */
export type Shape = (value: unknown, at: string) => string | undefined;

export const text: Shape = (value, at) => (typeof value === 'string' ? undefined : `${at} is no text`);

/** A finite number: NaN and the infinities have no JSON form. */
export const number: Shape = (value, at) => (Number.isFinite(value) ? undefined : `${at} is no number`);

/** A whole number from 0 that JSON keeps exactly (at most 2^53 - 1). */
export const count: Shape = (value, at) =>
  Number.isSafeInteger(value) && (value as number) >= 0 ? undefined : `${at} is no whole number from 0`;

/** Seconds, or another size that is never below zero. */
export const size: Shape = (value, at) =>
  Number.isFinite(value) && (value as number) >= 0 ? undefined : `${at} is no number from 0`;

export const flag: Shape = (value, at) => (typeof value === 'boolean' ? undefined : `${at} is neither true nor false`);

export const unit: Shape = (value, at) =>
  typeof value === 'string' && isUnit(value) ? undefined : `${at} is no unit that is known here`;

export function oneOf(...allowed: readonly unknown[]): Shape {
  return (value, at) => (allowed.includes(value) ? undefined : `${at} is none of ${allowed.join(', ')}`);
}

// The place of a member is put together only where something is wrong with it: every event of a replay is checked.

export function listOf(entry: Shape): Shape {
  return (value, at) => {
    if (!Array.isArray(value)) return `${at} is no list`;
    for (let index = 0; index < value.length; index += 1) {
      if (entry(value[index], '') !== undefined) return entry(value[index], `${at}/${index}`);
    }
    return undefined;
  };
}

/** An object with one shape under every name. */
export function recordOf(entry: Shape): Shape {
  return (value, at) => {
    if (!isObject(value)) return `${at} is no object`;
    for (const name of Object.keys(value)) {
      if (entry(value[name], '') !== undefined) return entry(value[name], `${at}/${name}`);
    }
    return undefined;
  };
}

/**
 * An object with these members; a member whose name ends in `?` may be absent. What else it has is left alone. None of
 * the names is one that every object inherits, so what is read is its own.
 */
export function objectOf(members: Readonly<Record<string, Shape>>): Shape {
  const needed = Object.entries(members).map(([name, shape]) => {
    const isOptional = name.endsWith('?');
    return { name: isOptional ? name.slice(0, -1) : name, isOptional, isText: shape === text, shape };
  });
  return (value, at) => {
    if (!isObject(value)) return `${at} is no object`;
    for (const { name, isOptional, isText, shape } of needed) {
      const member = value[name];
      // Most members are texts.
      if (isText && typeof member === 'string') continue;
      if (member === undefined) {
        if (isOptional) continue;
        return `${at}/${name} is missing`;
      }
      if (shape(member, '') !== undefined) return shape(member, `${at}/${name}`);
    }
    return undefined;
  };
}

function isObject(value: unknown): value is Readonly<Record<string, unknown>> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}
