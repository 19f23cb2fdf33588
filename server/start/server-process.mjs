// @ts-check
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { closeSync, existsSync, openSync, readFileSync, renameSync } from 'node:fs';
import { request as requestHttp } from 'node:http';
import { request as requestHttps } from 'node:https';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { StartProblem, lastLines } from './sentences.mjs';
import { atStop } from './stopping.mjs';

export const serverFile = 'dist/server/server/main.js';

const readyLimitMs = 60_000;
/** Longer than the server itself gives its open requests. */
const stopLimitMs = 15_000;

/**
 * The environment of the compiled server. The owner's way into the database is not part of it: who serves may not change
 * tables.
 * @param {string} root the checkout
 * @param {import('./settings.mjs').StartSettings} settings
 * @param {import('./own-database.mjs').DatabaseUrls} urls
 * @param {import('./kept-secrets.mjs').Secrets} secrets
 * @returns {NodeJS.ProcessEnv}
 */
export function serverEnv(root, settings, urls, secrets) {
  const { DATABASE_OWNER_URL: _, ...env } = process.env;
  return {
    ...env,
    DATABASE_URL: urls.appUrl,
    BAYHAND_DEMO: settings.isDemo ? '1' : '0',
    NODE_ENV: 'production',
    HOST: settings.host,
    PORT: String(settings.port),
    BAYHAND_APP_DIR: join(root, 'dist/app'),
    BAYHAND_TOKEN_SECRET: settings.tokenSecret ?? secrets.tokenSecret,
  };
}

/**
 * Starts the compiled server and waits until it is ready. It is stopped when everything is, or by what is returned.
 * @param {object} options
 * @param {string} options.root the checkout
 * @param {NodeJS.ProcessEnv} options.env
 * @param {string} options.log the file that takes its log; the one of the start before is kept beside it
 * @param {string} options.address where it will be, as `http://127.0.0.1:4310/`
 * @param {boolean} [options.isOfOurGroup] whether what ends our group of processes ends it too; otherwise we alone do
 * @param {(pid: number) => void} [options.noteServer]
 * @returns {Promise<{ ended: Promise<number>, stop: () => Promise<void> }>} `ended` resolves to the exit code
 */
export async function startServer({ root, env, log, address, isOfOurGroup = false, noteServer }) {
  if (existsSync(log)) renameSync(log, `${log}.1`);
  const file = openSync(log, 'a', 0o600);
  const child = spawn(process.execPath, [join(root, serverFile)], {
    cwd: root,
    env,
    detached: !isOfOurGroup,
    stdio: ['ignore', file, file],
  });
  closeSync(file);
  const ended = once(child, 'exit').then(([code, signal]) => (signal === null ? Number(code) : 128));
  const forget = atStop(() => stopServer(child, ended));
  if (child.pid !== undefined) noteServer?.(child.pid);
  const first = await Promise.race([ended.then((code) => ({ code })), untilReady(address)]);
  if (first === 'ready') {
    const stop = async () => {
      forget();
      await stopServer(child, ended);
    };
    return { ended, stop };
  }
  const why = first === 'late' ? `was not ready within ${readyLimitMs / 1000} s` : `ended with code ${first.code}`;
  throw new StartProblem(
    `The server ${why}. The end of its log (${log}):\n${lastLines(readFileSync(log, 'utf8'))}\nMend that, then run the same command again.`,
  );
}

/**
 * @param {import('node:child_process').ChildProcess} child
 * @param {Promise<unknown>} ended
 */
async function stopServer(child, ended) {
  if (child.exitCode !== null || child.signalCode !== null) return;
  child.kill('SIGTERM');
  const timer = setTimeout(() => child.kill('SIGKILL'), stopLimitMs);
  await ended;
  clearTimeout(timer);
}

/**
 * @param {string} address
 * @returns {Promise<'ready' | 'late'>}
 */
async function untilReady(address) {
  const beganMs = performance.now();
  while (performance.now() - beganMs < readyLimitMs) {
    if (await answersOk(new URL('/readyz', address))) return 'ready';
    await wait(50);
  }
  return 'late';
}

/**
 * Whether this address answers with 200.
 * @param {URL} url
 * @returns {Promise<boolean>}
 */
export function answersOk(url) {
  return new Promise((resolve) => {
    // Whose certificate it is matters to browsers; here it is asked only whether our own process answers.
    const request =
      url.protocol === 'https:' ? requestHttps(url, { rejectUnauthorized: false }) : requestHttp(url, { agent: false });
    request.setTimeout(2000, () => request.destroy());
    request.on('error', () => resolve(false));
    request.on('response', (response) => {
      response.resume();
      resolve(response.statusCode === 200);
    });
    request.end();
  });
}
