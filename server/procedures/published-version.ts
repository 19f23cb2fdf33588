import type { EntityManager } from 'typeorm';
import type { CompiledProcedure, ProcedureDocument } from '../../procedures/document';
import { calledLibrary } from './called-versions';
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
  return {
    title: found.title,
    procedure: compiled.known(contentHash) ?? (await compiledAnew(manager, compiled, found)),
  };
}

async function compiledAnew(
  manager: EntityManager,
  compiled: CompiledProcedures,
  { contentHash, document: text }: ProcedureVersion,
): Promise<CompiledProcedure> {
  const document = JSON.parse(text) as ProcedureDocument;
  return compiled.keep(contentHash, document, await calledLibrary(manager, document));
}
