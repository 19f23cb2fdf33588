import { checkRunEvent } from './compiled/run-event-validator';
import type { RunEvent } from './run-event';

/** What keeps a value from being an event, for whoever wrote the sender: a JSON pointer and the rule that it breaks. */
export interface EventProblem {
  readonly pointer: string;
  readonly message: string;
}

export type EventValidation =
  { readonly ok: true; readonly event: RunEvent } | { readonly ok: false; readonly problems: readonly EventProblem[] };

const mostProblems = 20;

/**
 * Holds a value that came over the wire against `run-event.schema.json`: envelope, and the data of its type. Chain,
 * rights and sense are checked elsewhere. Imported by its path, not through the room's face: the app never needs it.
 */
export function validateRunEvent(value: unknown): EventValidation {
  if (checkRunEvent(value)) return { ok: true, event: value as RunEvent };
  const problems = (checkRunEvent.errors ?? [])
    .filter(({ keyword }) => keyword !== 'if')
    .map(({ instancePath, keyword, params, message }) => ({
      pointer: instancePath,
      message: `${message ?? keyword} ${JSON.stringify(params)}`,
    }));
  return { ok: false, problems: problems.slice(0, mostProblems) };
}
