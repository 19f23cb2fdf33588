import { matchingParam } from '../http/path-params';
import { everyRole, route, type Route } from '../http/route';
import type { AttachmentsService } from './attachments.service';

const limitBytes = 16 * 1024 * 1024;
const path = '/api/attachments/:sha256';
const sha256Form = /^[0-9a-f]{64}$/;

export function attachmentsRoutes(attachments: AttachmentsService): Route[] {
  return [
    route(
      'put',
      path,
      everyRole,
      {
        summary: 'Keep bytes under their SHA-256.',
        body: { kind: 'bytes', limitBytes },
        answers: { 201: 'They are kept.', 204: 'They were here already.' },
      },
      async ({ params, bytes }) => {
        const isNew = await attachments.keep(matchingParam(params, 'sha256', sha256Form), bytes);
        return { status: isNew ? 201 : 204 };
      },
    ),
    route(
      'get',
      path,
      everyRole,
      { summary: 'The bytes with this SHA-256.', answers: { 200: 'The bytes.' } },
      async ({ params }) => {
        const bytes = await attachments.bytes(matchingParam(params, 'sha256', sha256Form));
        return {
          status: 200,
          bytes,
          type: 'application/octet-stream',
          cacheControl: 'private, max-age=31536000, immutable',
        };
      },
    ),
  ];
}
