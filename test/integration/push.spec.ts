import { createHash } from 'node:crypto';
import { canonicalJson, type RunEvent } from '../../procedures/engine';
import {
  brandtId,
  closedRun,
  continued,
  lindqvistId,
  okaforId,
  openedRun,
  publishSmallProcedure,
} from '../support/test-run';
import { TestServer } from '../support/test-server';
import { TestTablet } from '../support/test-tablet';

let server: TestServer;
let tablet: TestTablet;

beforeAll(async () => {
  server = await TestServer.start();
  tablet = await TestTablet.enrol(server);
  await publishSmallProcedure(server);
});
afterAll(() => server.stop());

/** Everything of a run that is in the database, but for the columns that say when. */
async function stored(runId: string): Promise<unknown> {
  const of = (table: string, columns: string, order: string) =>
    server.database.query<unknown[]>(`SELECT ${columns} FROM ${table} WHERE run_id = $1 ORDER BY ${order}`, [runId]);
  return {
    run: await of('run', '*', 'run_id'),
    branches: await of('run_branch', '*', 'branch'),
    events: await of('run_event', '*', 'branch, seq'),
    countersigned: await of('countersignature', '*', 'branch, seq'),
    refused: await of('refused_event', '*', 'seq, hash'),
    attachments: await of('run_attachment', '*', 'sha256'),
    discrepancies: await of('discrepancy', '*', 'branch, seq, what'),
  };
}

async function storedEvents(runId: string, branch = 'main'): Promise<string[]> {
  const rows = await server.database.query<{ event: string }[]>(
    'SELECT event FROM run_event WHERE run_id = $1 AND branch = $2 ORDER BY seq',
    [runId, branch],
  );
  return rows.map(({ event }) => event);
}

