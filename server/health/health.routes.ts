import type { DataSource } from 'typeorm';
import { NotReady } from '../http/problem';
import { openRoute, type Route } from '../http/route';

/** Whether the process lives, and whether it can serve. */
export function healthRoutes(database: DataSource, isStopping: () => boolean): Route[] {
  return [
    openRoute('get', '/healthz', { summary: 'Whether the process lives.', answers: { 200: 'It does.' } }, async () =>
      Promise.resolve({ status: 200, json: { status: 'ok' } }),
    ),
    openRoute(
      'get',
      '/readyz',
      { summary: 'Whether the server can serve.', answers: { 200: 'It can.', 503: 'It can not (yet, or any more).' } },
      async () => {
        if (isStopping()) throw new NotReady('The server is stopping.');
        try {
          await database.query('SELECT 1');
        } catch {
          // Whatever the reason is, without the database there is nothing to serve.
          throw new NotReady('The database does not answer.');
        }
        return { status: 200, json: { status: 'ready' } };
      },
    ),
  ];
}
