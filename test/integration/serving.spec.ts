import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createHash } from 'node:crypto';
import { Agent, request, type IncomingMessage } from 'node:http';
import { connect } from 'node:net';
import { resolve } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { createEmptyDatabase, createTestDatabase, type TestDatabase } from '../support/test-database';

const root = resolve(__dirname, '../..');
const children = new Set<ChildProcess>();
let data: TestDatabase;

beforeAll(async () => {
  data = await createTestDatabase();
});
afterAll(async () => {
  for (const child of children) child.kill('SIGKILL');
  await data.drop();
});

interface Serving {
  readonly child: ChildProcess;
  readonly port: number;
  readonly ended: Promise<number | null>;
  readonly printed: () => string;
}

function run(env: Record<string, string>): Omit<Serving, 'port'> {
  const child = spawn(process.execPath, ['-r', resolve(root, 'test/support/run-typescript.cjs'), 'server/main.ts'], {
    cwd: root,
    env: { PATH: process.env['PATH'] ?? '', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  children.add(child);
  let printed = '';
  for (const stream of [child.stdout, child.stderr])
    stream.on('data', (chunk: Buffer) => (printed += chunk.toString()));
  const ended = once(child, 'exit').then(([code]) => {
    children.delete(child);
    return code as number | null;
  });
  return { child, ended, printed: () => printed };
}

/** The server as a process of its own, listening. */
async function serve(): Promise<Serving> {
  const env = { DATABASE_URL: data.appUrl, BAYHAND_TOKEN_SECRET: 'x'.repeat(40), BAYHAND_DEMO: '1', PORT: '0' };
  const started = run(env);
  for (let tries = 0; tries < 600; tries += 1) {
    const port = /"port":(\d+).*"msg":"listening"/.exec(started.printed())?.[1];
    if (port !== undefined) return { ...started, port: Number(port) };
    if (started.child.exitCode !== null) break;
    await wait(50);
  }
  throw new Error(`the server does not listen: ${started.printed()}`);
}

function ask(port: number, path: string, options: { agent?: Agent; method?: string; headers?: object } = {}) {
  const asked = request({ port, host: '127.0.0.1', path, ...options, headers: { ...options.headers } });
  const answered = once(asked, 'response').then(async ([answer]: IncomingMessage[]) => {
    const chunks: Buffer[] = [];
    for await (const chunk of answer!) chunks.push(chunk as Buffer);
    return { status: answer!.statusCode, text: Buffer.concat(chunks).toString() };
  });
  return { asked, answered };
}

async function tokenOf(port: number): Promise<string> {
  const { asked, answered } = ask(port, '/api/session', {
    method: 'POST',
    headers: { 'content-type': 'application/json' },
  });
  asked.end(JSON.stringify({ name: 'okafor', password: 'ossenholt-demo' }));
  return (JSON.parse((await answered).text) as { accessToken: string }).accessToken;
}

async function isRefused(port: number): Promise<boolean> {
  const socket = connect(port, '127.0.0.1');
  const outcome = await Promise.race([
    once(socket, 'connect').then(() => false),
    once(socket, 'error').then(() => true),
  ]).catch(() => true);
  socket.destroy();
  return outcome;
}

it('lets a request in flight come to its end when it is told to stop, and takes no new one', async () => {
  const serving = await serve();
  const agent = new Agent({ keepAlive: true });
  const ready = ask(serving.port, '/readyz', { agent });
  ready.asked.end();
  expect(await ready.answered).toEqual({ status: 200, text: '{"status":"ready"}' });
  const bytes = Buffer.alloc(100_000, 3);
  const sha256 = createHash('sha256').update(bytes).digest('hex');
  const put = ask(serving.port, `/api/attachments/${sha256}`, {
    method: 'PUT',
    headers: {
      authorization: `Bearer ${await tokenOf(serving.port)}`,
      'content-type': 'application/octet-stream',
      'content-length': String(bytes.length),
    },
  });
  put.asked.write(bytes.subarray(0, 50_000));
  await wait(200);
  serving.child.kill('SIGTERM');
  await wait(200);
  expect(await isRefused(serving.port)).toBe(true);
  expect(serving.child.exitCode).toBeNull();
  put.asked.end(bytes.subarray(50_000));
  expect(await put.answered).toMatchObject({ status: 201 });
  expect(await serving.ended).toBe(0);
  expect(serving.printed()).toMatch(/"msg":"stopped"/);
  agent.destroy();
});

it('goes at once on a second signal', async () => {
  const serving = await serve();
  const { asked, answered } = ask(serving.port, '/api/session', {
    method: 'POST',
    headers: { 'content-type': 'application/json', 'content-length': '100' },
  });
  answered.catch(() => undefined);
  asked.on('error', () => undefined);
  asked.write('{');
  await wait(200);
  serving.child.kill('SIGINT');
  await wait(200);
  expect(serving.child.exitCode).toBeNull();
  serving.child.kill('SIGINT');
  expect(await serving.ended).toBe(1);
});

it('does not start without its settings, and says all that is missing', async () => {
  const started = run({ PORT: 'x', BAYHAND_TLS_CERT: '/nowhere.pem' });
  expect(await started.ended).toBe(1);
  for (const name of ['PORT', 'DATABASE_URL', 'BAYHAND_TOKEN_SECRET', 'BAYHAND_TLS_KEY']) {
    expect(started.printed()).toContain(name);
  }
});

it('does not start over a database that was not prepared, nor where the port is taken', async () => {
  const empty = await createEmptyDatabase();
  const secret = 'x'.repeat(40);
  const started = run({ DATABASE_URL: empty.appUrl, BAYHAND_TOKEN_SECRET: secret, PORT: '0' });
  expect(await started.ended).toBe(1);
  expect(started.printed()).toMatch(/not prepared/);
  await empty.drop();
  const serving = await serve();
  const second = run({ DATABASE_URL: data.appUrl, BAYHAND_TOKEN_SECRET: secret, PORT: String(serving.port) });
  expect(await second.ended).toBe(1);
  expect(second.printed()).toMatch(/EADDRINUSE/);
  expect(second.printed()).not.toContain(secret);
  serving.child.kill('SIGTERM');
  expect(await serving.ended).toBe(0);
});
