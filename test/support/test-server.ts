import type { AddressInfo } from 'node:net';
import { createServer } from 'node:http';
import { Writable } from 'node:stream';
import { pino } from 'pino';
import type { DataSource } from 'typeorm';
import { createApp, type App } from '../../server/app';
import { createDataSource } from '../../server/database/data-source';
import { demoPassword } from '../../server/database/demo/demo-garage';
import { createTestDatabase, seededAt, type TestDatabase } from './test-database';

export type DemoName = 'okafor' | 'adeyemi' | 'brandt' | 'lindqvist';

/** An answer with its body read. */
export interface Answered {
  readonly status: number;
  readonly headers: Headers;
  readonly bytes: Buffer;
  /** The body as JSON; undefined when it is none. */
  // Specs look into answers of every shape.
  // eslint-disable-next-line @typescript-eslint/no-explicit-any
  readonly json: any;
}

export interface Asked {
  readonly as?: DemoName;
  readonly json?: unknown;
  readonly bytes?: Buffer;
  readonly headers?: Readonly<Record<string, string>>;
}

/** The whole server on a free port, over a database of its own, with a clock that stands until it is moved. */
export class TestServer {
  now = new Date(seededAt.getTime() + 60_000);
  private readonly tokens = new Map<DemoName, string>();

  private constructor(
    readonly url: string,
    readonly app: App,
    readonly database: DataSource,
    readonly data: TestDatabase,
    readonly logged: string[],
    private readonly close: () => Promise<void>,
  ) {}

  static async start(
    options: { readonly isDemo?: boolean; readonly appDir?: string; readonly publicUrl?: URL } = {},
  ): Promise<TestServer> {
    const data = await createTestDatabase();
    const database = await createDataSource(data.appUrl).initialize();
    const logged: string[] = [];
    const log = pino(
      { level: 'debug' },
      new Writable({
        write: (chunk: Buffer, _encoding, done) => {
          logged.push(chunk.toString('utf8'));
          done();
        },
      }),
    );
    const self: { server?: TestServer } = {};
    const app = createApp({
      config: {
        tokenSecret: 'a secret of the tests that is long enough',
        isDemo: options.isDemo ?? false,
        appDir: options.appDir ?? '/nonexistent',
        tls: undefined,
        publicUrl: options.publicUrl,
      },
      database,
      log,
      clock: () => self.server?.now ?? seededAt,
      build: 'spec-core',
      isStopping: () => false,
    });
    const listening = createServer(app.express);
    await new Promise<void>((resolve) => listening.listen(0, '127.0.0.1', resolve));
    const { port } = listening.address() as AddressInfo;
    const close = async () => {
      listening.closeAllConnections();
      await new Promise((resolve) => listening.close(resolve));
      await database.destroy();
      await data.drop();
    };
    self.server = new TestServer(`http://127.0.0.1:${port}`, app, database, data, logged, close);
    return self.server;
  }

  stop(): Promise<void> {
    return this.close();
  }

  /** Moves the clock on. */
  wait(seconds: number): void {
    this.now = new Date(this.now.getTime() + seconds * 1000);
    // Access tokens may have ended.
    this.tokens.clear();
  }

  async ask(method: string, path: string, { as, json, bytes, headers }: Asked = {}): Promise<Answered> {
    const token = as === undefined ? undefined : await this.token(as);
    const answer = await fetch(`${this.url}${path}`, {
      method,
      headers: {
        ...(token === undefined ? {} : { authorization: `Bearer ${token}` }),
        ...(json === undefined ? {} : { 'content-type': 'application/json' }),
        ...(bytes === undefined ? {} : { 'content-type': 'application/octet-stream' }),
        ...headers,
      },
      body: bytes === undefined ? (json === undefined ? undefined : JSON.stringify(json)) : new Uint8Array(bytes),
    });
    const content = Buffer.from(await answer.arrayBuffer());
    const isJson = /json/.test(answer.headers.get('content-type') ?? '');
    const parsed: unknown = isJson ? JSON.parse(content.toString('utf8')) : undefined;
    return { status: answer.status, headers: answer.headers, bytes: content, json: parsed };
  }

  signIn(name: string, password: string = demoPassword, more: object = {}): Promise<Answered> {
    return this.ask('POST', '/api/session', { json: { name, password, ...more } });
  }

  private async token(name: DemoName): Promise<string> {
    const known = this.tokens.get(name);
    if (known !== undefined) return known;
    const answer = await this.signIn(name);
    const token = String((answer.json as { accessToken: unknown }).accessToken);
    this.tokens.set(name, token);
    return token;
  }
}
