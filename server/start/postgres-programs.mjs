// @ts-check
import { readdirSync } from 'node:fs';
import { mkdir, rm, rmdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { ensureDebianPackages, isExecutable } from './debian-packages.mjs';
import { StartProblem } from './sentences.mjs';

/** The oldest PostgreSQL that Bayhand was tried with: Debian 12's. */
const oldestVersion = 15;
const debianFolder = '/usr/lib/postgresql';
const createClusterFolder = '/etc/postgresql-common/createcluster.d';

/**
 * The server programs of one PostgreSQL version.
 * @typedef {{ version: number, folder: string }} PostgresPrograms
 */

/**
 * The PostgreSQL versions on this machine that Bayhand can use, the newest first.
 * @param {string} [folder] where Debian keeps a folder for each version
 * @returns {PostgresPrograms[]}
 */
export function installedPostgres(folder = debianFolder) {
  return versionsIn(folder)
    .filter((version) => version >= oldestVersion)
    .map((version) => ({ version, folder: join(folder, String(version), 'bin') }))
    .filter((programs) => ['initdb', 'pg_ctl', 'postgres'].every((name) => isExecutable(join(programs.folder, name))))
    .sort((a, b) => b.version - a.version);
}

/** Installs PostgreSQL where no version of it will do, without the cluster that Debian starts by itself. */
export async function ensurePostgres() {
  await ensureDebianPackages({
    what: `PostgreSQL ${oldestVersion} or newer`,
    packages: ['postgresql'],
    isThere: () => installedPostgres().length > 0,
    before: withoutDebiansOwnCluster,
  });
}

/**
 * The programs for a new cluster, or those of the version that made an existing one.
 * @param {number | undefined} madeBy the version that made the cluster
 * @param {string} place the cluster's folder, for the sentence
 * @param {PostgresPrograms[]} [installed]
 * @returns {PostgresPrograms}
 */
export function programsFor(madeBy, place, installed = installedPostgres()) {
  const found = installed.find((programs) => madeBy === undefined || programs.version === madeBy);
  if (found) return found;
  const present = installed.map((programs) => programs.version).join(', ') || 'none';
  throw new StartProblem(
    `The database in ${place} was made by PostgreSQL ${madeBy}, and this machine has ${present}: install postgresql-${madeBy}, or move that folder away to begin with an empty database.`,
  );
}

async function withoutDebiansOwnCluster() {
  const file = join(createClusterFolder, 'bayhand.conf');
  const firstMade = await mkdir(createClusterFolder, { recursive: true });
  await writeFile(file, 'create_main_cluster = false\n');
  return async () => {
    await rm(file, { force: true });
    if (firstMade !== undefined) await rmdir(createClusterFolder).catch(() => undefined);
  };
}

/** @param {string} folder */
function versionsIn(folder) {
  try {
    return readdirSync(folder).map(Number).filter(Number.isInteger);
  } catch {
    return [];
  }
}
