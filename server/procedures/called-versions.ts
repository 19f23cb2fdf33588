import type { EntityManager } from 'typeorm';
import { gatherCalls, libraryOf, type ProcedureDocument, type ProcedureLibrary } from '../../procedures/document';
import type { PublishedVersions } from '../../procedures/document/authoring';
import type { PublishedProcedure } from './procedures.dto';
import { publishedProcedures } from './published-procedures';

/** Every version that a document calls, at any depth, withdrawn ones included. What is not published is left out. */
export async function calledVersions(
  manager: EntityManager,
  document: ProcedureDocument,
): Promise<readonly PublishedProcedure[]> {
  const { found } = await gatherCalls(document, async ({ procedure, version }) => {
    const [called] = await publishedProcedures(manager, [`${procedure}/${version}`]);
    return called;
  });
  return found;
}

/** The called versions as a library to compile with: a run goes on with a version that was withdrawn meanwhile. */
export async function calledLibrary(manager: EntityManager, document: ProcedureDocument): Promise<ProcedureLibrary> {
  return libraryOf(await calledVersions(manager, document));
}

/** The called versions as publishing sees them: it refuses to call what was withdrawn. */
export async function callableVersions(
  manager: EntityManager,
  document: ProcedureDocument,
): Promise<PublishedVersions> {
  const versions = new Map(
    (await calledVersions(manager, document)).map(({ id, version, status, document: called }) => [
      `${id}/${version}`,
      { document: called, isWithdrawn: status === 'withdrawn' },
    ]),
  );
  return (id, version) => versions.get(`${id}/${version}`);
}
