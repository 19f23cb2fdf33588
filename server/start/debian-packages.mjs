// @ts-check
import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';
import { runCommand } from './commands.mjs';
import { StartProblem, lastLines, sayingHowLong } from './sentences.mjs';

/**
 * Installs Debian packages where what they bring is missing. Only root can; anyone else is told the one command.
 * @param {object} wanted
 * @param {string} wanted.what its name in a sentence, as `PostgreSQL`
 * @param {string[]} wanted.packages
 * @param {() => boolean} wanted.isThere whether this machine has it already
 * @param {() => Promise<() => Promise<void>>} [wanted.before] prepares the machine; what it returns undoes that
 */
export async function ensureDebianPackages({ what, packages, isThere, before }) {
  if (isThere()) return;
  if (!isOnPath('apt-get')) {
    throw new StartProblem(
      `Bayhand needs ${what}, and this machine has no apt-get to install it with: install it, then run the same command again.`,
    );
  }
  if (process.getuid?.() !== 0) {
    throw new StartProblem(
      `Bayhand needs ${what}, and only root may install it: run\n  ${installCommand(packages)}\nthen the same command again.`,
    );
  }
  await sayingHowLong(`Installing ${what} from Debian's packages`, async () => {
    const after = await before?.();
    try {
      // One source of several that can't be reached is no reason to stop: the installation will tell.
      const update = await aptGet(['update']);
      const install = await aptGet(['install', '-y', '--no-install-recommends', ...packages]);
      if (install.code !== 0) {
        throw new StartProblem(
          `Debian's packages did not bring ${what}: ${lastLines(update.code === 0 ? install.output : update.output + install.output)}\nRun\n  ${installCommand(packages)}\nto see why, then the same command again.`,
        );
      }
    } finally {
      await after?.();
    }
  });
  if (!isThere()) {
    throw new StartProblem(`Debian's packages (${packages.join(', ')}) were installed but brought no ${what}.`);
  }
}

/**
 * Whether a program of this name can be started.
 * @param {string} program
 */
export function isOnPath(program) {
  return (process.env['PATH'] ?? '').split(delimiter).some((folder) => isExecutable(join(folder, program)));
}

/**
 * Whether this file can be started.
 * @param {string} path
 */
export function isExecutable(path) {
  try {
    accessSync(path, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}

/** @param {string[]} packages */
const installCommand = (packages) => `sudo sh -c 'apt-get update && apt-get install -y ${packages.join(' ')}'`;

/** @param {string[]} args */
const aptGet = (args) =>
  runCommand('apt-get', ['-o', 'DPkg::Lock::Timeout=300', ...args], {
    env: { ...process.env, DEBIAN_FRONTEND: 'noninteractive' },
    mustFinish: true,
  });
