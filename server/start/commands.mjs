// @ts-check
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { atStop } from './stopping.mjs';

/**
 * Who runs a program: the ids of another account (only root may change to it), or nothing for oneself.
 * @typedef {{ uid?: number, gid?: number }} Account
 */

/**
 * @typedef {object} CommandOptions
 * @property {Account} [account]
 * @property {string} [cwd] the root folder unless given: another account may not be able to enter ours
 * @property {NodeJS.ProcessEnv} [env]
 * @property {string} [input] what the program reads; nothing unless given
 * @property {boolean} [mustFinish] whether stopping everything waits for its end, since half of it would be worse
 */

/**
 * @typedef {object} CommandResult
 * @property {number} code the exit code; 127 when there is no such program, 128 when a signal ended it
 * @property {string} output what it printed, both streams in order of arrival
 */

/**
 * Runs a program to its end and keeps what it prints. Stopping everything ends it, with all that it started.
 * @param {string} program
 * @param {string[]} args
 * @param {CommandOptions} [options]
 * @returns {Promise<CommandResult>}
 */
export function runCommand(program, args, options = {}) {
  const { account = {}, cwd = '/', env = process.env, input, mustFinish } = options;
  return new Promise((resolve) => {
    // A group of its own: the terminal's Ctrl-C reaches us alone, and we end things in order.
    const child = spawn(program, args, { cwd, env, detached: true, stdio: ['pipe', 'pipe', 'pipe'], ...account });
    let output = '';
    const forget = atStop(async () => {
      if (mustFinish) await once(child, 'exit');
      else endGroup(child.pid);
    });
    const settle = (/** @type {number} */ code) => {
      forget();
      child.stdout.destroy();
      child.stderr.destroy();
      resolve({ code, output });
    };
    for (const stream of [child.stdout, child.stderr]) {
      stream.setEncoding('utf8').on('data', (text) => (output += text));
    }
    child.on('error', (error) => {
      output += error.message;
      settle(127);
    });
    child.on('close', (code) => settle(code ?? 128));
    // A program that leaves a daemon behind may leave it our pipes too: they then never close.
    child.on('exit', (code) => setTimeout(() => settle(code ?? 128), 1000).unref());
    child.stdin.on('error', () => undefined).end(input ?? '');
  });
}

/**
 * Ends a program that we started and everything in its group.
 * @param {number | undefined} pid of the group's first process; nothing happens when it never started
 * @param {NodeJS.Signals} [signal]
 */
export function endGroup(pid, signal = 'SIGTERM') {
  if (pid === undefined) return;
  try {
    process.kill(-pid, signal);
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code !== 'ESRCH') throw error;
  }
}