describe('a push', () => {
  it('keeps a whole run, byte for byte, and countersigns its head', async () => {
    const run = closedRun({ device: tablet.id });
    const answer = await tablet.push({ runs: [run] });
    expect(answer.status).toBe(200);
    expect(answer.json.runs).toEqual([
      {
        runId: run.header.runId,
        acceptedThrough: run.events.length,
        missingAttachments: [],
        countersigned: expect.objectContaining({ seq: run.events.length, head: run.events.at(-1)!.hash }),
      },
    ]);
    expect(await storedEvents(run.header.runId)).toEqual(run.events.map((event) => canonicalJson(event)));
    const [row] = await server.database.query('SELECT * FROM run WHERE run_id = $1', [run.header.runId]);
    expect(row).toMatchObject({
      status: 'closed',
      repair_order: '4417',
      person_name: 'I. Okafor',
      finding: 'sensorOff',
      result: 'out',
      closed_at: String(run.events.at(-1)!.at),
    });
  });

  it('sent again changes nothing and is answered the same', async () => {
    const run = closedRun({ device: tablet.id });
    const first = await tablet.push({ runs: [run] });
    const before = await stored(run.header.runId);
    server.wait(5);
    const second = await tablet.push({ runs: [run] });
    expect(second.json).toEqual(first.json);
    expect(await stored(run.header.runId)).toEqual(before);
  });

  it('comes out the same however the events are cut into pushes', async () => {
    const whole = closedRun({ device: tablet.id });
    await tablet.push({ runs: [whole] });
    const other = closedRun({ device: tablet.id });
    for (const [from, to] of [
      [0, 1],
      [1, 4],
      [2, 9],
      [9, other.events.length],
    ] as const) {
      const answer = await tablet.push({ runs: [{ ...other, events: other.events.slice(from, to) }] });
      expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: to });
    }
    const project = async (runId: string) => {
      const [row] = await server.database.query<object[]>(
        `SELECT status, repair_order, car, vin, person_name, opened_at, closed_at, finding, verdict, result, searched
         FROM run WHERE run_id = $1`,
        [runId],
      );
      return row;
    };
    expect(await project(other.header.runId)).toEqual(await project(whole.header.runId));
    expect(await storedEvents(other.header.runId)).toEqual(other.events.map((event) => canonicalJson(event)));
  });

  it('refuses what comes after a gap and keeps nothing of it', async () => {
    const run = closedRun({ device: tablet.id });
    const answer = await tablet.push({ runs: [{ ...run, events: run.events.slice(3) }] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 0, problem: { code: 'gap', seq: 4 } });
    expect(await stored(run.header.runId)).toMatchObject({ run: [], events: [] });
  });

  it('keeps what came before a broken link and refuses from there on', async () => {
    const run = closedRun({ device: tablet.id });
    const events: RunEvent[] = structuredClone(run.events);
    (events[4] as { at: number }).at += 1;
    const answer = await tablet.push({ runs: [{ ...run, events }] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 4, problem: { code: 'broken-chain', seq: 5 } });
    expect(await storedEvents(run.header.runId)).toHaveLength(4);
  });

  it('notices an event that claims the hash of a kept one but says something else', async () => {
    const run = openedRun({ device: tablet.id });
    await tablet.push({ runs: [run] });
    const events: RunEvent[] = structuredClone(run.events);
    (events[1] as { at: number }).at += 1;
    const answer = await tablet.push({ runs: [{ ...run, events }] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 1, problem: { code: 'broken-chain', seq: 2 } });
  });

  it('refuses an event that has no place in the run', async () => {
    const run = openedRun({ device: tablet.id });
    const wrong = continued(run, { type: 'step-done', data: { step: 'no-such-step' } }, { device: tablet.id });
    const answer = await tablet.push({ runs: [wrong] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 2, problem: { code: 'structure', seq: 3 } });
  });

  it('refuses data that can not be read, without failing', async () => {
    const run = openedRun({ device: tablet.id });
    const wrong = continued(run, { type: 'reading-recorded', data: { step: 'start' } } as never, { device: tablet.id });
    const answer = await tablet.push({ runs: [wrong] });
    expect(answer.status).toBe(200);
    expect(answer.json.runs[0].acceptedThrough).toBe(2);
    expect(answer.json.runs[0].problem.status).toBe(422);
  });

  it.each([
    ['an unknown type', { type: 'levitated' }],
    ['a field that events do not have', { more: 1 }],
    ['no actor', { actor: undefined }],
    ['a seq that is no whole number', { seq: 2.5 }],
  ])('refuses an event with %s', async (_name, change) => {
    const run = openedRun({ device: tablet.id });
    const answer = await tablet.push({
      runs: [{ ...run, events: [run.events[0]!, { ...run.events[1]!, ...change }] }],
    });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 1, problem: { code: 'malformed' } });
  });

  it('refuses a practice run: practice stays on the tablet', async () => {
    const run = openedRun({ device: tablet.id }, { kind: 'practice' });
    const answer = await tablet.push({ runs: [run] });
    expect(answer.json.runs[0]).toMatchObject({
      acceptedThrough: 0,
      problem: { code: 'practice', title: 'Practice stays on the tablet' },
    });
    expect(await stored(run.header.runId)).toMatchObject({ run: [], events: [], refused: [] });
  });

  it('does no harm to the other runs and documents', async () => {
    const good = closedRun({ device: tablet.id });
    const practice = openedRun({ device: tablet.id }, { kind: 'practice' });
    const gap = closedRun({ device: tablet.id });
    const later = openedRun({ device: tablet.id });
    const answer = await tablet.push({
      runs: [practice, good, { ...gap, events: gap.events.slice(1) }, { header: { runId: 'x' }, events: [] }, later],
      documents: [{ kind: 'weather', document: { id: 'w' } }],
    });
    expect(answer.status).toBe(200);
    expect(answer.json.runs.map((run: { problem?: { code: string } }) => run.problem?.code)).toEqual([
      'practice',
      undefined,
      'gap',
      'invalid',
      undefined,
    ]);
    expect(answer.json.documents).toEqual([
      { kind: 'weather', id: 'w', problem: expect.objectContaining({ code: 'unknown-kind', status: 422 }) },
    ]);
    expect(await storedEvents(good.header.runId)).toHaveLength(good.events.length);
    expect(await storedEvents(later.header.runId)).toHaveLength(later.events.length);
  });

  it('refuses a version that is not here, and a header that became another', async () => {
    const other = openedRun({ device: tablet.id }, { version: 99 });
    const unknown = await tablet.push({ runs: [other] });
    expect(unknown.json.runs[0]).toMatchObject({ acceptedThrough: 0, problem: { code: 'unknown-procedure' } });
    const run = openedRun({ device: tablet.id });
    await tablet.push({ runs: [run] });
    const changed = openedRun({ device: tablet.id }, { ...run.header, half: 'cold' });
    const answer = await tablet.push({ runs: [changed] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 0, problem: { code: 'other-header', status: 409 } });
  });

  it('takes a value that it computes differently, and notes the difference with both builds', async () => {
    const run = closedRun({ device: tablet.id });
    const taken = run.events.findIndex((event) => event.type === 'branch-taken' && event.data.exit === 'next-0');
    const way = {
      step: 'manifold',
      to: 'dipstick',
      exit: 'otherwise',
      inputs: [],
      because: 'manifold pressure agrees',
    };
    const older = { device: tablet.id, build: 'older-app' };
    const other = continued(run, { type: 'branch-taken', data: way }, older, taken);
    const answer = await tablet.push({ runs: [other] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: taken + 1 });
    expect(answer.json.runs[0].problem).toBeUndefined();
    const { json } = await server.ask('GET', `/api/records/${run.header.runId}`, { as: 'lindqvist' });
    expect(json.discrepancies).toEqual([
      {
        seq: taken + 1,
        what: 'way on from step 3',
        recorded: 'otherwise',
        computed: 'next-0',
        recordedBy: 'older-app',
        computedBy: 'spec-core',
      },
    ]);
  });

  it('says which attachments it lacks until they are there', async () => {
    const run = openedRun({ device: tablet.id });
    const bytes = Buffer.from('a photo, for this test');
    const sha256 = createHash('sha256').update(bytes).digest('hex');
    const photo = { step: 'start', sha256, bytes: bytes.length, mediaType: 'image/jpeg' };
    const withPhoto = continued(run, { type: 'photo-attached', data: photo }, { device: tablet.id });
    const answer = await tablet.push({ runs: [withPhoto] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 3, missingAttachments: [sha256] });
    await server.ask('PUT', `/api/attachments/${sha256}`, { as: 'okafor', bytes });
    const again = await tablet.push({ runs: [withPhoto] });
    expect(again.json.runs[0].missingAttachments).toEqual([]);
  });
});

