import { canonicalJson, verifyChain } from '../../procedures/engine';
import { CompiledProcedures } from '../../server/procedures/procedures.service';
import { rebuildRuns } from '../../server/sync/sync.service';
import { closedRun, continued, openedRun, publishSmallProcedure, type SentRun } from '../support/test-run';
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

const note = (text: string) => ({ type: 'note-written', data: { step: 'start', text } }) as const;

/** The record as the server gives it. */
async function record(runId: string) {
  const answer = await server.ask('GET', `/api/records/${runId}`, { as: 'lindqvist' });
  expect(answer.status).toBe(200);
  return answer.json;
}

/** A run of which two tablets wrote different tails from event 3 on. */
function twoTails(): [SentRun, SentRun] {
  const begun = openedRun({ device: one.id });
  const here = continued(begun, note('here'), { device: one.id });
  const there = continued(continued(begun, note('there'), { device: other.id }), note('and on'), { device: other.id });
  return [here, there];
}

describe('a fork', () => {
  it('keeps both tails byte for byte and tells the second tablet', async () => {
    const [here, there] = twoTails();
    await one.push({ runs: [here] });
    const answer = await other.push({ runs: [there] });
    expect(answer.json.runs[0]).toMatchObject({
      acceptedThrough: 4,
      problem: { code: 'fork', seq: 3 },
      countersigned: { seq: 4, head: there.events[3]!.hash, branch: there.events[2]!.hash },
    });
    const kept = await record(here.header.runId);
    expect(kept.events.map(canonicalJson)).toEqual(here.events.map((event) => canonicalJson(event)));
    expect(kept.branches).toEqual([
      { branch: there.events[2]!.hash, parent: 'main', fromSeq: 3, events: there.events.slice(2) },
    ]);
    expect(kept.chain).toEqual({ whole: true, events: 3 });
    expect(verifyChain(here.header, [...here.events.slice(0, 2), ...kept.branches[0].events])).toMatchObject({
      ok: true,
    });
  });

  it('is the same fork when it is sent again', async () => {
    const [here, there] = twoTails();
    await one.push({ runs: [here] });
    const first = await other.push({ runs: [there] });
    const before = await record(here.header.runId);
    const second = await other.push({ runs: [there] });
    expect(second.json).toEqual(first.json);
    expect(await record(here.header.runId)).toEqual(before);
  });

  it('goes on along its own tail, also when only the new events are sent', async () => {
    const [here, there] = twoTails();
    await one.push({ runs: [here] });
    await other.push({ runs: [there] });
    const further = continued(there, note('further'), { device: other.id });
    const answer = await other.push({ runs: [{ ...further, events: further.events.slice(4) }] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 5, problem: { code: 'fork', seq: 3 } });
    const nearer = continued(here, note('nearer'), { device: one.id });
    const main = await one.push({ runs: [nearer] });
    expect(main.json.runs[0].problem).toBeUndefined();
    const kept = await record(here.header.runId);
    expect(kept.events).toHaveLength(4);
    expect(kept.branches[0].events).toHaveLength(3);
  });

  it('can fork again, and from the very first event', async () => {
    const [here, there] = twoTails();
    await one.push({ runs: [here] });
    await other.push({ runs: [there] });
    const third = continued(there, note('a third way'), { device: other.id }, 3);
    const again = await other.push({ runs: [third] });
    expect(again.json.runs[0]).toMatchObject({ acceptedThrough: 4, problem: { code: 'fork', seq: 4 } });
    const reopened = openedRun({ device: other.id }, here.header);
    const fromOne = await other.push({ runs: [reopened] });
    expect(fromOne.json.runs[0]).toMatchObject({ acceptedThrough: 2, problem: { code: 'fork', seq: 1 } });
    const kept = await record(here.header.runId);
    expect(kept.branches.map(({ fromSeq }: { fromSeq: number }) => fromSeq)).toEqual([1, 3, 4]);
    expect(kept.chain.whole).toBe(true);
  });

  it('leaves the list of records to the first tail', async () => {
    const begun = openedRun({ device: one.id });
    await one.push({ runs: [continued(begun, note('here'), { device: one.id })] });
    const whole = closedRun({ device: other.id }, begun.header);
    await other.push({ runs: [whole] });
    const [row] = await server.database.query('SELECT status, finding FROM run WHERE run_id = $1', [
      begun.header.runId,
    ]);
    expect(row).toEqual({ status: 'open', finding: null });
  });
});

describe('rebuilding the projections', () => {
  it('gives the rows that the pushes gave', async () => {
    const rows = async () => ({
      runs: await server.database.query('SELECT * FROM run ORDER BY run_id'),
      branches: await server.database
        .query(`SELECT run_id, branch, parent, from_seq, head_seq, head, state::jsonb AS state, state_build
         FROM run_branch ORDER BY run_id, branch`),
    });
    await one.push({ runs: [closedRun({ device: one.id })] });
    const before = await rows();
    await server.database.query(
      `UPDATE run SET status = 'open', verdict = NULL, closed_at = NULL, finding = 'lost', searched = ''`,
    );
    await server.database.query(`UPDATE run_branch SET state = '{}', state_build = 'older'`);
    expect(await rebuildRuns(server.database, new CompiledProcedures(), 'spec-core')).toBe(before.runs.length);
    expect(await rows()).toEqual(before);
  });

  it('is not needed after an upgrade: a state of another build is not trusted', async () => {
    const begun = openedRun({ device: one.id });
    await one.push({ runs: [begun] });
    await server.database.query(`UPDATE run_branch SET state = '{}', state_build = 'older' WHERE run_id = $1`, [
      begun.header.runId,
    ]);
    const answer = await one.push({ runs: [continued(begun, note('on'), { device: one.id })] });
    expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: 3 });
    expect(answer.json.runs[0].problem).toBeUndefined();
  });
});
