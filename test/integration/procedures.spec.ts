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
    contentHash: contentHash(smallProcedure),
    procedureId: 'small-check',
    importedAt: server.now.toISOString(),
    importedBy: 'R. Adeyemi',
    problems: [],
    document: smallProcedure,
  });
  await publish(json.id);
  expect((await read()).status).toBe(404);
});

it('changes nothing for a document that says the same as the version that stands, until it is withdrawn', async () => {
  await publishSmallProcedure(server);
  const before = await summary();
  expect(await importDraft(smallProcedure)).toMatchObject({
    status: 409,
    json: { detail: 'Version 1 says exactly the same: nothing was changed.' },
  });
  expect(await summary()).toEqual(before);
  expect((await withdraw(1)).status).toBe(201);
  const again = await importDraft(smallProcedure);
  expect((await publish(again.json.id)).json).toMatchObject({ version: 2 });
});

it('takes an earlier version back as a draft: what stands is another', async () => {
  await publishSmallProcedure(server);
  await publish((await importDraft({ ...smallProcedure, title: 'Another' })).json.id);
  expect((await publish((await importDraft(smallProcedure)).json.id)).json).toMatchObject({ version: 3 });
});

it('changes nothing for a document that says the same as the draft that waits, however its fields are ordered', async () => {
  const { json } = await importDraft(smallProcedure);
  const turned = Object.fromEntries(Object.entries(smallProcedure).reverse());
  expect(await importDraft(turned)).toMatchObject({
    status: 409,
    json: { detail: 'The draft that waits says exactly the same: nothing was changed.' },
  });
  expect(await summary()).toMatchObject({ draft: { id: json.id, contentHash: contentHash(smallProcedure) } });
});

it('heads a procedure by the newest published version, else by the draft, else by the newest withdrawn one', async () => {
  const title = async () => (await summary()).title;
  await publishSmallProcedure(server);
  await publish((await importDraft({ ...smallProcedure, title: 'Second' })).json.id);
  await importDraft({ ...smallProcedure, title: 'Draft' });
  expect(await title()).toBe('Second');
  await withdraw(2);
  expect(await title()).toBe(smallProcedure.title);
  await withdraw(1);
  expect(await title()).toBe('Draft');
  await server.database.query('DELETE FROM procedure_draft WHERE published_version IS NULL');
  expect(await title()).toBe('Second');
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
  const withdrawal = { reason: 'A band was wrong.', by: 'R. Adeyemi', at: server.now.toISOString() };
  expect(await summary()).toMatchObject({ versions: [{ version: 1, status: 'withdrawn', withdrawal }] });
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
