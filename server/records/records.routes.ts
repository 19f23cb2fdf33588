import { uuidParam } from '../http/path-params';
import { route, type Role, type Route } from '../http/route';
import { RecordDetail, RecordPage, RecordsQuery } from './records.dto';
import type { RecordsService } from './records.service';

const readers: readonly Role[] = ['lead', 'manager'];

export function recordsRoutes(records: RecordsService): Route[] {
  return [
    route(
      'get',
      '/api/records',
      readers,
      { summary: 'The list of records.', query: RecordsQuery, answers: { 200: RecordPage } },
      async ({ query }) => ({ status: 200, json: await records.list(query) }),
    ),
    route(
      'get',
      '/api/records/:runId',
      readers,
      { summary: 'One record with its events and what checking it found.', answers: { 200: RecordDetail } },
      async ({ params }) => ({ status: 200, json: await records.one(uuidParam(params, 'runId')) }),
    ),
  ];
}
