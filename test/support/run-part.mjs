// @ts-check
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { closeSync, openSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { stripVTControlCharacters } from 'node:util';
import { endGroup } from '../../server/start/commands.mjs';
import { lastLines, say } from '../../server/start/sentences.mjs';
import { atStop, isStopping } from '../../server/start/stopping.mjs';
import { closingLine } from './ledger.mjs';
import { countBrowser, countJest } from './read-report.mjs';

/** @typedef {import('./test-parts.mjs').TestPart} TestPart */
/** @typedef {import('./ledger.mjs').Counts} Counts */
/** @typedef {Counts & { name: string, seconds: number, note?: string }} PartResult */

/** A part that hangs must not take the others' results with it. */
const limitMs = 15 * 60_000;
const stopLimitMs = 15_000;
const linesShown = 300;

/**
 * Runs one part and counts its result. What it prints goes to a file, shown when it failed.
 * @param {TestPart} part
 * @param {object} place
 * @param {string} place.root the checkout
 * @param {string} place.results the folder of logs and reports
 * @param {NodeJS.ProcessEnv} place.env
 * @param {string} [missing] a part that it needs and that failed: it is not run then
 * @returns {Promise<PartResult>}
 */
export async function runPart(part, { root, results, env }, missing) {
  const { name } = part;
  if (missing !== undefined) return told({ name, seconds: 0, ...oneFailure, note: `could not run: ${missing} failed` });
  say(`${name}: begun`);
  const beganMs = performance.now();
  const log = join(results, `${name.replace(/\W+/g, '-')}.log`);
  const code = await run(part.command, { root, env, log });
  const seconds = (performance.now() - beganMs) / 1000;
  const result = { name, seconds, ...countsOf(part, code) };
  if (result.failed > 0 && !isStopping()) {
    say(`\n--- ${name} failed; its output (${log}):\n${lastLines(plainText(log), linesShown)}\n---`);
  }
  return told(result);
}

const oneFailure = { passed: 0, failed: 1, skipped: 0 };

/**
 * @param {TestPart} part
 * @param {number | undefined} code the exit code; undefined when it was ended for taking too long
 * @returns {Counts & { note?: string }}
 */
export function countsOf({ kind, report }, code) {
  if (code === undefined) return { ...oneFailure, note: `ended after ${limitMs / 60_000} minutes` };
  if (kind === 'check') return code === 0 ? { passed: 1, failed: 0, skipped: 0 } : oneFailure;
  try {
    const read = JSON.parse(readFileSync(report ?? '', 'utf8'));
    const counts = kind === 'jest' ? countJest(read) : countBrowser(read);
    if (counts.passed + counts.failed + counts.skipped === 0) return { ...oneFailure, note: 'ran no test' };
    if (code !== 0 && counts.failed === 0) return { ...counts, failed: 1, note: `exit code ${code}` };
    return counts;
  } catch (error) {
    return { ...oneFailure, note: `gave no result: ${error instanceof Error ? error.message : String(error)}` };
  }
}

/**
 * What stands in a log, without the colours that some tools write even into a file.
 * @param {string} log
 */
const plainText = (log) => stripVTControlCharacters(readFileSync(log, 'utf8'));

/** @param {PartResult} result */
function told(result) {
  if (!isStopping()) {
    const note = result.note === undefined ? '' : ` (${result.note})`;
    say(`${result.name}: ${closingLine(result)} in ${result.seconds.toFixed(1)} s${note}`);
  }
  return result;
}

/**
 * @param {string[]} command
 * @param {{ root: string, env: NodeJS.ProcessEnv, log: string }} place
 * @returns {Promise<number | undefined>}
 */
function run([program = '', ...args], { root, env, log }) {
  const file = openSync(log, 'w');
  const path = `${join(root, 'node_modules/.bin')}:${env['PATH'] ?? ''}`;
  const child = spawn(program, args, {
    cwd: root,
    env: { ...env, PATH: path },
    detached: true,
    stdio: ['ignore', file, file],
  });
  closeSync(file);
  const forget = atStop(async () => {
    // As Ctrl-C would: a test runner then closes its browsers and servers before it goes.
    const gone = once(child, 'exit');
    endGroup(child.pid, 'SIGINT');
    const timer = setTimeout(() => endGroup(child.pid, 'SIGKILL'), stopLimitMs);
    await gone;
    clearTimeout(timer);
  });
  return new Promise((resolve) => {
    let isLate = false;
    const timer = setTimeout(() => {
      isLate = true;
      endGroup(child.pid, 'SIGKILL');
    }, limitMs);
    const settle = (/** @type {number | undefined} */ code) => {
      clearTimeout(timer);
      forget();
      resolve(isLate ? undefined : code);
    };
    child.on('error', () => settle(127));
    child.on('exit', (code) => settle(code ?? 128));
  });
}
