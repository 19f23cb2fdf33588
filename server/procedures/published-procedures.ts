import { In, type EntityManager } from 'typeorm';
import type { ProcedureDocument } from '../../procedures/document';
import { Person } from '../access/access.entity';
import type { PublishedProcedure } from './procedures.dto';
import { ProcedureVersion, ProcedureWithdrawal } from './procedures.entity';

/** The published versions on the wire, all or those of these keys (`id/version`), withdrawn ones included. */
export async function publishedProcedures(
  manager: EntityManager,
  keys?: readonly string[],
): Promise<readonly PublishedProcedure[]> {
  const wanted = keys?.map(versionOf);
  const versions = await manager.find(ProcedureVersion, {
    ...(wanted === undefined ? {} : { where: wanted }),
    order: { procedureId: 'ASC', version: 'ASC' },
  });
  if (wanted?.length === 0 || versions.length === 0) return [];
  const withdrawals = await manager.find(ProcedureWithdrawal);
  const withdrawn = new Set(withdrawals.map(({ procedureId, version }) => `${procedureId}/${version}`));
  const people = await manager.findBy(Person, { id: In(versions.map(({ publishedBy }) => publishedBy)) });
  const names = new Map(people.map(({ id, displayName }) => [id, displayName]));
  return versions.map((row) => ({
    id: row.procedureId,
    version: row.version,
    status: withdrawn.has(`${row.procedureId}/${row.version}`) ? 'withdrawn' : 'published',
    contentHash: row.contentHash,
    publishedAt: row.publishedAt.toISOString(),
    publishedBy: names.get(row.publishedBy) ?? '',
    document: JSON.parse(row.document) as ProcedureDocument,
  }));
}

function versionOf(key: string): { procedureId: string; version: number } {
  const slash = key.lastIndexOf('/');
  return { procedureId: key.slice(0, slash), version: Number(key.slice(slash + 1)) };
}
