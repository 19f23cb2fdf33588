// @ts-check
import { realpathSync } from 'node:fs';
import { readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { runCommand } from './commands.mjs';

/** @typedef {import('./commands.mjs').Account} Account */

const dyingTries = 20;

/** @param {string} files the folder of a cluster's files */
const noteOf = (files) => join(files, 'postmaster.pid');

/**
 * Whether a cluster runs. Its own note alone proves nothing: after a restart of the machine the process id in it may be
 * anybody's, so the process must also be at home in the cluster's folder.
 * @param {string} files the folder of its files
 * @param {Account} account who runs it
 */
export async function isRunning(files, account) {
  const noted = await notedProcess(files, account);
  return noted !== undefined && noted.home === realpathSync(files);
}

/**
 * Tells whether an earlier run still goes on, and removes the note of one whose process is dead or is another program by
 * now. A process that stays unclear is left to PostgreSQL's own judgement.
 * @param {string} files
 * @param {Account} account
 * @returns {Promise<'running' | 'cleared'>}
 */
export async function clearEarlierRun(files, account) {
  for (let tries = 0; tries < dyingTries; tries += 1) {
    const noted = await notedProcess(files, account);
    if (noted === undefined) break;
    if (noted.home === realpathSync(files)) return 'running';
    if (noted.home !== undefined || noted.isDead) {
      await rm(noteOf(files), { force: true });
      break;
    }
    // Killed a moment ago, it may be neither alive nor dead yet.
    await wait(100);
  }
  return 'cleared';
}

/**
 * The process that PostgreSQL's own note names: the folder it works in (undefined: none any more, or not ours to see), and
 * whether it is dead. Dead but not collected, as in a container whose first process collects nothing, PostgreSQL would
 * take it for alive.
 * @param {string} files
 * @param {Account} account
 */
async function notedProcess(files, account) {
  const note = await readFile(noteOf(files), 'utf8').catch(() => '');
  const pid = Number(note.split('\n', 1)[0]);
  if (!Number.isInteger(pid) || pid <= 0) return undefined;
  // Asked as the cluster's account: a container's root may not look into another account's processes.
  const { code, output } = await runCommand('readlink', [`/proc/${pid}/cwd`], { account });
  const state = await readFile(`/proc/${pid}/stat`, 'utf8').catch(() => '');
  return { home: code === 0 ? output.trim() : undefined, isDead: state === '' || /\) [ZX] /.test(state) };
}
