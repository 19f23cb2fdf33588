import fc from 'fast-check';
import { canonicalJson } from '../../procedures/engine';
import { closedRun, continued, publishSmallProcedure, type SentRun } from '../support/test-run';
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

/** What of a run must not depend on how it was delivered. */
async function kept(runId: string): Promise<unknown> {
  const { json } = await server.ask('GET', `/api/records/${runId}`, { as: 'lindqvist' });
  const { events, branches, chain, refused } = json;
  return { events: events.map(canonicalJson), branches, chain, refused };
}

/** Everything that is stored of a run, to the last column. */
async function everything(runId: string): Promise<unknown> {
  const tables = [
    'run',
    'run_branch',
    'run_event',
    'countersignature',
    'refused_event',
    'run_attachment',
    'discrepancy',
  ];
  const rows: unknown[] = [];
  for (const table of tables)
    rows.push(await server.database.query(`SELECT t::text FROM ${table} t WHERE run_id = $1 ORDER BY 1`, [runId]));
  return rows;
}

const note = (text: string) => ({ type: 'note-written', data: { step: 'start', text } }) as const;

/** A piece of a run (with one of two tails) that is pushed once or more: an answer may get lost. */
const piece = fc.record({
  tail: fc.boolean(),
  from: fc.nat(8),
  length: fc.integer({ min: 1, max: 8 }),
  times: fc.integer({ min: 1, max: 2 }),
});

it('the same push twice, at any time, is the same state', async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(piece, { minLength: 1, maxLength: 6 }), async (pieces) => {
      const whole = closedRun({ device: tablet.id });
      const tails: readonly [SentRun, SentRun] = [
        whole,
        continued(whole, note('another tail'), { device: tablet.id }, 5),
      ];
      for (const { tail, from, length, times } of pieces) {
        const run = tails[tail ? 1 : 0];
        const events = run.events.slice(from, from + length);
        if (events.length === 0) continue;
        const first = await tablet.push({ runs: [{ header: run.header, events }] });
        const after = await everything(run.header.runId);
        for (let again = 0; again < times; again += 1) {
          const repeated = await tablet.push({ runs: [{ header: run.header, events }] });
          expect(repeated.json).toEqual(first.json);
        }
        expect(await everything(run.header.runId)).toEqual(after);
      }
    }),
    { numRuns: 25 },
  );
});

it('whatever was lost or doubled on the way, delivering all of it in the end keeps all of it', async () => {
  await fc.assert(
    fc.asyncProperty(fc.array(piece, { maxLength: 6 }), async (pieces) => {
      const whole = closedRun({ device: tablet.id });
      const fork = continued(whole, note('another tail'), { device: tablet.id }, 5);
      const tails: readonly [SentRun, SentRun] = [whole, fork];
      // The whole run's sixth event first, so that it is the one on the main branch.
      await tablet.push({ runs: [{ ...whole, events: whole.events.slice(0, 6) }] });
      for (const { tail, from, length } of pieces) {
        const run = tails[tail ? 1 : 0];
        const events = run.events.slice(from, from + length);
        if (events.length > 0) await tablet.push({ runs: [{ header: run.header, events }] });
      }
      await tablet.push({ runs: [fork, whole] });
      expect(await kept(whole.header.runId)).toEqual({
        events: whole.events.map((event) => canonicalJson(event)),
        branches: [
          {
            branch: fork.events[5]!.hash,
            parent: 'main',
            fromSeq: 6,
            events: [JSON.parse(canonicalJson(fork.events[5]))],
          },
        ],
        chain: { whole: true, events: whole.events.length },
        refused: [],
      });
    }),
    { numRuns: 15 },
  );
});

it('two tablets that push the same at the same time keep it once', async () => {
  for (let round = 0; round < 5; round += 1) {
    const run = closedRun({ device: tablet.id });
    const answers = await Promise.all(Array.from({ length: 6 }, () => tablet.push({ runs: [run] })));
    for (const answer of answers) {
      expect(answer.json.runs[0]).toMatchObject({ acceptedThrough: run.events.length });
      expect(answer.json.runs[0].problem).toBeUndefined();
    }
    expect(await kept(run.header.runId)).toMatchObject({
      branches: [],
      chain: { whole: true, events: run.events.length },
    });
  }
});
