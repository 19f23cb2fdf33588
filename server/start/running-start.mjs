// @ts-check
import { readFileSync, readlinkSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { StartProblem, say } from './sentences.mjs';
import { atStop } from './stopping.mjs';

/**
 * Makes sure that one start at a time works in this checkout, and ends the server that a killed one left running.
 * @param {string} root the checkout
 * @param {string} dataFolder
 * @returns {Promise<{ noteServer: (pid: number) => void }>} takes the server's process id, for the start after a kill
 */
export async function beTheOnlyStart(root, dataFolder) {
  const path = join(dataFolder, 'running.json');
  const mine = JSON.stringify({ start: process.pid });
  while (!created(path, mine)) {
    const { start, server } = readNote(path);
    if (isOurs(start, root, /server\/start\/(start|dev)\.mjs/)) {
      throw new StartProblem(
        `Bayhand already runs from this folder: stop it with Ctrl-C where it was started, or with "kill ${start}".`,
      );
    }
    if (isOurs(server, root, /dist\/server\/server\/main\.js/)) {
      say(`An earlier start was killed and left its server running (process ${server}): stopping it.`);
      await end(server);
    }
    rmSync(path, { force: true });
  }
  atStop(() => rmSync(path, { force: true }));
  return { noteServer: (pid) => writeFileSync(path, JSON.stringify({ start: process.pid, server: pid })) };
}

/**
 * @param {string} path
 * @param {string} content
 */
function created(path, content) {
  try {
    writeFileSync(path, content, { flag: 'wx', mode: 0o600 });
    return true;
  } catch (error) {
    if (/** @type {NodeJS.ErrnoException} */ (error).code === 'EEXIST') return false;
    throw error;
  }
}

/**
 * @param {string} path
 * @returns {{ start: number, server: number }} zero where nothing is noted
 */
function readNote(path) {
  try {
    const note = JSON.parse(readFileSync(path, 'utf8'));
    return { start: Number(note.start) || 0, server: Number(note.server) || 0 };
  } catch {
    return { start: 0, server: 0 };
  }
}

/**
 * Whether the process lives, was started by this command and works in this checkout: an id alone may be anybody's by now.
 * @param {number} pid
 * @param {string} root
 * @param {RegExp} command
 */
function isOurs(pid, root, command) {
  if (pid <= 0 || pid === process.pid) return false;
  try {
    return command.test(readFileSync(`/proc/${pid}/cmdline`, 'utf8')) && readlinkSync(`/proc/${pid}/cwd`) === root;
  } catch {
    return false;
  }
}

/** @param {number} pid */
async function end(pid) {
  process.kill(pid, 'SIGTERM');
  for (let tries = 0; tries < 100; tries += 1) {
    await wait(100);
    if (!lives(pid)) return;
  }
  process.kill(pid, 'SIGKILL');
  await wait(200);
}

/** @param {number} pid */
function lives(pid) {
  try {
    return !/\) Z /.test(readFileSync(`/proc/${pid}/stat`, 'utf8'));
  } catch {
    return false;
  }
}
