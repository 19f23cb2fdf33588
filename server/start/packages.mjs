// @ts-check
import { existsSync } from 'node:fs';
import { mkdir, rm, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { readKept } from './kept-json.mjs';
import { runNpm } from './npm.mjs';
import { StartProblem, lastLines, sayingHowLong } from './sentences.mjs';

/**
 * What npm writes down of one package.
 * @typedef {{ version?: string, integrity?: string, optional?: boolean, devOptional?: boolean }} LockedPackage
 */

// Everything is built here, so the tools are needed even where NODE_ENV says production.
const npmCiArgs = ['ci', '--include=dev', '--include=optional', '--no-audit', '--no-fund'];

/**
 * Installs exactly the locked packages where they are missing or other ones are there.
 * @param {string} root the checkout
 * @param {string} dataFolder
 */
export async function ensurePackages(root, dataFolder) {
  const locked = lockedPackages(await readKept(join(root, 'package-lock.json')));
  if (locked === undefined) {
    throw new StartProblem(`package-lock.json is missing or damaged in ${root}: take it from the repository again.`);
  }
  const installed = lockedPackages(await readKept(join(root, 'node_modules/.package-lock.json')));
  // An installation that was ended half-way can leave npm's own note behind, so it is also noted here.
  const begun = join(dataFolder, 'packages-installing');
  if (installed !== undefined && !existsSync(begun) && agree(locked, installed)) return;
  await mkdir(dataFolder, { recursive: true });
  await writeFile(begun, '');
  await sayingHowLong('Installing the packages', () => npmCi(root));
  await rm(begun);
}

/**
 * Whether everything that is locked is installed, and nothing else. Packages for other machines (`optional`) may be
 * absent.
 * @param {Record<string, LockedPackage>} locked
 * @param {Record<string, LockedPackage>} installed
 */
export function agree(locked, installed) {
  const isSame = (/** @type {string} */ path) =>
    locked[path]?.version === installed[path]?.version && locked[path]?.integrity === installed[path]?.integrity;
  const mayBeAbsent = (/** @type {LockedPackage | undefined} */ entry) =>
    Boolean(entry?.optional ?? entry?.devOptional);
  return (
    Object.keys(installed).every(isSame) &&
    Object.keys(locked).every((path) => path === '' || path in installed || mayBeAbsent(locked[path]))
  );
}

/**
 * @param {Record<string, unknown> | undefined} lockFile
 * @returns {Record<string, LockedPackage> | undefined}
 */
function lockedPackages(lockFile) {
  const packages = lockFile?.['packages'];
  return typeof packages === 'object' && packages !== null
    ? /** @type {Record<string, LockedPackage>} */ (packages)
    : undefined;
}

/** @param {string} root */
async function npmCi(root) {
  const { code, output } = await runNpm(root, npmCiArgs);
  if (code === 0) return;
  const why = /ENOSPC/.test(output)
    ? 'the disk is full. Make room, then run the same command again.'
    : /EACCES|EPERM/.test(output)
      ? `node_modules can't be written. Run the same command as the account that owns ${root}.`
      : `${lastLines(output)}\nCheck that the npm registry can be reached, then run the same command again.`;
  throw new StartProblem(`The packages can't be installed: ${why}`);
}
