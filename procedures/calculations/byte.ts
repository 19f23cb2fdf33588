import { requireInRange } from './argument-range';

/** Gives the value back when it is a byte. Throws RangeError unless it is a whole number from 0 to 255. */
export function requireByte(name: string, value: number): number {
  requireInRange(name, value, { low: 0, high: 255 });
  if (!Number.isInteger(value)) throw new RangeError(`${name} is ${value}; allowed: a whole number from 0 to 255`);
  return value;
}
