// @ts-check
import { chmod, readFile, rename, writeFile } from 'node:fs/promises';

/**
 * Reads a small JSON file of ours; undefined when there is none, or when it is damaged and must be made anew.
 * @param {string} path
 * @returns {Promise<Record<string, unknown> | undefined>}
 */
export async function readKept(path) {
  try {
    const value = JSON.parse(await readFile(path, 'utf8'));
    return typeof value === 'object' && value !== null ? value : undefined;
  } catch (error) {
    if (error instanceof SyntaxError || /** @type {NodeJS.ErrnoException} */ (error).code === 'ENOENT')
      return undefined;
    throw error;
  }
}

/**
 * Writes it whole or not at all, readable by its owner alone.
 * @param {string} path
 * @param {Record<string, unknown>} value
 */
export async function writeKept(path, value) {
  const halfWay = `${path}.new`;
  await writeFile(halfWay, `${JSON.stringify(value, undefined, 2)}\n`, { mode: 0o600 });
  await chmod(halfWay, 0o600);
  await rename(halfWay, path);
}
