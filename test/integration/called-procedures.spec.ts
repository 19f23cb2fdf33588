import { compileProcedure, libraryOf } from '../../procedures/document';
import { plugHold } from '../../procedures/document/testing/plug-hold';
import { walkRound } from '../../procedures/document/testing/walk-round';
import { contentHash, replay } from '../../procedures/engine';
import { CompiledProcedures } from '../../server/procedures/procedures.service';
import { RecordDetail } from '../../server/records/records.dto';
import { validated } from '../../server/http/validated';
import { rebuildRuns } from '../../server/sync/rebuild-runs';
import { publishDocument } from '../support/publish-document';
import { adeyemiId, brandtId, continued, lindqvistId, okaforId } from '../support/test-run';
import { TestServer } from '../support/test-server';
import { TestTablet } from '../support/test-tablet';
import { sentRound } from '../support/walk-round-run';

let server: TestServer;
beforeEach(async () => {
  server = await TestServer.start();
});
afterEach(() => server.stop());

const importDraft = (document: object) =>
  server.ask('POST', '/api/procedures/drafts', { as: 'adeyemi', json: document });
const publish = (id: string) =>
  server.ask('POST', `/api/procedures/drafts/${id}/publication`, { as: 'adeyemi', json: {} });
const withdraw = (id: string, version: number) =>
  server.ask('POST', `/api/procedures/${id}/versions/${version}/withdrawal`, {
    as: 'adeyemi',
    json: { reason: 'A band was wrong.' },
  });
const details = (problems: readonly { readonly detail: string }[]) => problems.map(({ detail }) => detail).join('\n');

describe('publishing a procedure that calls another', () => {
  it('is refused while what it calls is not published, and says what to do', async () => {
    const draft = await importDraft(walkRound);
    expect(draft.status).toBe(201);
    const refused = await publish(draft.json.id);
    expect(refused).toMatchObject({ status: 422, json: { code: 'invalid' } });
    const words = 'Step 4: calls plug-hold, version 1, which is not published. Publish it first.';
    expect(details(draft.json.problems)).toContain(words);
    expect(details(refused.json.errors)).toContain(words);
    await publishDocument(server, plugHold);
    const { json } = await server.ask('GET', `/api/procedures/drafts/${draft.json.id}`, { as: 'adeyemi' });
    expect(json.problems).toEqual([]);
    expect(await publish(draft.json.id)).toMatchObject({
      status: 201,
      json: { version: 1, contentHash: contentHash(walkRound) },
    });
  });

  it('is refused when what it calls was withdrawn, also in the list of what waits', async () => {
    await publishDocument(server, plugHold);
    await withdraw(plugHold.id, 1);
    const draft = await importDraft(walkRound);
    const refused = await publish(draft.json.id);
    expect(refused.status).toBe(422);
    const words = 'calls plug-hold, version 1, which was withdrawn. Call a standing version.';
    expect(details(refused.json.errors)).toContain(words);
    const { json } = await server.ask('GET', '/api/procedures', { as: 'adeyemi' });
    const waiting = json.find(({ id }: { id: string }) => id === walkRound.id);
    expect(details(waiting.draft.problems)).toContain(words);
  });
});

describe('a run through a called procedure', () => {
  it('is taken in, kept in the record with what it calls, and rebuilt, also after that was withdrawn', async () => {
    const tablet = await TestTablet.enrol(server);
    await publishDocument(server, plugHold);
    await publishDocument(server, walkRound);
    const run = sentRound('show', { device: tablet.id });
    await withdraw(plugHold.id, 1);
    const pushed = await tablet.push({ runs: [run] });
    expect(pushed.json.runs).toMatchObject([{ acceptedThrough: run.events.length }]);
    expect(pushed.json.runs[0].problem).toBeUndefined();

    const { json: pulled } = await server.ask('GET', '/api/sync/pull', { as: 'okafor' });
    expect(pulled.procedures).toContainEqual(
      expect.objectContaining({ id: 'plug-hold', version: 1, status: 'withdrawn' }),
    );

    const { json: record } = await server.ask('GET', `/api/records/${run.header.runId}`, { as: 'lindqvist' });
    validated(RecordDetail, record);
    expect(record.called).toMatchObject([{ id: 'plug-hold', version: 1, status: 'withdrawn', document: plugHold }]);
    const compiled = compileProcedure(record.procedure.document, libraryOf(record.called));
    if (!compiled.ok) throw new Error(JSON.stringify(compiled.problems));
    const told = replay(compiled.procedure, record.header, record.events);
    expect(told).toMatchObject({
      ok: true,
      state: { current: { id: 'show' }, values: { plugThere: { text: '4.2' } } },
    });

    expect(await rebuildRuns(server.database, new CompiledProcedures(), 'spec-core')).toBe(1);
  });

  it('is refused when it goes through the call as if that were one step', async () => {
    const tablet = await TestTablet.enrol(server);
    await publishDocument(server, plugHold);
    await publishDocument(server, walkRound);
    const run = sentRound('show', { device: tablet.id });
    const claim = run.events.findIndex(
      ({ type, data }) => type === 'step-claimed' && 'step' in data && data.step === 'plug-test-start',
    );
    expect(claim).toBeGreaterThan(0);
    const cut = { header: run.header, events: run.events.slice(0, claim) };
    const skipped = continued(cut, { type: 'step-claimed', data: { step: 'plug-test' } }, { device: tablet.id });
    const pushed = await tablet.push({ runs: [skipped] });
    expect(pushed.json.runs).toMatchObject([{ acceptedThrough: claim, problem: { code: 'structure' } }]);
  });
});

describe('a release point', () => {
  const release = (by: 'lead' | 'manager') =>
    ({ type: 'released', data: { step: 'show', evidence: 'Seen.', by } }) as const;

  it.each([
    ['the lead', 'lead', adeyemiId, true],
    ['the manager', 'manager', lindqvistId, true],
    ['a technician', 'lead', okaforId, false],
    ['a lead as if they were the manager', 'manager', adeyemiId, false],
  ] as const)('is released by %s, or not', async (_who, by, actor, isTaken) => {
    const tablet = await TestTablet.enrol(server);
    await publishDocument(server, plugHold);
    await publishDocument(server, walkRound);
    const run = sentRound('show', { device: tablet.id });
    const looked = continued(run, { type: 'verified', data: { step: 'show', by: brandtId } }, { device: tablet.id });
    const released = continued(looked, release(by), { device: tablet.id, actor });
    const pushed = await tablet.push({ runs: [released] });
    const accepted = released.events.length - (isTaken ? 0 : 1);
    expect(pushed.json.runs).toMatchObject([{ acceptedThrough: accepted }]);
    expect(pushed.json.runs[0].problem?.code).toBe(isTaken ? undefined : 'not-allowed');
  });
});
