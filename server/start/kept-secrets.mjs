// @ts-check
import { randomBytes } from 'node:crypto';
import { join } from 'node:path';
import { readKept, writeKept } from './kept-json.mjs';

/**
 * What this checkout keeps secret, made once: the passwords of the two database roles and what signs access tokens.
 * @typedef {{ ownerPassword: string, appPassword: string, tokenSecret: string }} Secrets
 */

/** A secret of 256 bits that needs no quoting in a URL or in SQL. */
export const newSecret = () => randomBytes(32).toString('base64url');

/**
 * Reads the secrets, or makes and keeps them.
 * @param {string} dataFolder
 * @returns {Promise<Secrets & { areNew: boolean }>}
 */
export async function keptSecrets(dataFolder) {
  const path = join(dataFolder, 'secrets.json');
  const kept = (await readKept(path)) ?? {};
  const { ownerPassword, appPassword, tokenSecret } = kept;
  if (isSecret(ownerPassword) && isSecret(appPassword) && isSecret(tokenSecret)) {
    return { ownerPassword, appPassword, tokenSecret, areNew: false };
  }
  const made = { ownerPassword: newSecret(), appPassword: newSecret(), tokenSecret: newSecret() };
  await writeKept(path, made);
  return { ...made, areNew: true };
}

/**
 * @param {unknown} value
 * @returns {value is string}
 */
const isSecret = (value) => typeof value === 'string' && /^[\w-]{43}$/.test(value);
