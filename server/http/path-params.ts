import { isUUID } from 'class-validator';
import { NotFound } from './problem';

/** A path's part that must be a UUID; anything else names nothing. */
export function uuidParam(params: Readonly<Record<string, string>>, name: string): string {
  const value = params[name];
  if (value === undefined || !isUUID(value)) throw new NotFound('There is nothing of that id.');
  return value.toLowerCase();
}

/** A path's part of the given form; anything else names nothing. */
export function matchingParam(params: Readonly<Record<string, string>>, name: string, form: RegExp): string {
  const value = params[name];
  if (value === undefined || !form.test(value)) throw new NotFound('There is nothing of that name.');
  return value;
}
