import { matchingParam, uuidParam } from '../http/path-params';
import { everyRole, route, type Route } from '../http/route';
import { DraftAnswer, DraftDetail, ProcedureSummary, PublicationAnswer, WithdrawalRequest } from './procedures.dto';
import type { ProceduresService } from './procedures.service';

const draftLimitBytes = 2 * 1024 * 1024;
const small = 16 * 1024;

export function proceduresRoutes(procedures: ProceduresService): Route[] {
  return [
    route(
      'get',
      '/api/procedures',
      everyRole,
      { summary: 'Every procedure with its versions and its draft.', answers: { 200: [ProcedureSummary] } },
      async () => ({ status: 200, json: await procedures.list() }),
    ),
    route(
      'post',
      '/api/procedures/drafts',
      ['lead'],
      {
        summary: 'Bring in a procedure document as a draft.',
        body: { kind: 'document', limitBytes: draftLimitBytes },
        answers: { 201: DraftAnswer },
      },
      async ({ body }, person) => ({ status: 201, json: await procedures.importDraft(body, person) }),
    ),
    route(
      'get',
      '/api/procedures/drafts/:id',
      ['lead'],
      { summary: 'A draft with its document.', answers: { 200: DraftDetail } },
      async ({ params }) => ({ status: 200, json: await procedures.draft(uuidParam(params, 'id')) }),
    ),
    route(
      'post',
      '/api/procedures/drafts/:id/publication',
      ['lead'],
      {
        summary: 'Publish a draft as the next version.',
        answers: { 201: PublicationAnswer },
      },
      async ({ params }, person) => ({ status: 201, json: await procedures.publish(uuidParam(params, 'id'), person) }),
    ),
    route(
      'post',
      '/api/procedures/:id/versions/:version/withdrawal',
      ['lead'],
      {
        summary: 'Withdraw a version: it starts no new run.',
        body: { kind: 'json', dto: WithdrawalRequest, limitBytes: small },
        answers: { 201: 'It is withdrawn.' },
      },
      async ({ params, body }, person) => {
        const id = matchingParam(params, 'id', /^[a-z0-9-]{1,100}$/);
        const version = Number(matchingParam(params, 'version', /^[1-9]\d{0,5}$/));
        await procedures.withdraw(id, version, body.reason, person);
        return { status: 201, json: {} };
      },
    ),
  ];
}
