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
  try {
    mkdirSync(folder, { recursive: true });
    accessSync(folder, constants.W_OK | constants.X_OK);
  } catch (error) {
    throw new StartProblem(folderProblem(folder, /** @type {NodeJS.ErrnoException} */ (error).code));
  }
  const { bavail, bsize } = statfsSync(folder);
  const freeMegabytes = Math.floor((bavail * bsize) / 1_000_000);
  if (freeMegabytes < neededMegabytes) {
    throw new StartProblem(
      `The disk that holds ${root} has ${freeMegabytes} MB free, and Bayhand needs ${neededMegabytes}: make room, then run the same command again.`,
    );
  }
  return folder;
}

/**
 * @param {string} folder
 * @param {string | undefined} code the system's error code
 */
function folderProblem(folder, code) {
  switch (code) {
    case 'EACCES':
    case 'EPERM':
      return `This account may not write in ${folder}: run the same command as the account that owns it.`;
    case 'EROFS':
      return `The disk that holds ${folder} is read-only: put Bayhand's folder on one that can be written.`;
    case 'ENOSPC':
      return `The disk that holds ${folder} is full: make room, then run the same command again.`;
    case 'EEXIST':
    case 'ENOTDIR':
      return `${folder} is not a folder: move it away, then run the same command again.`;
    default:
      return `${folder} can't be made (${code}): make it by hand, then run the same command again.`;
  }
}
