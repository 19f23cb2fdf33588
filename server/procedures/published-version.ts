import type { EntityManager } from 'typeorm';
import type { CompiledProcedure, ProcedureDocument } from '../../procedures/document';
import type { CompiledProcedures } from './compiled-procedures';
import { ProcedureVersion } from './procedures.entity';

/** A published version, ready to replay runs with. */
export interface PublishedVersion {
  readonly title: string;
  readonly procedure: CompiledProcedure;
}

/** The version that a run's header names, content hash included; undefined when there is none. */
export async function publishedVersion(
  manager: EntityManager,
  compiled: CompiledProcedures,
  { procedureId, version, contentHash }: { procedureId: string; version: number; contentHash: string },
): Promise<PublishedVersion | undefined> {
  const found = await manager.findOneBy(ProcedureVersion, { procedureId, version, contentHash });
  if (found === null) return undefined;
  const procedure = compiled.of(contentHash, () => JSON.parse(found.document) as ProcedureDocument);
  return { title: found.title, procedure };
}
