import type { Page } from '@playwright/test';

/** What the server says to one run of a push. */
export interface PushedRun {
  readonly runId: string;
  readonly acceptedThrough: number;
  readonly problem?: { readonly code: string; readonly status: number };
}

/** Sends a run past the app, by the person's right and signed by the tablet's own key. */
export async function pushByHand(
  page: Page,
  name: string,
  run: { readonly header: object; readonly events: readonly object[] },
): Promise<readonly PushedRun[]> {
  return page.evaluate(
    async ({ name, run }) => {
      const open = indexedDB.open('bayhand');
      const store = await new Promise<IDBDatabase>((resolve, reject) => {
        open.onsuccess = () => resolve(open.result);
        open.onerror = () => reject(open.error);
      });
      const asked = store.transaction('keys').objectStore('keys').get('tablet');
      const tablet = await new Promise<{ tabletId: string; privateKey: CryptoKey }>((resolve, reject) => {
        asked.onsuccess = () => resolve(asked.result as { tabletId: string; privateKey: CryptoKey });
        asked.onerror = () => reject(asked.error);
      });
      store.close();
      const json = { 'content-type': 'application/json' };
      const signedIn = await fetch('/api/session', {
        method: 'POST',
        headers: json,
        body: JSON.stringify({ name, password: 'ossenholt-demo' }),
      });
      const { accessToken } = (await signedIn.json()) as { accessToken: string };
      const body = new TextEncoder().encode(JSON.stringify({ device: tablet.tabletId, runs: [run], documents: [] }));
      const signing = { name: 'ECDSA', hash: 'SHA-256' };
      const signature = new Uint8Array(await crypto.subtle.sign(signing, tablet.privateKey, body));
      const base64Url = btoa(String.fromCharCode(...signature))
        .replaceAll('+', '-')
        .replaceAll('/', '_')
        .replaceAll('=', '');
      const answer = await fetch('/api/sync/push', {
        method: 'POST',
        headers: { ...json, authorization: `Bearer ${accessToken}`, 'x-bayhand-signature': base64Url },
        body,
      });
      if (!answer.ok) throw new Error(`the push as a whole: ${answer.status} ${await answer.text()}`);
      return ((await answer.json()) as { runs: PushedRun[] }).runs;
    },
    { name, run },
  );
}
