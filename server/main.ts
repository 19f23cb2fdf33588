import { createServer as createHttpServer, type Server } from 'node:http';
import { createServer as createHttpsServer } from 'node:https';
import type { AddressInfo } from 'node:net';
import { pino, type Logger } from 'pino';
import { createApp } from './app';
import { coreBuild } from './build-identity';
import { loadConfig, ConfigProblem, type Config } from './config';
import { createDataSource } from './database/data-source';
import { databaseSentence } from './database/database-sentence';
import { refuseUnpreparedDatabase } from './database/readiness';

/** A server that listens. */
export interface RunningServer {
  readonly port: number;
  /** Stops in order: no longer ready, no new requests, the open ones to their end, the database last. */
  readonly stop: () => Promise<void>;
}

/** How long open requests are given when the server stops. */
const stopGraceMs = 8_000;

/** Opens the database, refuses one that was not prepared, and listens. */
export async function start(config: Config, log: Logger, clock: () => Date = () => new Date()): Promise<RunningServer> {
  const database = createDataSource(config.databaseUrl);
  await database.initialize();
  try {
    await refuseUnpreparedDatabase(database);
    let isStopping = false;
    const app = createApp({ config, database, log, clock, build: coreBuild(), isStopping: () => isStopping });
    const server =
      config.tls === undefined ? createHttpServer(app.express) : createHttpsServer(config.tls, app.express);
    const port = await listen(server, config);
    log.info({ port, host: config.host, isHttps: config.tls !== undefined }, 'listening');
    const stop = async () => {
      isStopping = true;
      await closeServer(server);
      await database.destroy();
      log.info('stopped');
    };
    return { port, stop };
  } catch (error) {
    await database.destroy();
    throw error;
  }
}

function listen(server: Server, { host, port }: Config): Promise<number> {
  return new Promise((resolve, reject) => {
    server.once('error', reject);
    server.listen(port, host, () => {
      server.off('error', reject);
      resolve((server.address() as AddressInfo).port);
    });
  });
}

async function closeServer(server: Server): Promise<void> {
  const closed = new Promise<void>((resolve) => server.close(() => resolve()));
  server.closeIdleConnections();
  const timer = setTimeout(() => server.closeAllConnections(), stopGraceMs);
  await closed;
  clearTimeout(timer);
}

async function main(): Promise<void> {
  try {
    const config = loadConfig(process.env);
    const running = await start(config, pino({ level: config.logLevel, base: { app: 'bayhand' } }));
    stopOnSignals(running);
  } catch (error) {
    if (!(error instanceof Error)) throw error;
    const sentence = error instanceof ConfigProblem ? error.message : databaseSentence(error);
    process.stderr.write(`Bayhand can't start. ${sentence}\n`);
    process.exitCode = 1;
  }
}

function stopOnSignals(running: RunningServer): void {
  let isStopping = false;
  for (const signal of ['SIGTERM', 'SIGINT'] as const) {
    process.on(signal, () => {
      // A second signal is impatience: go at once.
      if (isStopping) process.exit(1);
      isStopping = true;
      void running.stop().then(() => process.exit(0));
    });
  }
}

if (require.main === module) void main();
