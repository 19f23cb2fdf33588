import type { EntityManager } from 'typeorm';
import type { ProcedureDocument } from '../../procedures/document';
import { callableVersions } from './called-versions';
import { publishingProblems } from './checked-document';
import type { DraftSummary, ProcedureSummary, VersionSummary } from './procedures.dto';

interface VersionRow {
  procedure_id: string;
  version: number;
  title: string;
  content_hash: string;
  published_at: Date;
  published_by: string;
  reason: string | null;
  withdrawn_by: string | null;
  withdrawn_at: Date | null;
}

interface DraftRow {
  id: string;
  procedure_id: string;
  title: string;
  document: string;
  content_hash: string;
  imported_at: Date;
  imported_by: string;
}

/** Every procedure with its versions, newest first, and the draft that waits. Without documents, which are large. */
export async function summariesOf(manager: EntityManager): Promise<readonly ProcedureSummary[]> {
  const versions = await manager.query<VersionRow[]>(
    `SELECT v.procedure_id, v.version, v.title, v.content_hash, v.published_at, p.display_name AS published_by,
       w.reason, w.withdrawn_at, wp.display_name AS withdrawn_by
     FROM procedure_version v JOIN person p ON p.id = v.published_by
     LEFT JOIN procedure_withdrawal w ON (w.procedure_id, w.version) = (v.procedure_id, v.version)
     LEFT JOIN person wp ON wp.id = w.withdrawn_by
     ORDER BY v.procedure_id, v.version DESC`,
  );
  const drafts = await manager.query<DraftRow[]>(
    `SELECT d.id, d.procedure_id, d.title, d.document, d.content_hash, d.imported_at, p.display_name AS imported_by
     FROM procedure_draft d JOIN person p ON p.id = d.imported_by
     WHERE d.published_version IS NULL ORDER BY d.imported_at`,
  );
  const summaries = new Map<DraftRow, DraftSummary>();
  for (const row of drafts) summaries.set(row, await draftSummary(manager, row));
  const ids = new Set([...versions, ...drafts].map((row) => row.procedure_id));
  return [...ids].sort().map((id) => {
    const own = versions.filter((row) => row.procedure_id === id);
    const draft = drafts.findLast((row) => row.procedure_id === id);
    return {
      id,
      title: (own.find((row) => row.reason === null) ?? draft ?? own[0])?.title ?? id,
      versions: own.map(versionSummary),
      ...(draft === undefined ? {} : { draft: summaries.get(draft) }),
    };
  });
}

function versionSummary(row: VersionRow): VersionSummary {
  return {
    version: row.version,
    status: row.reason === null ? 'published' : 'withdrawn',
    publishedAt: row.published_at.toISOString(),
    publishedBy: row.published_by,
    contentHash: row.content_hash,
    ...(row.reason === null || row.withdrawn_at === null
      ? {}
      : { withdrawal: { reason: row.reason, by: row.withdrawn_by ?? '', at: row.withdrawn_at.toISOString() } }),
  };
}

async function draftSummary(manager: EntityManager, row: DraftRow): Promise<DraftSummary> {
  const document = JSON.parse(row.document) as ProcedureDocument;
  const problems = publishingProblems(document, await callableVersions(manager, document));
  return {
    id: row.id,
    title: row.title,
    contentHash: row.content_hash,
    importedAt: row.imported_at.toISOString(),
    importedBy: row.imported_by,
    problems,
  };
}
