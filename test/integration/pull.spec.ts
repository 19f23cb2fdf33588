import { Client } from 'pg';
import { createDataSource } from '../../server/database/data-source';
import { beginEpoch } from '../../server/database/after-restore';
import { noteChange } from '../../server/database/change-log';
import { contentHash } from '../../procedures/engine';
import { okaforId, publishSmallProcedure, smallProcedure } from '../support/test-run';
import { TestServer } from '../support/test-server';
import { TestTablet } from '../support/test-tablet';
import { demoSites } from '../../server/database/demo/demo-garage';

let server: TestServer;
let tablet: TestTablet;

beforeAll(async () => {
  server = await TestServer.start();
  tablet = await TestTablet.enrol(server);
});
afterAll(() => server.stop());

async function pull(since?: string) {
  const query = since === undefined ? '' : `?since=${encodeURIComponent(since)}`;
  const answer = await server.ask('GET', `/api/sync/pull${query}`, { as: 'okafor' });
  expect(answer.status).toBe(200);
  return answer.json;
}

const visit = {
  id: '0197f3a0-0000-7000-8000-0000000003aa',
  siteId: demoSites[0]!.id,
  vin: '1ZZBT4CK4LR204817',
  repairOrder: '4420',
  odometer: { text: '84210', unit: 'km' },
  concern: 'Hesitates.\nUnder load.',
  codes: ['P0068'],
  car: { make: 'Merrow', model: 'Wren', displacementL: '1.6' },
  openedBy: okaforId,
  openedAt: 1_790_000_000_000,
  changedAt: 1_790_000_000_000,
};

const empty = { procedures: [], sites: [], gear: [], people: [], visits: [], runs: [], notices: [] };

