import type { ProcedureDocument } from '../procedure-document';

/** A JSON value that a spec may change. */
export type Part = Record<string, unknown> & { [index: number]: Part };

/** A copy of a document with the parts at the given paths (`steps/3/next/0`) changed. */
export function changedDocument(
  document: ProcedureDocument,
  ...changes: readonly (readonly [path: string, change: (part: Part) => void])[]
): ProcedureDocument {
  const copy = JSON.parse(JSON.stringify(document)) as Part;
  for (const [path, change] of changes) {
    const keys = path === '' ? [] : path.split('/');
    change(keys.reduce<Part>((part, key) => part[key] as Part, copy));
  }
  return copy as unknown as ProcedureDocument;
}
