import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { gunzipSync } from 'node:zlib';
import { TestServer } from '../support/test-server';
import { TestTablet } from '../support/test-tablet';

let server: TestServer;
let folder: string;

const files: Readonly<Record<string, string>> = {
  'index.html': '<!doctype html><title>Bayhand</title>',
  'main-AB12CD34.js': 'console.log(1);',
  'styles-ZYXW9876.css': 'body{}',
  'ngsw.json': '{"timestamp":1}',
  'ngsw-worker.js': '// worker',
  'manifest.webmanifest': '{}',
  'media/inter-latin-400-normal-TQQ5JXGD.woff2': 'font',
};

beforeAll(async () => {
  folder = mkdtempSync(join(tmpdir(), 'bayhand-app-'));
  mkdirSync(join(folder, 'media'));
  for (const [name, content] of Object.entries(files)) writeFileSync(join(folder, name), content);
  server = await TestServer.start({ appDir: folder });
});
afterAll(async () => {
  await server.stop();
  rmSync(folder, { recursive: true });
});

const get = (path: string, headers: Record<string, string> = {}) => server.ask('GET', path, { headers });

describe('the served app', () => {
  it.each(['/', '/bench', '/run/0197f3a0-0000-7000-8000-000000000001', '/records?sort=-openedAt', '/apiary'])(
    'gives its one page at %s, to be asked for again each time',
    async (path) => {
      const answer = await get(path);
      expect(answer.status).toBe(200);
      expect(answer.bytes.toString()).toBe(files['index.html']);
      expect(answer.headers.get('content-type')).toMatch(/^text\/html/);
      expect(answer.headers.get('cache-control')).toBe('no-cache');
    },
  );

  it.each(['/index.html', '/ngsw.json', '/ngsw-worker.js', '/manifest.webmanifest'])(
    'has %s asked for again',
    async (path) => {
      const answer = await get(path);
      expect(answer.bytes.toString()).toBe(files[path.slice(1)]);
      expect(answer.headers.get('cache-control')).toBe('no-cache');
    },
  );

  it.each(['/main-AB12CD34.js', '/styles-ZYXW9876.css', '/media/inter-latin-400-normal-TQQ5JXGD.woff2'])(
    'has %s kept for a year',
    async (path) => {
      const answer = await get(path);
      expect(answer.bytes.toString()).toBe(files[path.slice(1)]);
      expect(answer.headers.get('cache-control')).toBe('public, max-age=31536000, immutable');
    },
  );

  it.each([
    '/main-OLD00000.js',
    '/favicon.ico',
    '/ngsw',
    '/ngsw/state',
    '/ngsw-other',
    '/api',
    '/api/nothing',
    '/mail',
    '/healthz/x',
    '/%2e%2e/secret.txt',
  ])('never gives the page in place of %s', async (path) => {
    const answer = await get(path);
    expect(answer).toMatchObject({ status: 404, json: { code: 'not-found' } });
  });

  it('answers only reading: other methods find nothing', async () => {
    expect(await server.ask('POST', '/bench', { json: {} })).toMatchObject({ status: 404 });
  });
});

describe('every answer', () => {
  it.each(['/', '/api/nothing', '/healthz', '/main-AB12CD34.js'])(
    'keeps other code and frames out: %s',
    async (path) => {
      const { headers } = await get(path);
      const policy = headers.get('content-security-policy') ?? '';
      const directives = new Map(policy.split(';').map((text) => [text.split(' ')[0], text.split(' ').slice(1)]));
      expect(directives.get('default-src')).toEqual([`'self'`]);
      expect(directives.get('script-src')).toEqual([`'self'`]);
      expect(directives.get('connect-src')).toEqual([`'self'`]);
      expect(directives.get('object-src')).toEqual([`'none'`]);
      expect(directives.get('frame-ancestors')).toEqual([`'none'`]);
      expect(directives.get('base-uri')).toEqual([`'self'`]);
      expect(policy).not.toMatch(/unsafe-eval/);
      expect(headers.get('x-content-type-options')).toBe('nosniff');
      expect(headers.get('referrer-policy')).toBe('no-referrer');
      expect(headers.get('x-powered-by')).toBeNull();
      // Over plain http on this machine a promise of https would lock the browser out.
      expect(headers.get('strict-transport-security')).toBeNull();
    },
  );

  it('promises https where the address is one, and sends its cookie over nothing else', async () => {
    const plain = await server.signIn('okafor');
    expect(plain.headers.get('set-cookie')).toMatch(/HttpOnly; Secure; SameSite=Strict/);
    const known = await TestServer.start({ isDemo: true, publicUrl: new URL('https://bayhand.example') });
    const signedIn = await known.signIn('okafor');
    await known.stop();
    expect(signedIn.headers.get('set-cookie')).toMatch(/HttpOnly; Secure; SameSite=Strict/);
    expect(signedIn.headers.get('strict-transport-security')).toBe('max-age=15552000');
    expect(signedIn.headers.get('content-security-policy')).toMatch(/upgrade-insecure-requests/);
  });

  it('has a request id, the one in the log', async () => {
    const id = (await get('/api/nothing')).headers.get('x-request-id');
    expect(id).toMatch(/^[0-9a-f-]{36}$/);
    expect(server.logged.join('')).toContain(id);
  });

  it('of the API is not stored', async () => {
    expect((await server.ask('GET', '/api/procedures', { as: 'okafor' })).headers.get('cache-control')).toBe(
      'no-store',
    );
  });

  it('is compressed where that is asked for and helps', async () => {
    const { port } = new URL(server.url);
    const { request } = await import('node:http');
    const raw = await new Promise<{ encoding?: string; bytes: Buffer }>((resolve, reject) => {
      const asked = request({ port, path: '/api/openapi.json', headers: { 'accept-encoding': 'gzip' } }, (answer) => {
        const chunks: Buffer[] = [];
        answer.on('data', (chunk: Buffer) => chunks.push(chunk));
        answer.on('end', () => resolve({ encoding: answer.headers['content-encoding'], bytes: Buffer.concat(chunks) }));
      });
      asked.on('error', reject);
      asked.end();
    });
    expect(raw.encoding).toBe('gzip');
    expect(JSON.parse(gunzipSync(raw.bytes).toString())).toMatchObject({ openapi: '3.1.0' });
  });
});

