// @ts-check
import { createHash } from 'node:crypto';
import { statSync } from 'node:fs';
import { readFile, readdir, stat } from 'node:fs/promises';
import { join } from 'node:path';
import { readKept, writeKept } from './kept-json.mjs';
import { runNpm } from './npm.mjs';
import { StartProblem, lastLines, sayingHowLong } from './sentences.mjs';
import { serverFile } from './server-process.mjs';

/**
 * One build: the npm script that does it, what it reads and what shows that it was done.
 * @typedef {object} Build
 * @property {string} script
 * @property {string} what as said at the terminal
 * @property {string[]} inputs files and folders, from the checkout's root
 * @property {string[]} outputs files or folders that every run of it writes anew; the first one must be there
 */

const everyBuilds = ['package.json', 'package-lock.json', 'tsconfig.json'];

/** @type {Record<'document' | 'server' | 'app', Build>} */
export const builds = {
  document: {
    script: 'build:document',
    what: 'Building the checks of documents',
    inputs: [...everyBuilds, 'procedures'],
    outputs: ['procedures/document/compiled'],
  },
  server: {
    script: 'build:server',
    what: 'Building the server',
    inputs: [...everyBuilds, 'procedures', 'server'],
    outputs: [serverFile, 'dist/server/.tsbuildinfo'],
  },
  app: {
    script: 'build:app',
    what: 'Building the app',
    inputs: [...everyBuilds, 'procedures', 'src', 'angular.json', 'ngsw-config.json'],
    outputs: ['dist/app/index.html'],
  },
};

/**
 * Runs those of the builds whose inputs are not what they were at the last one, or whose output another hand has written
 * since, in the given order.
 * @param {string} root the checkout
 * @param {string} dataFolder
 * @param {Build[]} wanted
 */
export async function buildWhatChanged(root, dataFolder, wanted) {
  const stampsFile = join(dataFolder, 'builds.json');
  for (const build of wanted) {
    const hash = await hashOfInputs(root, build.inputs);
    const stamps = (await readKept(stampsFile)) ?? {};
    const stamp = () => [hash, ...build.outputs.map((output) => timeOf(join(root, output)))].join(' ');
    if (stamps[build.script] === stamp() && timeOf(join(root, build.outputs[0] ?? '')) !== undefined) continue;
    await sayingHowLong(build.what, () => runBuild(root, build));
    await writeKept(stampsFile, { ...stamps, [build.script]: stamp() });
  }
}

/**
 * One hash over the names and contents of files, whatever order the disk gives them in. Specs are not part of a build,
 * nor is what the build of the documents' checks writes.
 * @param {string} root
 * @param {string[]} inputs
 */
export async function hashOfInputs(root, inputs) {
  const hash = createHash('sha256');
  for (const input of inputs) {
    for (const file of await filesUnder(root, input)) {
      const content = await readFile(join(root, file));
      hash.update(`${file}\0${content.length}\0`).update(content);
    }
  }
  return hash.digest('hex');
}

/**
 * @param {string} root
 * @param {string} path
 * @returns {Promise<string[]>} the files' paths from the root, sorted
 */
async function filesUnder(root, path) {
  const folder = join(root, path);
  const stats = await stat(folder).catch(() => undefined);
  if (stats === undefined) return [];
  if (stats.isFile()) return [path];
  const entries = await readdir(folder, { withFileTypes: true, recursive: true });
  return entries
    .filter((entry) => entry.isFile())
    .map((entry) => join(path, join(entry.parentPath, entry.name).slice(folder.length)))
    .filter((file) => !/\.spec\.ts$|^procedures\/[^/]+\/compiled\/|^server\/start\//.test(file))
    .sort();
}

/** @param {string} path */
const timeOf = (path) => statSync(path, { throwIfNoEntry: false })?.mtimeMs;

/**
 * @param {string} root
 * @param {Build} build
 */
async function runBuild(root, { script, what }) {
  const { code, output } = await runNpm(root, ['run', '--silent', script]);
  if (code === 0) return;
  const why = /ENOSPC|No space left/.test(output)
    ? 'the disk is full. Make room, then run the same command again.'
    : `it failed, and "npm run ${script}" shows the same:\n${lastLines(output, 40)}`;
  throw new StartProblem(`${what}: ${why}`);
}
