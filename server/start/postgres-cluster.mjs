// @ts-check
import { existsSync, statfsSync } from 'node:fs';
import { readFile, rename, rm, stat, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { runCommand } from './commands.mjs';
import { freePort } from './free-port.mjs';
import { postgresFailure } from './postgres-failure.mjs';
import { clearEarlierRun, isRunning } from './postgres-process.mjs';
import { StartProblem, fileProblem } from './sentences.mjs';
import { atStop } from './stopping.mjs';

/**
 * A PostgreSQL cluster of ours, running or not.
 * @typedef {object} Cluster
 * @property {string} place the folder that holds `cluster` (its files) and `postgres.log`
 * @property {string} programs the folder of the server's programs
 * @property {import('./commands.mjs').Account} account who runs it
 */

/**
 * What a running cluster was started with.
 * @typedef {Record<string, string | number>} Settings server settings by name
 */

/** Names inside the cluster's place. */
const filesName = 'cluster';
const logName = 'postgres.log';

const startTries = 5;
const startLimitS = 300;

/** @param {Cluster} cluster */
const filesOf = ({ place }) => join(place, filesName);

/** @param {Cluster} cluster */
const logOf = ({ place }) => join(place, logName);

/**
 * The PostgreSQL version that made the cluster in this folder; undefined when there is none.
 * @param {string} place
 * @returns {Promise<number | undefined>}
 */
export async function versionOfCluster(place) {
  const folder = join(place, filesName);
  if (!existsSync(folder)) return undefined;
  const text = await readFile(join(folder, 'PG_VERSION'), 'utf8').catch(() => '');
  const version = Number(text.trim());
  if (Number.isInteger(version) && version > 0) return version;
  throw new StartProblem(postgresFailure('The database does not start', 'is not a valid data directory', place));
}

/**
 * Makes the cluster's files, whole or not at all: a start that is ended half-way leaves nothing that looks like a database.
 * @param {Cluster} cluster
 * @param {object} contents
 * @param {string[]} contents.access the lines of pg_hba.conf
 * @param {string[]} contents.statements SQL run once, offline, as the superuser
 */
export async function createCluster(cluster, { access, statements }) {
  const halfMadeName = 'cluster.half-made';
  const halfMade = join(cluster.place, halfMadeName);
  const failed = `The database can't be made in ${cluster.place}`;
  await rm(halfMade, { recursive: true, force: true });
  await must(cluster, failed, 'initdb', [
    ...['--pgdata', halfMadeName, '--encoding', 'UTF8', '--locale', 'C.UTF-8', '--username', 'postgres'],
    ...['--auth', 'reject', '--data-checksums', '--no-instructions'],
  ]);
  await writeFile(join(halfMade, 'pg_hba.conf'), `${access.join('\n')}\n`);
  await runOffline(cluster, statements, halfMadeName);
  await rename(halfMade, filesOf(cluster));
}

/**
 * Runs SQL as the superuser while the cluster is stopped. So the superuser needs no password and no way in from outside.
 * @param {Cluster} cluster
 * @param {string[]} statements each on one line
 * @param {string} [files] the name of the folder inside the cluster's place
 */
export async function runOffline(cluster, statements, files = filesName) {
  const failed = `The database in ${cluster.place} can't be set up`;
  const input = statements.map((statement) => `${statement}\n`).join('');
  const output = await must(cluster, failed, 'postgres', ['--single', '-D', files, 'postgres'], input);
  // In this mode a refused statement does not show in the exit code.
  if (/^.*\b(ERROR|FATAL|PANIC):/m.test(output)) throw new StartProblem(postgresFailure(failed, output, cluster.place));
}

/**
 * Starts the cluster on 127.0.0.1 at a port that is free, without sockets in the file system. It is stopped when
 * everything is.
 * @param {Cluster} cluster
 * @param {Settings} [settings]
 * @returns {Promise<{ port: number, stop: () => Promise<void> }>}
 */
export async function startCluster(cluster, settings = {}) {
  // A start that was killed may have left its cluster running, or the note of one.
  if ((await clearEarlierRun(filesOf(cluster), cluster.account)) === 'running') await stopCluster(cluster);
  const stop = () => stopCluster(cluster);
  const forget = atStop(stop);
  const logFrom = await beginLog(cluster);
  let output = '';
  for (let tries = 0; tries < startTries; tries += 1) {
    const port = await freePort();
    const all = { listen_addresses: '127.0.0.1', port, unix_socket_directories: '', ...settings };
    const options = Object.entries(all).map(([name, value]) => `-c ${name}=${value}`);
    const start = await run(cluster, 'pg_ctl', [
      ...['start', '-D', filesName, '-l', logName, '-w', '-t', String(startLimitS)],
      ...['-o', options.join(' ')],
    ]);
    if (start.code === 0) {
      return {
        port,
        stop: async () => {
          forget();
          await stop();
        },
      };
    }
    output = start.output + (await readLog(cluster)).slice(logFrom);
    // Another program may have taken the port between the look and the start; the last processes of a killed cluster
    // may take a moment to go.
    if (/pre-existing shared memory block/.test(output)) await wait(1000);
    else if (!/Address already in use/.test(output)) break;
  }
  if (isOnFullDisk(cluster)) throw new StartProblem(String(fileProblem('ENOSPC', cluster.place)));
  throw new StartProblem(postgresFailure(`The database in ${cluster.place} does not start`, output, cluster.place));
}

/**
 * Stops the cluster if it runs; clients are sent away, nothing committed is lost.
 * @param {Cluster} cluster
 */
export async function stopCluster(cluster) {
  if (!(await isRunning(filesOf(cluster), cluster.account))) return;
  const stop = ['stop', '-D', filesName, '-w', '-t', '60'];
  const fast = await run(cluster, 'pg_ctl', [...stop, '-m', 'fast']);
  if (fast.code === 0 || !(await isRunning(filesOf(cluster), cluster.account))) return;
  // Files stay whole: the next start recovers from the log as after a power cut.
  const immediate = await run(cluster, 'pg_ctl', [...stop, '-m', 'immediate']);
  if (immediate.code !== 0) throw new StartProblem(`The database in ${cluster.place} does not stop: ${fast.output}`);
}

/** @param {Cluster} cluster */
async function beginLog(cluster) {
  const log = logOf(cluster);
  const size = await stat(log).then(
    (stats) => stats.size,
    () => 0,
  );
  if (size < 10_000_000) return size;
  await rename(log, `${log}.1`);
  return 0;
}

/**
 * Whether the disk is full: PostgreSQL then can't even write into its log that it is.
 * @param {Cluster} cluster
 */
function isOnFullDisk({ place }) {
  const { bavail, bsize } = statfsSync(place);
  return bavail * bsize < 1_000_000;
}

/** @param {Cluster} cluster */
const readLog = (cluster) => readFile(logOf(cluster), 'utf8').catch(() => '');

/**
 * @param {Cluster} cluster
 * @param {string} failed the sentence's beginning
 * @param {string} program
 * @param {string[]} args
 * @param {string} [input]
 */
async function must(cluster, failed, program, args, input) {
  const { code, output } = await run(cluster, program, args, input);
  if (code !== 0) throw new StartProblem(postgresFailure(failed, output, cluster.place));
  return output;
}

/**
 * Runs one of PostgreSQL's programs inside the cluster's place, where names need no path: some of the programs hand
 * paths to a shell, which stumbles over a checkout with a dollar sign or a quote in its path.
 * @param {Cluster} cluster
 * @param {string} program
 * @param {string[]} args
 * @param {string} [input]
 */
function run({ place, programs, account }, program, args, input) {
  const env = Object.fromEntries(Object.entries(process.env).filter(([name]) => !name.startsWith('PG')));
  return runCommand(join(programs, program), args, { account, cwd: place, env: { ...env, LC_ALL: 'C' }, input });
}