describe('what goes wrong', () => {
  const post = (content: string, type = 'application/json') =>
    server.ask('POST', '/api/session', { bytes: Buffer.from(content), headers: { 'content-type': type } });

  it.each([
    ['no JSON', '{"name":', 400, 'bad-request'],
    ['a list', '[]', 400, 'bad-request'],
    ['null', 'null', 400, 'bad-request'],
    ['nothing', '', 422, 'invalid'],
    ['a missing field', '{"name":"x"}', 422, 'invalid'],
    ['a field of another kind', '{"name":3,"password":"x"}', 422, 'invalid'],
    ['a character that no name has', String.raw`{"name":"a\u0000b","password":"x"}`, 422, 'invalid'],
    ['too much', JSON.stringify({ name: 'x', password: 'y'.repeat(20_000) }), 413, 'too-large'],
  ])('is told as a problem document: %s', async (_name, content, status, code) => {
    const answer = await post(content);
    expect(answer.status).toBe(status);
    expect(answer.headers.get('content-type')).toBe('application/problem+json; charset=utf-8');
    expect(answer.json).toMatchObject({ type: `urn:bayhand:problem:${code}`, code, status, instance: '/api/session' });
    expect(answer.json.title).toEqual(expect.any(String));
  });

  it('names every field by a JSON pointer', async () => {
    const tablet = await server.ask('POST', '/api/tablets', {
      as: 'adeyemi',
      json: { label: '', publicKey: { kty: 'RSA' }, 'a/b~c': 1 },
    });
    const pointers = tablet.json.errors.map(({ pointer }: { pointer: string }) => pointer);
    expect(pointers).toEqual(expect.arrayContaining(['/label', '/publicKey/kty', '/publicKey/x', '/a~1b~0c']));
  });

  it('refuses another kind of content, an unknown encoding and a broken address', async () => {
    expect(await post('name=x', 'application/x-www-form-urlencoded')).toMatchObject({ status: 415 });
    const encoded = await server.ask('POST', '/api/session', { json: {}, headers: { 'content-encoding': 'zebra' } });
    expect(encoded).toMatchObject({ status: 400, json: { code: 'bad-request' } });
    expect(await get('/api/attachments/%E0%A4%A')).toMatchObject({ status: 400, json: { code: 'bad-request' } });
  });

  it('refuses a push of more than 8 MB with 413', async () => {
    const tablet = await TestTablet.enrol(server);
    const document = { id: 'x', concern: 'y'.repeat(8 * 1024 * 1024) };
    const answer = await tablet.push({ documents: [{ kind: 'visit', document }] });
    expect(answer).toMatchObject({ status: 413, json: { code: 'too-large' } });
  });

  it('tells nothing about a failure of its own, and logs it', async () => {
    const { Client } = await import('pg');
    const owner = new Client({ connectionString: server.data.ownerUrl });
    await owner.connect();
    await owner.query('ALTER TABLE sign_in_attempt RENAME TO elsewhere');
    const answer = await server.signIn('okafor');
    await owner.query('ALTER TABLE elsewhere RENAME TO sign_in_attempt');
    await owner.end();
    expect(answer.status).toBe(500);
    expect(answer.json).toEqual({
      type: 'urn:bayhand:problem:internal',
      code: 'internal',
      title: 'The server failed',
      status: 500,
      instance: '/api/session',
    });
    const logged = server.logged.map((line) => JSON.parse(line) as { level: number; requestId?: string; err?: object });
    const errors = logged.filter(({ level }) => level === 50);
    expect(errors).toEqual([
      expect.objectContaining({
        requestId: answer.headers.get('x-request-id'),
        err: expect.objectContaining({ message: expect.stringContaining('sign_in_attempt') }),
      }),
    ]);
  });
});

describe('health', () => {
  it('is told to anyone', async () => {
    expect(await get('/healthz')).toMatchObject({ status: 200, json: { status: 'ok' } });
    expect(await get('/readyz')).toMatchObject({ status: 200, json: { status: 'ready' } });
  });
});
