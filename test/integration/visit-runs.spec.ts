import { v7 as uuidv7 } from 'uuid';
import { RecordDetail } from '../../server/records/records.dto';
import { PullAnswer } from '../../server/sync/sync.dto';
import { validated } from '../../server/http/validated';
import { closedRun, continued, openedRun, publishSmallProcedure } from '../support/test-run';
import { TestServer } from '../support/test-server';
import { TestTablet } from '../support/test-tablet';

let server: TestServer;
let one: TestTablet;
let other: TestTablet;

beforeAll(async () => {
  server = await TestServer.start();
  one = await TestTablet.enrol(server, 'B1');
  other = await TestTablet.enrol(server, 'B2');
  await publishSmallProcedure(server);
});
afterAll(() => server.stop());

async function pull(since?: string): Promise<PullAnswer> {
  const query = since === undefined ? '' : `?since=${encodeURIComponent(since)}`;
  const answer = await server.ask('GET', `/api/sync/pull${query}`, { as: 'okafor' });
  expect(answer.status).toBe(200);
  validated(PullAnswer, answer.json);
  return answer.json as PullAnswer;
}

describe('the runs of all tablets, as each is told of them', () => {
  it('says who began which half of which visit, when, on which tablet, and how it stands', async () => {
    const { cursor } = await pull();
    const header = { visitId: uuidv7(), half: 'cold', pairId: uuidv7() } as const;
    const run = openedRun({ device: one.id }, header);
    await one.push({ runs: [run] });
    const { runs } = await pull(cursor);
    expect(runs).toEqual([
      {
        runId: run.header.runId,
        ...header,
        procedureId: 'small-check',
        procedureTitle: 'Small check',
        personName: 'I. Okafor',
        tabletLabel: 'B1',
        openedAt: run.events[0]!.at,
        status: 'open',
      },
    ]);
  });

  it('says so again when the state changes, and not for what changes nothing of it', async () => {
    const run = closedRun({ device: one.id });
    const begun = { header: run.header, events: run.events.slice(0, 3) };
    await one.push({ runs: [begun] });
    const first = await pull();
    await one.push({ runs: [{ ...run, events: run.events.slice(0, 5) }] });
    const second = await pull(first.cursor);
    expect(second).toMatchObject({ cursor: first.cursor, runs: [] });
    await one.push({ runs: [run] });
    expect((await pull(second.cursor)).runs).toEqual([
      expect.objectContaining({ runId: run.header.runId, status: 'closed', result: 'out' }),
    ]);
    const { cursor } = await pull();
    const setAside = continued(
      openedRun({ device: one.id }),
      { type: 'set-aside', data: { reason: 'phone' } },
      {
        device: one.id,
      },
    );
    await one.push({ runs: [setAside] });
    expect((await pull(cursor)).runs).toEqual([expect.objectContaining({ status: 'set-aside' })]);
  });

  it('gives the reason for which one was begun beside others', async () => {
    const visitId = uuidv7();
    const first = openedRun({ device: one.id }, { visitId });
    const again = { because: 'Repaired since', besides: [first.header.runId] };
    const second = openedRun({ device: other.id }, { visitId }, again);
    await one.push({ runs: [first] });
    await other.push({ runs: [second] });
    const { runs } = await pull();
    expect(runs.find(({ runId }) => runId === second.header.runId)).toMatchObject({ again, tabletLabel: 'B2' });
    expect(runs.find(({ runId }) => runId === first.header.runId)).not.toHaveProperty('again');
  });

  it('leaves out what came more than 30 days ago when everything is pulled', async () => {
    const run = openedRun({ device: one.id });
    await one.push({ runs: [run] });
    const told = async () => (await pull()).runs.some(({ runId }) => runId === run.header.runId);
    expect(await told()).toBe(true);
    const receive = `UPDATE run SET received_at = $2 WHERE run_id = $1`;
    const days = (count: number) => new Date(server.now.getTime() - count * 24 * 3_600_000);
    await server.database.query(receive, [run.header.runId, days(29)]);
    expect(await told()).toBe(true);
    await server.database.query(receive, [run.header.runId, days(31)]);
    expect(await told()).toBe(false);
  });
});

it('a record holds all runs of its half, and none of the other half or of another visit', async () => {
  const visitId = uuidv7();
  const cold = { visitId, half: 'cold', pairId: uuidv7() } as const;
  const first = openedRun({ device: one.id }, cold);
  const twin = openedRun({ device: other.id }, { ...cold, pairId: uuidv7() });
  const warm = openedRun({ device: one.id }, { ...cold, half: 'warm' });
  const elsewhere = openedRun({ device: one.id }, { ...cold, visitId: uuidv7() });
  await one.push({ runs: [first, warm, elsewhere] });
  await other.push({ runs: [twin] });
  const { json } = await server.ask('GET', `/api/records/${twin.header.runId}`, { as: 'lindqvist' });
  validated(RecordDetail, json);
  expect(json.sameHalf.map(({ runId, tabletLabel }: Record<string, string>) => [runId, tabletLabel])).toEqual([
    [first.header.runId, 'B1'],
    [twin.header.runId, 'B2'],
  ]);
});
