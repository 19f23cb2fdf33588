import { TestServer, type Answered } from '../support/test-server';

let server: TestServer;

beforeAll(async () => {
  server = await TestServer.start({ isDemo: true });
});
afterAll(() => server.stop());
beforeEach(() => server.database.query('DELETE FROM sign_in_attempt'));

const tablet = '0197f3a0-0000-7000-8000-00000000aaaa';

function cookieOf(answer: Answered): string {
  const [pair] = (answer.headers.get('set-cookie') ?? '').split(';');
  return pair ?? '';
}

function refresh(cookie: string, json: object = {}): Promise<Answered> {
  return server.ask('POST', '/api/session/refresh', { json, headers: { cookie } });
}

describe('signing in', () => {
  it('gives a short token, the person and a cookie that no script can read', async () => {
    const answer = await server.signIn('Okafor ');
    expect(answer.status).toBe(200);
    expect(answer.json).toEqual({
      accessToken: expect.any(String),
      expiresInS: 900,
      person: expect.objectContaining({ name: 'okafor', displayName: 'I. Okafor', role: 'technician' }),
    });
    const cookie = answer.headers.get('set-cookie') ?? '';
    expect(cookie).toMatch(/Path=\/api\/session; .*HttpOnly; SameSite=Strict$/);
  });

  it('says the same to a wrong name and a wrong password', async () => {
    const wrongName = await server.signIn('nobody', 'ossenholt-demo');
    const wrongPassword = await server.signIn('okafor', 'guess');
    expect(wrongName.status).toBe(401);
    expect(wrongName.json).toEqual(wrongPassword.json);
    expect(wrongName.headers.get('set-cookie')).toBeNull();
  });

  it.each(['okafor', 'nobody'])('locks the name %s after five wrong tries, longer each time', async (name) => {
    for (let tries = 0; tries < 5; tries += 1) expect((await server.signIn(name, 'guess')).status).toBe(401);
    const locked = await server.signIn(name);
    expect(locked.status).toBe(429);
    expect(locked.headers.get('retry-after')).toBe('30');
    server.wait(30);
    expect((await server.signIn(name, 'guess')).status).toBe(401);
    expect((await server.signIn(name, 'guess')).headers.get('retry-after')).toBe('60');
    for (const longer of [120, 240, 480, 900, 900]) {
      server.wait(900);
      expect((await server.signIn(name, 'guess')).status).toBe(401);
      expect((await server.signIn(name, 'guess')).headers.get('retry-after')).toBe(String(longer));
    }
  });

  it('forgets the wrong tries after a right one', async () => {
    for (let tries = 0; tries < 4; tries += 1) await server.signIn('okafor', 'guess');
    expect((await server.signIn('okafor')).status).toBe(200);
    for (let tries = 0; tries < 4; tries += 1) expect((await server.signIn('okafor', 'guess')).status).toBe(401);
    expect((await server.signIn('okafor')).status).toBe(200);
  });

  it('lets no more than five wrong tries through when many come at once', async () => {
    const answers = await Promise.all(Array.from({ length: 20 }, () => server.signIn('brandt', 'guess')));
    expect(answers.filter(({ status }) => status === 401)).toHaveLength(5);
    expect(answers.filter(({ status }) => status === 429)).toHaveLength(15);
  });

  it('does not know a person who is no longer active', async () => {
    await server.database.query(`UPDATE person SET is_active = false WHERE name = 'brandt'`);
    expect((await server.signIn('brandt')).status).toBe(401);
    await server.database.query(`UPDATE person SET is_active = true WHERE name = 'brandt'`);
    expect((await server.signIn('brandt')).status).toBe(200);
  });

  it('refuses a token that has ended, was changed or is signed otherwise', async () => {
    const { accessToken } = (await server.signIn('okafor')).json;
    const ask = (token: string) =>
      server.ask('GET', '/api/procedures', { headers: { authorization: `Bearer ${token}` } });
    expect((await ask(accessToken)).status).toBe(200);
    const [head, body, signature] = accessToken.split('.');
    const lead = Buffer.from(body, 'base64url').toString().replace('technician', 'lead');
    expect((await ask(`${head}.${Buffer.from(lead).toString('base64url')}.${signature}`)).status).toBe(401);
    const none = Buffer.from('{"alg":"none","typ":"JWT"}').toString('base64url');
    expect((await ask(`${none}.${body}.`)).status).toBe(401);
    server.wait(901);
    const ended = await ask(accessToken);
    expect(ended.status).toBe(401);
    expect(ended.headers.get('www-authenticate')).toBe('Bearer');
  });
});

