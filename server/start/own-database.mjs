// @ts-check
import { clusterAccount } from './postgres-account.mjs';
import { createCluster, runOffline, startCluster, versionOfCluster } from './postgres-cluster.mjs';
import { choosePlace, knownPlace } from './postgres-place.mjs';
import { programsFor } from './postgres-programs.mjs';
import { sayingHowLong } from './sentences.mjs';

/**
 * The two ways into the database: the owner's for migrations and retention, the app's for serving.
 * @typedef {{ ownerUrl: string, appUrl: string }} DatabaseUrls
 */

const access = ['host bayhand bayhand_owner,bayhand_app 127.0.0.1/32 scram-sha-256'];

/**
 * Starts this checkout's own database, made at the first start, with the PostgreSQL that this machine has. It is stopped when everything is, and its data is kept.
 * @param {string} root the checkout
 * @param {string} dataFolder
 * @param {import('./kept-secrets.mjs').Secrets & { areNew: boolean }} secrets
 * @returns {Promise<DatabaseUrls>}
 */
export async function startOwnDatabase(root, dataFolder, secrets) {
  const known = await knownPlace(root, dataFolder);
  const account = await clusterAccount(known);
  const place = known ?? (await choosePlace(root, dataFolder, account));
  const madeBy = await versionOfCluster(place);
  const cluster = { place, account, programs: programsFor(madeBy, place).folder };
  const { ownerPassword, appPassword } = secrets;
  if (madeBy === undefined) {
    const statements = [
      `CREATE ROLE bayhand_owner LOGIN PASSWORD '${ownerPassword}'`,
      `CREATE ROLE bayhand_app LOGIN PASSWORD '${appPassword}'`,
      'CREATE DATABASE bayhand OWNER bayhand_owner TEMPLATE template0',
    ];
    await sayingHowLong('Making a database', () => createCluster(cluster, { access, statements }));
  } else if (secrets.areNew) {
    // The kept passwords were lost: give the roles the new ones.
    await runOffline(cluster, [
      `ALTER ROLE bayhand_owner PASSWORD '${ownerPassword}'`,
      `ALTER ROLE bayhand_app PASSWORD '${appPassword}'`,
    ]);
  }
  const { port } = await startCluster(cluster);
  const at = `127.0.0.1:${port}/bayhand`;
  return {
    ownerUrl: `postgres://bayhand_owner:${ownerPassword}@${at}`,
    appUrl: `postgres://bayhand_app:${appPassword}@${at}`,
  };
}
