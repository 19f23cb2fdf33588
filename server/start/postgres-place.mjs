// @ts-check
import { createHash } from 'node:crypto';
import { existsSync } from 'node:fs';
import { chmod, chown, mkdir } from 'node:fs/promises';
import { join } from 'node:path';
import { runCommand } from './commands.mjs';
import { readKept, writeKept } from './kept-json.mjs';

/** @typedef {import('./commands.mjs').Account} Account */

const folderForAll = '/var/lib/bayhand';

/**
 * The folder that holds this checkout's cluster, if one was chosen before. A checkout that was copied, and so brings the
 * note of its original along, gets a cluster of its own.
 * @param {string} root the checkout
 * @param {string} dataFolder
 * @returns {Promise<string | undefined>}
 */
export async function knownPlace(root, dataFolder) {
  const inside = join(dataFolder, 'postgres');
  const note = await readKept(join(dataFolder, 'cluster.json'));
  if (typeof note?.['folder'] !== 'string') return existsSync(inside) ? inside : undefined;
  const isOriginals = note['checkout'] !== root && existsSync(String(note['checkout']));
  return isOriginals || !existsSync(note['folder']) ? undefined : note['folder'];
}

/**
 * Makes the folder for a new cluster: inside the checkout, or under /var/lib where the account can't enter the checkout.
 * @param {string} root
 * @param {string} dataFolder
 * @param {Account} account who will run the cluster
 * @returns {Promise<string>}
 */
export async function choosePlace(root, dataFolder, account) {
  const inside = join(dataFolder, 'postgres');
  await makeFolder(inside, account);
  if (await canWriteIn(inside, account)) return inside;
  const outside = join(folderForAll, createHash('sha256').update(root).digest('hex').slice(0, 16));
  await mkdir(folderForAll, { recursive: true, mode: 0o755 });
  await makeFolder(outside, account);
  await writeKept(join(dataFolder, 'cluster.json'), { folder: outside, checkout: root });
  return outside;
}

/**
 * @param {string} folder
 * @param {Account} account
 */
async function makeFolder(folder, { uid, gid }) {
  await mkdir(folder, { recursive: true, mode: 0o700 });
  await chmod(folder, 0o700);
  if (uid !== undefined && gid !== undefined) await chown(folder, uid, gid);
}

/**
 * @param {string} folder
 * @param {Account} account
 */
async function canWriteIn(folder, account) {
  const { code } = await runCommand('test', ['-w', folder], { account });
  return code === 0;
}