describe('staying signed in', () => {
  it('replaces the refresh token each time', async () => {
    const first = cookieOf(await server.signIn('okafor'));
    const second = await refresh(first);
    expect(second.status).toBe(200);
    expect(second.json.person.name).toBe('okafor');
    expect(cookieOf(second)).not.toBe(first);
    expect((await refresh(cookieOf(second))).status).toBe(200);
  });

  it('gives a lost answer again until its successor was used', async () => {
    const first = cookieOf(await server.signIn('okafor'));
    await refresh(first);
    server.wait(59);
    const again = await refresh(first);
    expect(again.status).toBe(200);
    expect((await refresh(cookieOf(again))).status).toBe(200);
  });

  it('ends the session when an old token is used after its successor', async () => {
    const first = cookieOf(await server.signIn('okafor'));
    const second = cookieOf(await refresh(first));
    const third = cookieOf(await refresh(second));
    expect((await refresh(first)).status).toBe(401);
    expect((await refresh(third)).status).toBe(401);
  });

  it('ends the session when the other answer of two is used too', async () => {
    const first = cookieOf(await server.signIn('okafor'));
    const one = cookieOf(await refresh(first));
    const two = cookieOf(await refresh(first));
    const next = await refresh(two);
    expect(next.status).toBe(200);
    expect((await refresh(one)).status).toBe(401);
    expect((await refresh(cookieOf(next))).status).toBe(401);
  });

  it('ends the session when a lost answer is asked for after 60 s', async () => {
    const first = cookieOf(await server.signIn('okafor'));
    const second = cookieOf(await refresh(first));
    server.wait(61);
    expect((await refresh(first)).status).toBe(401);
    expect((await refresh(second)).status).toBe(401);
  });

  it('gives a lost answer again to the same tablet alone', async () => {
    const first = cookieOf(await server.signIn('okafor', 'ossenholt-demo', { tablet }));
    await refresh(first, { tablet });
    expect((await refresh(first, { tablet })).status).toBe(200);
    const second = cookieOf(await refresh(first, { tablet }));
    expect((await refresh(first, { tablet: '0197f3a0-0000-7000-8000-00000000bbbb' })).status).toBe(401);
    expect((await refresh(second, { tablet })).status).toBe(401);
  });

  it('gives one successor each when two ask at the very same time', async () => {
    const first = cookieOf(await server.signIn('okafor'));
    const answers = await Promise.all([refresh(first), refresh(first)]);
    expect(answers.map(({ status }) => status)).toEqual([200, 200]);
  });

  it('ends with signing out, after 30 days, and for a person who is no longer active', async () => {
    const first = await server.signIn('okafor');
    const out = await server.ask('DELETE', '/api/session', { headers: { cookie: cookieOf(first) } });
    expect(out.status).toBe(204);
    expect(out.headers.get('set-cookie')).toMatch(/^bayhand-refresh=; Path=\/api\/session; Expires=Thu, 01 Jan 1970/);
    expect((await refresh(cookieOf(first))).status).toBe(401);
    const old = cookieOf(await server.signIn('okafor'));
    server.wait(30 * 24 * 3600);
    expect((await refresh(old)).status).toBe(401);
    const brandt = cookieOf(await server.signIn('brandt'));
    await server.database.query(`UPDATE person SET is_active = false WHERE name = 'brandt'`);
    expect((await refresh(brandt)).status).toBe(401);
    await server.database.query(`UPDATE person SET is_active = true WHERE name = 'brandt'`);
  });

  it.each(['', 'bayhand-refresh=', 'bayhand-refresh=nonsense'])('refuses the cookie "%s"', async (cookie) => {
    expect((await refresh(cookie)).status).toBe(401);
  });
});

describe('a tablet', () => {
  const p256 = { kty: 'EC', crv: 'P-256' };
  // The public key of RFC 7515, appendix A.3.1.
  const good = {
    ...p256,
    x: 'f83OJ3D2xF1Bg8vub9tLe1gHMzV76e8Tus9uPHvRVEU',
    y: 'x_FEzRu9m36HLN_tue659LNpXW6pCyStikYjKIWI5a0',
  };

  it('is enrolled by its public key, by anyone in the demo', async () => {
    const answer = await server.ask('POST', '/api/tablets', { as: 'okafor', json: { label: 'B7', publicKey: good } });
    expect(answer).toMatchObject({ status: 201, json: { id: expect.any(String), label: 'B7' } });
  });

  it.each([
    ['a point that is not on the curve', { ...good, y: good.x }],
    ['another curve', { ...good, crv: 'P-384' }],
    ['a private key along with it', { ...good, d: 'jpsQnnGQmL-YBIffH1136cspYG6-0iY7X1fCE9-E9LI' }],
    ['no key', undefined],
  ])('is refused with %s', async (_name, publicKey) => {
    const answer = await server.ask('POST', '/api/tablets', { as: 'adeyemi', json: { label: 'B7', publicKey } });
    expect(answer.status).toBe(422);
    expect(answer.json.errors[0].pointer).toMatch(/^\/publicKey/);
  });
});

it('writes no password, token or cookie into the log', async () => {
  const answer = await server.signIn('okafor');
  await refresh(cookieOf(answer));
  await server.ask('GET', '/api/sync/pull?since=secret-in-query', { as: 'okafor' });
  const log = server.logged.join('');
  expect(log).toContain('/api/session');
  for (const secret of [
    'ossenholt-demo',
    answer.json.accessToken,
    cookieOf(answer).split('=')[1]!,
    'secret-in-query',
  ]) {
    expect(log).not.toContain(secret);
  }
});
