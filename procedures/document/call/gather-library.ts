import type { CallStep, ProcedureDocument } from '../procedure-document';
import type { ProcedureLibrary } from './expand-calls';

/** One version that a document calls. */
export type CalledKey = Pick<CallStep, 'procedure' | 'version'>;

/** The versions that a document's own steps call, each once, in the order of its steps. */
export function callsOf({ steps }: Pick<ProcedureDocument, 'steps'>): readonly CalledKey[] {
  const calls = new Map<string, CalledKey>();
  for (const step of steps) {
    if (step.kind !== 'call') continue;
    const { procedure, version } = step;
    calls.set(keyOf(procedure, version), { procedure, version });
  }
  return [...calls.values()];
}

/** Every version that a document calls, at any depth, and the one that was not to be had first. */
export interface GatheredCalls<T> {
  /** Each once, a caller before what it calls. */
  readonly found: readonly T[];
  readonly missing: CalledKey | undefined;
}

/**
 * Fetches every version that a document calls, and what those call. `fetch` gives undefined for a version that is not
 * there. Each version is fetched once, so that calls that come back to one another end.
 */
export async function gatherCalls<T extends { readonly document: ProcedureDocument }>(
  document: Pick<ProcedureDocument, 'steps'>,
  fetch: (key: CalledKey) => Promise<T | undefined>,
): Promise<GatheredCalls<T>> {
  const found = new Map<string, T>();
  const asked = new Set<string>();
  let missing: CalledKey | undefined;
  const waiting = [...callsOf(document)];
  for (let key = waiting.shift(); key !== undefined; key = waiting.shift()) {
    const name = keyOf(key.procedure, key.version);
    if (asked.has(name)) continue;
    asked.add(name);
    const called = await fetch(key);
    if (called === undefined) {
      missing ??= key;
      continue;
    }
    found.set(name, called);
    waiting.push(...callsOf(called.document));
  }
  return { found: [...found.values()], missing };
}

/** What was gathered as a library. */
export function libraryOf(
  versions: readonly { readonly id: string; readonly version: number; readonly document: ProcedureDocument }[],
): ProcedureLibrary {
  const documents = new Map(versions.map(({ id, version, document }) => [keyOf(id, version), document]));
  return (id, version) => documents.get(keyOf(id, version));
}

const keyOf = (id: string, version: number): string => `${id}/${version}`;
