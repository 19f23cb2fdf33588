// @ts-check
import { readFileSync } from 'node:fs';

/** @typedef {() => unknown} Undoing */

/** @type {Undoing[]} */
const undoings = [];
/** @type {Promise<void> | undefined} */
let stopping;

/** Whether the person, or a failure, has already begun to stop everything. */
export const isStopping = () => stopping !== undefined;

/**
 * Registers what must be undone when the process ends, whatever ends it. Undone in reverse order.
 * @param {Undoing} undoing
 * @returns {() => void} takes it off the list again, once it is undone otherwise
 */
export function atStop(undoing) {
  undoings.push(undoing);
  return () => {
    const index = undoings.indexOf(undoing);
    if (index >= 0) undoings.splice(index, 1);
  };
}

/** Undoes everything, the last thing first; asked twice, it is done once. */
export function stopAll() {
  stopping ??= undoAll();
  return stopping;
}

async function undoAll() {
  for (let undoing = undoings.pop(); undoing; undoing = undoings.pop()) {
    try {
      await undoing();
    } catch (error) {
      // One thing that can't be undone must not keep the others from it.
      process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`);
    }
  }
}

/**
 * Stops everything in order, then exits, on Ctrl-C, a polite kill, a closed terminal, or when the npm that ran us is gone.
 * @param {() => number} exitCode
 */
export function stopOnSignals(exitCode) {
  const stop = async () => {
    // A terminal sends Ctrl-C to npm and to us, and npm passes its own on: the second one is not a second wish.
    if (isStopping()) return;
    await stopAll();
    process.exit(exitCode());
  };
  process.on('SIGINT', stop).on('SIGTERM', stop).on('SIGHUP', stop);
  // npm runs us through a shell and passes signals on to that shell alone, if at all: who ends npm does not reach us.
  const runners = runnersOf();
  if (process.env['npm_lifecycle_event'] !== undefined) {
    setInterval(() => runners === runnersOf() || stop(), 500).unref();
  }
  // A closed terminal also closes the pipes: the stop goes on without words.
  for (const stream of [process.stdout, process.stderr]) stream.on('error', () => undefined);
}

/** The shell and the npm that run us; other ids as soon as one of them is gone. */
function runnersOf() {
  const shell = process.ppid;
  try {
    const stat = readFileSync(`/proc/${shell}/stat`, 'utf8');
    return `${shell} ${stat.slice(stat.lastIndexOf(')')).split(' ')[2]}`;
  } catch {
    return String(shell);
  }
}
