import { canonicalJson, replay } from '../../procedures/engine';
import { compileProcedure } from '../../procedures/document';
import { RecordDetail, RecordPage } from '../../server/records/records.dto';
import { validated } from '../../server/http/validated';
import { closedRun, openedRun, publishSmallProcedure, type SentRun } from '../support/test-run';
import { TestServer } from '../support/test-server';
import { TestTablet } from '../support/test-tablet';

let server: TestServer;
let closed: SentRun;
let opened: SentRun;

beforeAll(async () => {
  server = await TestServer.start();
  const tablet = await TestTablet.enrol(server);
  await publishSmallProcedure(server);
  closed = closedRun({ device: tablet.id });
  opened = openedRun({ device: tablet.id });
  await tablet.push({ runs: [closed, opened, openedRun({ device: tablet.id }, { kind: 'practice' })] });
});
afterAll(() => server.stop());

async function list(query: string) {
  const answer = await server.ask('GET', `/api/records?${query}`, { as: 'lindqvist' });
  expect(answer.status).toBe(200);
  validated(RecordPage, answer.json);
  return answer.json;
}
const ids = ({ rows }: { rows: { runId: string }[] }) => rows.map(({ runId }) => runId);

describe('the list of records', () => {
  it('has every real run and no practice', async () => {
    const page = await list('');
    expect(page.total).toBe(2);
    expect(page.rows.find(({ runId }: { runId: string }) => runId === closed.header.runId)).toEqual({
      runId: closed.header.runId,
      procedureTitle: 'Small check',
      version: 1,
      repairOrder: '4417',
      car: 'Merrow Heron 1.6 turbo, silver',
      person: 'I. Okafor',
      openedAt: closed.events[0]!.at,
      closedAt: closed.events.at(-1)!.at,
      status: 'closed',
      half: 'warm',
      finding: 'sensorOff',
      verdict: expect.stringMatching(/^The manifold pressure sensor reads off by 26\.1/),
      result: 'out',
    });
  });

  it.each([
    ['text=heron', 2],
    ['text=HERON%20okafor', 2],
    ['text=ro%204417', 2],
    ['text=1zzbt4ck4lr204817', 2],
    ['text=reads%20off', 1],
    ['text=hesitates', 2],
    ['text=wren', 0],
    ['text=%25', 0],
    ['text=a_b', 0],
    ['text=%5C', 0],
    ['finding=sensorOff', 1],
    ['finding=seals', 0],
    ['status=closed', 1],
    ['status=signed', 0],
    ['kind=small-check', 2],
    ['kind=crankcase-valve-seal', 0],
    ['finding=sensorOff&text=heron&kind=small-check', 1],
  ])('finds by %s', async (query, total) => {
    const page = await list(query);
    expect([page.total, page.rows.length]).toEqual([total, total]);
  });

  it.each(['openedAt', 'closedAt', 'repairOrder', 'car', 'person', 'procedureTitle', 'verdict', 'finding', 'status'])(
    'sorts by %s, and the other way round with a minus',
    async (column) => {
      const up = ids(await list(`sort=${column}`));
      expect(up).toHaveLength(2);
      expect(ids(await list(`sort=-${column}`))).toEqual([...up].reverse());
    },
  );

  it('goes on page by page through all, each once', async () => {
    await server.database.query(
      `INSERT INTO run (run_id, header, procedure_id, version, procedure_title, site_id, visit_id, received_at, status,
         repair_order, car, vin, person_name, opened_at, searched)
       SELECT gen_random_uuid(), '{}', procedure_id, version, 'Filler', site_id, visit_id, received_at, 'open',
         'F' || n % 7, car, vin, person_name, 1000 + n % 5, 'filler'
       FROM run, generate_series(1, 120) AS n WHERE run_id = $1`,
      [opened.header.runId],
    );
    const pages = [];
    for (const page of [1, 2, 3, 4]) pages.push(await list(`text=filler&sort=-openedAt&page=${page}`));
    expect(pages.map(({ rows }) => rows.length)).toEqual([50, 50, 20, 0]);
    expect(pages.map(({ total }) => total)).toEqual([120, 120, 120, 120]);
    expect(new Set(pages.flatMap(ids)).size).toBe(120);
    await server.database.query(`DELETE FROM run WHERE searched = 'filler'`);
  });

  it.each(['sort=vin', 'sort=openedAt;DROP', 'page=0', 'page=x', 'colour=red', 'text=a&text=b', 'text=%00'])(
    'refuses the query %s',
    async (query) => {
      const answer = await server.ask('GET', `/api/records?${query}`, { as: 'lindqvist' });
      expect(answer).toMatchObject({ status: 400, json: { code: 'invalid-query' } });
    },
  );
});

describe('one record', () => {
  it('holds everything to replay the run and to check it', async () => {
    const { json } = await server.ask('GET', `/api/records/${closed.header.runId}`, { as: 'adeyemi' });
    validated(RecordDetail, json);
    expect(json.header).toEqual(closed.header);
    expect(json.events.map(canonicalJson)).toEqual(closed.events.map((event) => canonicalJson(event)));
    expect(json.chain).toEqual({ whole: true, events: closed.events.length });
    expect(json.countersigned).toEqual([expect.objectContaining({ branch: 'main', seq: closed.events.length })]);
    expect(json.tablets).toEqual([{ id: closed.events[0]!.device, label: 'B2' }]);
    expect(json).toMatchObject({ branches: [], discrepancies: [], refused: [], receivedAt: server.now.toISOString() });
    const compiled = compileProcedure(json.procedure.document);
    if (!compiled.ok) throw new Error('the document does not compile');
    const result = replay(compiled.procedure, json.header, json.events);
    expect(result).toMatchObject({ ok: true, state: { status: 'closed', finding: 'sensorOff' } });
  });

  it('says so when someone with the power to do it has changed an event, or a countersignature', async () => {
    const { runId } = opened.header;
    const { Client } = await import('pg');
    const owner = new Client({ connectionString: server.data.ownerUrl });
    await owner.connect();
    const chain = async () => (await server.ask('GET', `/api/records/${runId}`, { as: 'adeyemi' })).json.chain;
    expect(await chain()).toMatchObject({ whole: true });
    const change = `UPDATE run_event SET event = replace(event, 'Okafor', 'Nobody') WHERE run_id = $1`;
    await owner.query(change, [runId]);
    expect(await chain()).toEqual({ whole: false, events: 2, what: 'event 1 was changed after it was written' });
    await owner.query(change.replace(`'Okafor', 'Nobody'`, `'Nobody', 'Okafor'`), [runId]);
    expect(await chain()).toMatchObject({ whole: true });
    await owner.query('UPDATE countersignature SET at = at + 1 WHERE run_id = $1', [runId]);
    expect(await chain()).toMatchObject({ whole: false, what: 'event 2 is not what the server countersigned' });
    await owner.end();
  });

  it.each(['0197f3a0-0000-7000-8000-0000000000ff', 'nonsense'])('is not found: %s', async (id) => {
    expect(await server.ask('GET', `/api/records/${id}`, { as: 'adeyemi' })).toMatchObject({ status: 404 });
  });
});
