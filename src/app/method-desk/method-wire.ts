import type { ProcedureDocument } from '../../../procedures/document';

/** One version of a procedure in the list; the document itself is not in it. */
export interface VersionSummary {
  readonly version: number;
  readonly status: 'published' | 'withdrawn';
  /** ISO 8601. */
  readonly publishedAt: string;
  readonly publishedBy: string;
  /** SHA-256 of the document's canonical JSON, hexadecimal. */
  readonly contentHash: string;
  /** Why it starts no new run; of a withdrawn version alone. */
  readonly withdrawal?: { readonly reason: string; readonly by: string; readonly at: string };
}

export interface DraftSummary {
  readonly id: string;
  /** SHA-256 of the document's canonical JSON, hexadecimal. */
  readonly contentHash: string;
  /** The document's own, which may be another than that of the versions. */
  readonly title: string;
  /** ISO 8601. */
  readonly importedAt: string;
  readonly importedBy: string;
  /** What keeps it from being published. */
  readonly problems: readonly { readonly pointer: string; readonly detail: string }[];
}

/** A procedure with all its versions, newest first, and the draft that waits. */
export interface ProcedureSummary {
  readonly id: string;
  /** Of the newest published version, else of the draft, else of the newest withdrawn one. */
  readonly title: string;
  readonly versions: readonly VersionSummary[];
  readonly draft?: DraftSummary | null;
}

/** A draft with its document. */
export interface DraftDetail extends DraftSummary {
  readonly procedureId: string;
  readonly document: ProcedureDocument;
}

/** Checks an answer's shape; throws RangeError when the server says something else than agreed. */
export function readProcedureList(body: unknown): readonly ProcedureSummary[] {
  if (Array.isArray(body) && body.every(isSummary)) return body;
  throw new RangeError('The list of procedures has another shape than this build knows');
}

/** Checks an answer's shape; throws RangeError when the server says something else than agreed. */
export function readDraft(body: unknown): DraftDetail {
  if (isObject(body) && typeof body['id'] === 'string' && isObject(body['document'])) {
    return body as unknown as DraftDetail;
  }
  throw new RangeError('The draft has another shape than this build knows');
}

function isSummary(item: unknown): item is ProcedureSummary {
  return isObject(item) && typeof item['id'] === 'string' && Array.isArray(item['versions']);
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}
