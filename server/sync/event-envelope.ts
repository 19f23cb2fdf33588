import type { RunEvent } from '../../procedures/engine';
import { isEventType } from './event-rights';

const uuidForm = /^[0-9a-f]{8}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{4}-[0-9a-f]{12}$/;
const sha256Form = /^[0-9a-f]{64}$/;

const isUuid = (value: unknown): boolean => typeof value === 'string' && uuidForm.test(value);
const isSha256 = (value: unknown): boolean => typeof value === 'string' && sha256Form.test(value);
const isCount = (value: unknown): boolean => Number.isSafeInteger(value) && (value as number) >= 0;
const isObject = (value: unknown): boolean => typeof value === 'object' && value !== null && !Array.isArray(value);

/**
 * What each field of an event's envelope must be. By hand instead of decorators: a push brings thousands of events and
 * each costs its share of the time that the whole push may take.
 */
const fields: Readonly<Record<keyof RunEvent, (value: unknown) => boolean>> = {
  runId: isUuid,
  seq: (value) => isCount(value) && (value as number) >= 1 && (value as number) <= 1_000_000,
  id: isUuid,
  at: isCount,
  elapsed: (value) => typeof value === 'number' && Number.isFinite(value),
  actor: isUuid,
  device: isUuid,
  build: (value) => typeof value === 'string' && value.length >= 1 && value.length <= 100 && !value.includes('\u0000'),
  schema: (value) => value === 1,
  type: isEventType,
  data: isObject,
  prev: isSha256,
  hash: isSha256,
};

const names = Object.keys(fields) as (keyof RunEvent)[];

/** What is wrong with an event's envelope, in words; undefined when it has the form of an event. */
export function envelopeProblem(event: object): string | undefined {
  const given = event as Readonly<Record<string, unknown>>;
  for (const name of names) if (!fields[name](given[name])) return `its ${name} is missing or not in the right form`;
  if (Object.keys(given).length === names.length) return undefined;
  return `it has a field that events do not have: ${Object.keys(given).find((name) => !Object.hasOwn(fields, name))}`;
}
