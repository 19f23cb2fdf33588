// @ts-check
import { accessSync, constants, mkdirSync, statfsSync } from 'node:fs';
import { join } from 'node:path';
import { StartProblem } from './sentences.mjs';

/** PostgreSQL stops serving on a full disk, so a start with less than this is refused while there is still a way out. */
const neededMegabytes = 200;

/**
 * Makes the ignored folder that holds everything this checkout keeps: the database, its secrets, stamps and logs.
 * @param {string} root the checkout
 * @returns {string} its path
 */
export function ensureDataFolder(root) {
  const folder = join(root, '.data');
  mkdirSync(folder, { recursive: true });
  accessSync(folder, constants.W_OK | constants.X_OK);
  const { bavail, bsize } = statfsSync(folder);
  const freeMegabytes = Math.floor((bavail * bsize) / 1_000_000);
  if (freeMegabytes < neededMegabytes) {
    throw new StartProblem(
      `The disk that holds ${root} has ${freeMegabytes} MB free, and Bayhand needs ${neededMegabytes}: make room, then run the same command again.`,
    );
  }
  return folder;
}
