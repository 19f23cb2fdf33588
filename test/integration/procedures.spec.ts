import { contentHash } from '../../procedures/engine';
import { ProcedureSummary } from '../../server/procedures/procedures.dto';
import { validated } from '../../server/http/validated';
import { publishSmallProcedure, smallProcedure } from '../support/test-run';
import { TestServer, type Answered } from '../support/test-server';

let server: TestServer;
beforeEach(async () => {
  server = await TestServer.start();
});
afterEach(() => server.stop());

const importDraft = (document: object): Promise<Answered> =>
  server.ask('POST', '/api/procedures/drafts', { as: 'adeyemi', json: document });
const publish = (id: string): Promise<Answered> =>
  server.ask('POST', `/api/procedures/drafts/${id}/publication`, { as: 'adeyemi', json: {} });
const withdraw = (version: number, reason: unknown = 'A band was wrong.'): Promise<Answered> =>
  server.ask('POST', `/api/procedures/small-check/versions/${version}/withdrawal`, { as: 'adeyemi', json: { reason } });

async function summary() {
  const { json } = await server.ask('GET', '/api/procedures', { as: 'brandt' });
  for (const procedure of json) validated(ProcedureSummary, procedure);
  return json.find(({ id }: { id: string }) => id === 'small-check');
}

it('lists what the demo begins with', async () => {
  const { json } = await server.ask('GET', '/api/procedures', { as: 'okafor' });
  const valve = json.find(({ id }: { id: string }) => id === 'crankcase-valve-seal');
  expect(valve.versions).toEqual([
    expect.objectContaining({ version: 1, status: 'published', publishedBy: 'R. Adeyemi' }),
  ]);
});

it('keeps a document as a draft, publishes it once, then as a further version', async () => {
  const draft = await importDraft(smallProcedure);
  expect(draft).toMatchObject({ status: 201, json: { procedureId: 'small-check', problems: [] } });
  expect(await summary()).toMatchObject({
    versions: [],
    draft: { id: draft.json.id, title: smallProcedure.title, importedBy: 'R. Adeyemi' },
  });
  const published = await publish(draft.json.id);
  expect(published.status).toBe(201);
  expect(published.json).toEqual({
    id: 'small-check',
    version: 1,
    status: 'published',
    publishedAt: server.now.toISOString(),
    publishedBy: 'R. Adeyemi',
    contentHash: contentHash(smallProcedure),
  });
  expect(await publish(draft.json.id)).toMatchObject({ status: 409, json: { code: 'conflict' } });
  const changed = { ...smallProcedure, title: 'Small check, better' };
  const second = await publish((await importDraft(changed)).json.id);
  expect(second.json).toMatchObject({ version: 2, contentHash: contentHash(changed) });
  const listed = await summary();
  expect(listed).toMatchObject({ title: 'Small check, better', versions: [{ version: 2 }, { version: 1 }] });
  expect(listed.draft).toBeUndefined();
});

it('gives the lead a draft to read, until it is published', async () => {
  const { json } = await importDraft(smallProcedure);
  const read = () => server.ask('GET', `/api/procedures/drafts/${json.id}`, { as: 'adeyemi' });
  expect((await read()).json).toEqual({
    id: json.id,
    title: smallProcedure.title,
    procedureId: 'small-check',
    importedAt: server.now.toISOString(),
    importedBy: 'R. Adeyemi',
    problems: [],
    document: smallProcedure,
  });
  await publish(json.id);
  expect((await read()).status).toBe(404);
});

it('does not publish the very same once more, unless it was withdrawn', async () => {
  await publishSmallProcedure(server);
  const same = await importDraft(smallProcedure);
  expect(await publish(same.json.id)).toMatchObject({
    status: 409,
    json: { detail: 'Version 1 says exactly the same.' },
  });
  expect((await withdraw(1)).status).toBe(201);
  expect((await publish(same.json.id)).json).toMatchObject({ version: 2 });
});

it('puts a new draft in the place of the one that waits', async () => {
  const first = await importDraft(smallProcedure);
  const second = await importDraft({ ...smallProcedure, title: 'Again' });
  expect((await publish(first.json.id)).status).toBe(404);
  expect((await publish(second.json.id)).status).toBe(201);
});

it('gives two publications at once two versions', async () => {
  const first = await importDraft(smallProcedure);
  const published = publish(first.json.id);
  const again = publish(first.json.id);
  const statuses = (await Promise.all([published, again])).map(({ status }) => status);
  expect(statuses.sort()).toEqual([201, 409]);
});

it('withdraws a version once, with a reason', async () => {
  await publishSmallProcedure(server);
  expect((await withdraw(1, '')).status).toBe(422);
  expect((await withdraw(2)).status).toBe(404);
  expect((await withdraw(1)).status).toBe(201);
  expect((await withdraw(1)).status).toBe(409);
  expect(await summary()).toMatchObject({ versions: [{ version: 1, status: 'withdrawn' }] });
});

it('refuses a document that can not run, naming step and place, and keeps nothing', async () => {
  const steps = smallProcedure.steps.map((step) =>
    step.id === 'manifold'
      ? { ...step, next: [{ when: 'manifoldPressure > 3 furlong', to: 'restore', because: 'x' }] }
      : step,
  );
  const answer = await importDraft({ ...smallProcedure, steps });
  expect(answer).toMatchObject({ status: 422, json: { code: 'invalid' } });
  expect(answer.headers.get('content-type')).toMatch(/^application\/problem\+json/);
  expect(JSON.stringify(answer.json.errors)).toMatch(/manifold/);
  expect(await summary()).toBeUndefined();
});

it.each([
  ['an object of another kind', { id: 3 }],
  ['nothing', {}],
  ['a step that is no object', { ...smallProcedure, steps: [null] }],
])('refuses %s', async (_name, document) => {
  expect((await importDraft(document)).status).toBe(422);
});

it('takes no document of more than 2 MB', async () => {
  const answer = await importDraft({ ...smallProcedure, purpose: 'x'.repeat(2 * 1024 * 1024) });
  expect(answer).toMatchObject({ status: 413, json: { code: 'too-large' } });
});
