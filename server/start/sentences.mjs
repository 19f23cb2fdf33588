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
  const told =
    error instanceof StartProblem
      ? error.message
      : `Bayhand's start has a fault: ${error instanceof Error ? error.stack : String(error)}`;
  process.stderr.write(`${told}\n`);
  await stopAll();
  process.exit(1);
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
