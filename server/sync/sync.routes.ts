import { everyRole, route, type Route } from '../http/route';
import { readPush } from './read-push';
import { PullAnswer, PullQuery, PushAnswer, PushRequest } from './sync.dto';
import type { SyncService } from './sync.service';

const pushLimitBytes = 8 * 1024 * 1024;

export function syncRoutes(sync: SyncService): Route[] {
  return [
    route(
      'post',
      '/api/sync/push',
      everyRole,
      {
        summary:
          'Deliver runs and visits. The header x-bayhand-signature carries the signature of an enrolled tablet over the body.',
        body: { kind: 'document', describedBy: PushRequest, limitBytes: pushLimitBytes },
        answers: { 200: PushAnswer },
      },
      async ({ req, body, bytes }) => {
        const signature = req.get('x-bayhand-signature') ?? '';
        return { status: 200, json: await sync.push(readPush(body), bytes, signature) };
      },
    ),
    route(
      'get',
      '/api/sync/pull',
      everyRole,
      {
        summary: 'What changed since a cursor; everything without one.',
        query: PullQuery,
        answers: { 200: PullAnswer },
      },
      async ({ query }) => ({ status: 200, json: await sync.pull(query.since) }),
    ),
  ];
}
