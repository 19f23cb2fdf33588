import type { ProcedureDocument } from '../../procedures/document';
import type { TestServer } from './test-server';

/** Brings a document in and publishes it. Gives its version; throws what the server said when it refuses. */
export async function publishDocument(server: TestServer, document: ProcedureDocument): Promise<number> {
  const draft = await server.ask('POST', '/api/procedures/drafts', { as: 'adeyemi', json: document });
  if (draft.status !== 201) throw new Error(`no draft: ${draft.bytes.toString('utf8')}`);
  const path = `/api/procedures/drafts/${(draft.json as { id: string }).id}/publication`;
  const published = await server.ask('POST', path, { as: 'adeyemi', json: {} });
  if (published.status !== 201) throw new Error(`not published: ${published.bytes.toString('utf8')}`);
  return (published.json as { version: number }).version;
}
