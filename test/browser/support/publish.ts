import type { ProcedureDocument } from '../../../procedures/document';

/** Publishes documents as the garage's lead, one after the other, over the server's own interface. */
export async function publishAsLead(baseUrl: string, documents: readonly ProcedureDocument[]): Promise<void> {
  const ask = async <T>(path: string, body: unknown, token?: string): Promise<T> => {
    const answer = await fetch(`${baseUrl}${path}`, {
      method: 'POST',
      headers: {
        'content-type': 'application/json',
        ...(token === undefined ? {} : { authorization: `Bearer ${token}` }),
      },
      body: JSON.stringify(body),
    });
    if (!answer.ok) throw new Error(`${path}: ${answer.status} ${await answer.text()}`);
    return (await answer.json()) as T;
  };
  const session = await ask<{ accessToken: string }>('/api/session', { name: 'adeyemi', password: 'ossenholt-demo' });
  for (const document of documents) {
    const { id } = await ask<{ id: string }>('/api/procedures/drafts', document, session.accessToken);
    await ask(`/api/procedures/drafts/${id}/publication`, {}, session.accessToken);
  }
}