describe('a pull', () => {
  it('gives the whole garage without a cursor', async () => {
    const all = await pull();
    expect(all.sites).toEqual([
      { id: demoSites[0]!.id, name: 'Ossenholt', elevationM: 640 },
      { id: demoSites[1]!.id, name: 'Ossenholt Quay', elevationM: 3 },
    ]);
    expect(
      all.people.map((person: { displayName: string; role: string }) => `${person.displayName}, ${person.role}`),
    ).toEqual(['R. Adeyemi, lead', 'T. Brandt, apprentice', 'M. Lindqvist, manager', 'I. Okafor, technician']);
    expect(all.gear.map(({ label }: { label: string }) => label)).toEqual([
      'B-1',
      'G-12',
      'G-3',
      'G-7',
      'L-2',
      'S-3',
      'T-4',
      'B-2',
      'G-21',
      'S-5',
    ]);
    expect(all.gear.find(({ label }: { label: string }) => label === 'G-3')).toMatchObject({
      dueOn: '2026-10-13',
      lastCheckedOn: '2025-10-13',
      inUse: true,
    });
    expect(all.visits).toEqual([expect.objectContaining({ repairOrder: '4417', vin: '1ZZBT4CK4LR204817' })]);
  });

  it('gives nothing when nothing has changed', async () => {
    const { cursor } = await pull();
    expect(await pull(cursor)).toEqual({ cursor, ...empty });
  });

  it('gives a published version, and later that it is withdrawn', async () => {
    const before = await pull();
    const version = await publishSmallProcedure(server);
    const after = await pull(before.cursor);
    expect(after).toEqual({ ...empty, cursor: expect.any(String), procedures: [expect.anything()] });
    expect(after.procedures[0]).toEqual({
      id: 'small-check',
      version,
      status: 'published',
      contentHash: contentHash(smallProcedure),
      publishedAt: server.now.toISOString(),
      publishedBy: 'R. Adeyemi',
      document: smallProcedure,
    });
    const path = `/api/procedures/small-check/versions/${version}/withdrawal`;
    await server.ask('POST', path, { as: 'adeyemi', json: { reason: 'A band was wrong.' } });
    const last = await pull(after.cursor);
    expect(last.procedures).toEqual([expect.objectContaining({ id: 'small-check', version, status: 'withdrawn' })]);
  });

  it('gives a visit that a tablet sent, as it was sent', async () => {
    const { cursor } = await pull();
    const answer = await tablet.push({ documents: [{ kind: 'visit', document: visit }] });
    expect(answer.json.documents).toEqual([{ kind: 'visit', id: visit.id }]);
    expect((await pull(cursor)).visits).toEqual([visit]);
  });

  it('lets the later change of a visit stand, whatever order they come in, and keeps the loser', async () => {
    const later = { ...visit, concern: 'later', changedAt: visit.changedAt + 20 };
    const earlier = { ...visit, concern: 'earlier', changedAt: visit.changedAt + 10 };
    await tablet.push({ documents: [{ kind: 'visit', document: later }] });
    const { cursor } = await pull();
    await tablet.push({ documents: [{ kind: 'visit', document: earlier }] });
    expect(await pull(cursor)).toEqual({ cursor, ...empty });
    const all = await pull();
    expect(all.visits.find(({ id }: { id: string }) => id === visit.id)).toEqual(later);
    const kept = await server.database.query<{ document: string }[]>(
      'SELECT document FROM visit_revision WHERE visit_id = $1 ORDER BY changed_at',
      [visit.id],
    );
    expect(kept.map(({ document }) => (JSON.parse(document) as { concern: string }).concern)).toEqual([
      visit.concern,
      'earlier',
      'later',
    ]);
  });

  it('refuses a visit that is none, naming the fields', async () => {
    const answer = await tablet.push({
      documents: [{ kind: 'visit', document: { ...visit, vin: 'lower case', mood: 'sad' } }],
    });
    const { problem } = answer.json.documents[0];
    expect(problem).toMatchObject({ code: 'invalid', status: 422 });
    expect(problem.detail).toMatch(/\/mood: .*\/vin: /);
  });

  it('refuses a cursor that is none', async () => {
    const answer = await server.ask('GET', '/api/sync/pull?since=yesterday', { as: 'okafor' });
    expect(answer).toMatchObject({ status: 400, json: { code: 'invalid-query', errors: [{ pointer: '/since' }] } });
  });

  it('gives everything again in a new epoch, and for a position that was never given', async () => {
    const { cursor } = await pull();
    const [epoch] = cursor.split('.');
    expect((await pull(`${epoch}.999999`)).sites).toHaveLength(2);
    const owner = await createDataSource(server.data.ownerUrl).initialize();
    await beginEpoch(owner, server.now);
    await owner.destroy();
    const again = await pull(cursor);
    expect(again.sites).toHaveLength(2);
    expect(again.people).toHaveLength(4);
    expect(again.cursor.split('.')[0]).not.toBe(epoch);
  });

  it('never runs past a change that commits later: the later position waits', async () => {
    const slow = server.database.createQueryRunner();
    const fast = server.database.createQueryRunner();
    await slow.startTransaction();
    await noteChange(slow.manager, 'site', demoSites[0]!.id);
    await fast.startTransaction();
    const waiting = noteChange(fast.manager, 'site', demoSites[1]!.id);
    const seen = await Promise.race([waiting.then(() => 'went on'), waits(300).then(() => 'waits')]);
    expect(seen).toBe('waits');
    const { cursor } = await pull();
    await slow.commitTransaction();
    await waiting;
    const between = await pull(cursor);
    expect(between.sites.map(({ id }: { id: string }) => id)).toEqual([demoSites[0]!.id]);
    await fast.commitTransaction();
    const last = await pull(between.cursor);
    expect(last.sites.map(({ id }: { id: string }) => id)).toEqual([demoSites[1]!.id]);
    await slow.release();
    await fast.release();
  });

  it('is not held up by a transaction that stays open elsewhere', async () => {
    const idle = new Client({ connectionString: server.data.superUrl });
    await idle.connect();
    await idle.query('BEGIN');
    await idle.query('CREATE TABLE held_open (id integer)');
    const { cursor } = await pull();
    await tablet.push({ documents: [{ kind: 'visit', document: { ...visit, changedAt: visit.changedAt + 30 } }] });
    expect((await pull(cursor)).visits).toHaveLength(1);
    await idle.query('ROLLBACK');
    await idle.end();
  });
});

function waits(milliseconds: number): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, milliseconds));
}