describe('rights in a push', () => {
  it('keeps what was done without the right as a refused event, and nothing after it', async () => {
    const run = openedRun({ device: tablet.id });
    const note = { type: 'margin-note-written', data: { step: 'start', text: 'Not mine to write.' } } as const;
    const wrong = continued(run, note, { device: tablet.id, actor: lindqvistId });
    const after = continued(wrong, note, { device: tablet.id });
    const answer = await tablet.push({ runs: [after] });
    expect(answer.json.runs[0]).toMatchObject({
      acceptedThrough: 2,
      problem: { code: 'not-allowed', status: 403, seq: 3 },
    });
    const { refused } = (await stored(run.header.runId)) as { refused: { event: string; reason: string }[] };
    expect(refused).toEqual([expect.objectContaining({ seq: 3, event: canonicalJson(wrong.events[2]) })]);
    expect(refused[0]!.reason).toMatch(/manager/);
  });

  it('refuses a real run by an apprentice, and an apprentice in the run of another', async () => {
    const own = openedRun({ device: tablet.id, actor: brandtId });
    const answer = await tablet.push({ runs: [own] }, { as: 'brandt' });
    const words = /apprentices practise only/;
    expect(answer.json.runs[0]).toMatchObject({
      acceptedThrough: 0,
      problem: { code: 'not-allowed', status: 403, seq: 1, detail: expect.stringMatching(words) },
    });
    expect(await stored(own.header.runId)).toMatchObject({ run: [], events: [] });
    const run = openedRun({ device: tablet.id });
    const note = { type: 'note-written', data: { step: 'start', text: 'Not mine to write.' } } as const;
    const others = await tablet.push({ runs: [continued(run, note, { device: tablet.id, actor: brandtId })] });
    expect(others.json.runs[0]).toMatchObject({ acceptedThrough: 2, problem: { code: 'not-allowed', seq: 3 } });
    expect(await storedEvents(run.header.runId)).toHaveLength(2);
  });

  it('refuses a person without an account, but takes a colleague along', async () => {
    const stranger = openedRun({ device: tablet.id, actor: '0197f3a0-0000-7000-8000-0000000000ff' });
    const answer = await tablet.push({ runs: [stranger] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 0, problem: { code: 'not-allowed', seq: 1 } });
    const okafors = openedRun({ device: tablet.id, actor: okaforId });
    const delivered = await tablet.push({ runs: [okafors] }, { as: 'lindqvist' });
    expect(delivered.json.runs[0]).toMatchObject({ acceptedThrough: 2 });
  });

  it('refuses an event that names a tablet which is not enrolled', async () => {
    const run = openedRun({ device: '0197f3a0-0000-7000-8000-0000000000fe' });
    const answer = await tablet.push({ runs: [run] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 0, problem: { code: 'not-allowed' } });
  });

  it('refuses a tablet that is not enrolled and a signature that is not its own, as a whole', async () => {
    const run = openedRun({ device: tablet.id });
    const unknown = await tablet.push({ runs: [run] }, { device: '0197f3a0-0000-7000-8000-0000000000fd' });
    expect(unknown).toMatchObject({ status: 403, json: { code: 'unknown-tablet' } });
    const body = Buffer.from(JSON.stringify({ device: tablet.id, runs: [run], documents: [] }));
    const other = await TestTablet.enrol(server, 'B3');
    for (const signature of [
      '',
      'AAAA',
      other.signature(body),
      tablet.signature(Buffer.concat([body, Buffer.from(' ')])),
    ]) {
      const answer = await tablet.pushBytes(body, signature);
      expect(answer).toMatchObject({ status: 403, json: { code: 'wrong-signature' } });
    }
    expect(await stored(run.header.runId)).toMatchObject({ run: [] });
  });
});
