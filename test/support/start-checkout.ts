import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { chmodSync, cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { freePort } from '../../server/start/free-port.mjs';

const root = resolve(__dirname, '../..');

/** Answers as the server does to its start: it is ready, and it stops when asked to. */
const stubServer = `
const server = require('node:http').createServer((request, response) => response.end('ok'));
server.listen(Number(process.env.PORT), process.env.HOST);
process.on('SIGTERM', () => { server.close(() => process.exit(0)); server.closeAllConnections(); });
`;
const stubPrepare = `
if (!process.env.DATABASE_URL || !process.env.DATABASE_OWNER_URL) throw new Error('no database');
require('node:fs').appendFileSync('prepared.txt', process.env.DATABASE_OWNER_URL + '\\n');
`;

/** A checkout with the real start and nothing else of ours: what it builds and serves is a stub, built by copying. */
export class StartCheckout {
  /** Under a name that a shell would trip over. */
  readonly folder = mkdtempSync(join(tmpdir(), "bayhand's $HOME checkout-"));
  private readonly running = new Set<ChildProcess>();

  private constructor(readonly port: number) {}

  static async make(): Promise<StartCheckout> {
    const checkout = new StartCheckout(await freePort());
    checkout.fill();
    return checkout;
  }

  /** Runs `npm start`'s own command; resolves when it has said how to stop it, or when it ends. */
  async start(env: NodeJS.ProcessEnv = {}): Promise<Started> {
    const child = spawn(process.execPath, ['server/start/start.mjs'], {
      cwd: this.folder,
      env: { PATH: process.env['PATH'], HOME: '', BAYHAND_PORT: String(this.port), ...env },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    this.running.add(child);
    const started: Started = { child, said: '', code: undefined, ended: Promise.resolve() };
    started.ended = once(child, 'close').then(([code]) => {
      started.code = Number(code);
      this.running.delete(child);
    });
    const isUp = new Promise<void>((up) => {
      for (const stream of [child.stdout, child.stderr]) {
        stream.setEncoding('utf8').on('data', (text: string) => {
          started.said += text;
          if (/^Stop it with Ctrl-C.*\n/m.test(started.said)) up();
        });
      }
    });
    await Promise.race([isUp, started.ended]);
    return started;
  }

  /** Stops what still runs and removes everything. */
  async remove(): Promise<void> {
    for (const child of this.running) {
      const ended = once(child, 'close');
      child.kill('SIGTERM');
      await ended;
    }
    rmSync(this.folder, { recursive: true });
  }

  private fill() {
    // Every account may look in: the database runs under another one where the tests run as root.
    chmodSync(this.folder, 0o755);
    cpSync(join(root, 'server/start'), join(this.folder, 'server/start'), { recursive: true });
    mkdirSync(join(this.folder, 'node_modules'));
    mkdirSync(join(this.folder, 'stub/server/database'), { recursive: true });
    const write = (path: string, text: string) => writeFileSync(join(this.folder, path), text);
    const noPackages = JSON.stringify({ packages: {} });
    write('package-lock.json', noPackages);
    write('node_modules/.package-lock.json', noPackages);
    write('stub/server/main.js', stubServer);
    write('stub/server/database/prepare.js', stubPrepare);
    write(
      'package.json',
      JSON.stringify({
        scripts: {
          'build:document': 'mkdir -p procedures/document/compiled',
          'build:server': 'mkdir -p dist/server && cp -r stub/server dist/server/',
          'build:app': 'mkdir -p dist/app && touch dist/app/index.html',
        },
      }),
    );
  }
}

/** One run of the start. */
export interface Started {
  readonly child: ChildProcess;
  /** All that it has said so far, on both streams. */
  said: string;
  /** The exit code, once it has ended. */
  code: number | undefined;
  ended: Promise<void>;
}
