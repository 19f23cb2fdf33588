// @ts-check
import { statSync } from 'node:fs';
import { runCommand } from './commands.mjs';
import { StartProblem } from './sentences.mjs';

/** @typedef {import('./commands.mjs').Account} Account */

/**
 * Who runs the cluster. PostgreSQL refuses to run as root, so root runs it as the account that owns the cluster's folder,
 * and a new one as `postgres`, which Debian's package makes. Anyone else runs it as oneself.
 * @param {string} [place] the cluster's folder, if there is one already
 * @returns {Promise<Account>}
 */
export async function clusterAccount(place) {
  const owner = place === undefined ? undefined : ownerOf(place);
  const self = process.getuid?.();
  if (self !== 0) {
    if (owner === undefined || owner.uid === self) return {};
    throw new StartProblem(
      `The database in ${place} belongs to another account (user id ${owner.uid}): run the same command as that account, or as root.`,
    );
  }
  if (owner !== undefined && owner.uid !== 0) return owner;
  return { uid: await idOf('-u'), gid: await idOf('-g') };
}

/** @param {string} place */
function ownerOf(place) {
  const stats = statSync(place, { throwIfNoEntry: false });
  return stats === undefined ? undefined : { uid: stats.uid, gid: stats.gid };
}

/** @param {'-u' | '-g'} which */
async function idOf(which) {
  const { code, output } = await runCommand('id', [which, 'postgres']);
  if (code === 0) return Number(output.trim());
  throw new StartProblem(
    'PostgreSQL does not run as root, and this machine has no account "postgres" to run it as: install Debian\'s postgresql package, or run the same command as another account.',
  );
}
