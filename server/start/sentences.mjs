// @ts-check
import { isStopping, stopAll } from './stopping.mjs';

/** What keeps Bayhand from starting, as one sentence for a person, with the way out. Anything else thrown is a fault of ours. */
export class StartProblem extends Error {
  /** @override */
  name = 'StartProblem';
}

/**
 * Prints one sentence for the person at the terminal.
 * @param {string} sentence
 */
export function say(sentence) {
  process.stdout.write(`${sentence}\n`);
}

/**
 * Ends the process with exit code 1 after undoing what was begun. A problem is told as its sentence alone, a fault with
 * its stack. What fails because the person has just asked to stop is not told at all.
 * @param {unknown} error
 */
export async function tellAndExit(error) {
  if (isStopping()) return;
  process.stderr.write(`${sentenceOf(error)}\n`);
  await stopAll();
  process.exit(1);
}

/** @param {unknown} error */
function sentenceOf(error) {
  if (error instanceof StartProblem) return error.message;
  const { code, path, stack } = /** @type {NodeJS.ErrnoException} */ (error);
  const problem = path === undefined ? undefined : fileProblem(code, path);
  return problem ?? `Bayhand's start has a fault: ${stack ?? String(error)}`;
}

/**
 * Why a file or folder can't be used, as a sentence with the way out; undefined for a code that a person can't mend.
 * @param {string | undefined} code the system's error code
 * @param {string} path
 */
export function fileProblem(code, path) {
  switch (code) {
    case 'EACCES':
    case 'EPERM':
      return `This account may not use ${path}: run the same command as the account that owns it.`;
    case 'EROFS':
      return `The disk that holds ${path} is read-only: put Bayhand's folder on one that can be written.`;
    case 'ENOSPC':
    case 'EDQUOT':
      return `The disk that holds ${path} is full: make room, then run the same command again.`;
    case 'EEXIST':
    case 'EISDIR':
    case 'ENOTDIR':
      return `Something else is in the place of ${path}: move it away, then run the same command again.`;
    default:
      return undefined;
  }
}

/**
 * The last lines of a program's output, for a sentence that quotes them.
 * @param {string} output
 * @param {number} [count] how many lines at most
 */
export function lastLines(output, count = 20) {
  return output.trimEnd().split('\n').slice(-count).join('\n');
}

/**
 * Runs one slow piece of work and says what was done and how long it took.
 * @template T
 * @param {string} begun said before, as `Installing PostgreSQL`
 * @param {() => Promise<T>} work
 * @returns {Promise<T>}
 */
export async function sayingHowLong(begun, work) {
  say(`${begun} ...`);
  const beganMs = performance.now();
  const result = await work();
  say(`${begun}: done in ${((performance.now() - beganMs) / 1000).toFixed(1)} s.`);
  return result;
}
