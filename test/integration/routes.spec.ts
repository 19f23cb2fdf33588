import { randomUUID } from 'node:crypto';
import { everyRole, type Role } from '../../server/http/route';
import { TestServer, type DemoName } from '../support/test-server';

const names: Readonly<Record<Role, DemoName>> = {
  technician: 'okafor',
  lead: 'adeyemi',
  apprentice: 'brandt',
  manager: 'lindqvist',
};

const all: readonly Role[] = ['technician', 'lead', 'apprentice', 'manager'];

/** Who may do what, written down a second time: the table of the server is held against it. */
const allowed: Readonly<Record<string, readonly Role[] | 'anyone'>> = {
  'get /healthz': 'anyone',
  'get /readyz': 'anyone',
  'get /api/openapi.json': 'anyone',
  'post /api/session': 'anyone',
  'post /api/session/refresh': 'anyone',
  'delete /api/session': 'anyone',
  'post /api/tablets': ['lead', 'manager'],
  'post /api/sync/push': all,
  'get /api/sync/pull': all,
  'put /api/attachments/:sha256': all,
  'get /api/attachments/:sha256': all,
  'get /api/procedures': all,
  'post /api/procedures/drafts': ['lead'],
  'get /api/procedures/drafts/:id': ['lead'],
  'post /api/procedures/drafts/:id/publication': ['lead'],
  'post /api/procedures/:id/versions/:version/withdrawal': ['lead'],
  'get /api/records': ['lead', 'manager'],
  'get /api/records/:runId': ['lead', 'manager'],
};

let server: TestServer;
beforeAll(async () => {
  server = await TestServer.start();
});
afterAll(() => server.stop());

const keyOf = ({ method, path }: { method: string; path: string }) => `${method} ${path}`;

/** The address with something in place of each parameter that names nothing. */
function addressOf(path: string): string {
  return path
    .replace(':sha256', 'a'.repeat(64))
    .replace(':version', '1')
    .replace(/\/procedures\/:id/, '/procedures/nothing')
    .replace(/:\w+/g, randomUUID());
}

it('are all in the list of who may', () => {
  expect(server.app.routes.map(keyOf).sort()).toEqual(Object.keys(allowed).sort());
});

it('are the only ones: the app answers nothing else under /api', async () => {
  const mounted = (server.app.express.router.stack as { route?: { path: string; methods: Record<string, boolean> } }[])
    .filter(({ route }) => route !== undefined)
    .flatMap(({ route }) => Object.keys(route!.methods).map((method) => `${method} ${route!.path}`));
  expect(mounted.sort()).toEqual(Object.keys(allowed).sort());
});

describe.each(Object.entries(allowed))('%s', (key, roles) => {
  const [method = '', path = ''] = key.split(' ');
  // An empty body is refused by its shape (or its size) only after the right was looked at.
  const ask = (as?: DemoName) => server.ask(method.toUpperCase(), addressOf(path), as === undefined ? {} : { as });

  it(roles === 'anyone' ? 'needs no sign-in' : 'refuses someone who is not signed in', async () => {
    const answer = await ask();
    if (roles !== 'anyone') expect(answer).toMatchObject({ status: 401, json: { code: 'not-signed-in' } });
    else expect(answer.json?.code).not.toBe('not-signed-in');
  });

  it.each(everyRole.map((role) => [role]))('is open to a %s only when the list says so', async (role) => {
    const answer = await ask(names[role]);
    if (roles === 'anyone' || roles.includes(role)) {
      if (roles !== 'anyone') expect(answer.status).not.toBe(401);
      expect(answer.json?.code).not.toBe('not-allowed');
      expect(answer.status).toBeLessThan(500);
    } else {
      expect(answer).toMatchObject({ status: 403, json: { code: 'not-allowed' } });
    }
  });
});

it('are all described by OpenAPI, with every schema that is referred to', async () => {
  const { json } = await server.ask('GET', '/api/openapi.json');
  const described = Object.entries(json.paths as Record<string, object>).flatMap(([path, methods]) =>
    Object.keys(methods).map((method) => `${method} ${path.replaceAll(/\{(\w+)\}/g, ':$1')}`),
  );
  expect(described.sort()).toEqual(Object.keys(allowed).sort());
  const references = [...JSON.stringify(json).matchAll(/#\/components\/schemas\/(\w+)/g)].map(([, name]) => name!);
  expect(references.length).toBeGreaterThan(20);
  for (const name of references) expect(Object.keys(json.components.schemas)).toContain(name);
  expect(json.components.schemas.SignInRequest).toEqual({
    type: 'object',
    additionalProperties: false,
    required: ['name', 'password'],
    properties: {
      name: { type: 'string', minLength: 1, maxLength: 100, pattern: '^\\P{Cc}*$' },
      password: { type: 'string', minLength: 1, maxLength: 1000 },
      tablet: { type: 'string', format: 'uuid' },
    },
  });
  expect(json.components.schemas.PushAnswer.properties.runs).toEqual({
    type: 'array',
    items: { $ref: '#/components/schemas/PushedRunAnswer' },
  });
});
