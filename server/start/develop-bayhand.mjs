// @ts-check
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { join } from 'node:path';
import { begin } from './begin.mjs';
import { buildWhatChanged, builds } from './build-if-changed.mjs';
import { endGroup } from './commands.mjs';
import { openDatabase, prepareDatabase } from './database.mjs';
import { toolEnv } from './npm.mjs';
import { ensurePackages } from './packages.mjs';
import { StartProblem, say, tellAndExit } from './sentences.mjs';
import { serverEnv, serverFile } from './server-process.mjs';
import { usualPort } from './settings.mjs';
import { isStopping, atStop, stopOnSignals } from './stopping.mjs';

/**
 * Keeps the server, its compiler and the app's development server running until the developer stops them.
 * @param {string} root the checkout
 */
export async function developBayhand(root) {
  stopOnSignals(() => 0);
  try {
    const { settings, dataFolder, secrets } = await begin(root);
    if (settings.port !== usualPort) {
      throw new StartProblem(`The app's proxy looks for the server on port ${usualPort}: leave BAYHAND_PORT out.`);
    }
    await ensurePackages(root, dataFolder);
    await buildWhatChanged(root, dataFolder, [builds.document, builds.server]);
    const urls = await openDatabase(root, dataFolder, settings, secrets);
    await prepareDatabase(root, urls, settings.isDemo);
    const bin = (/** @type {string} */ name) => join(root, 'node_modules/.bin', name);
    const ended = [
      keep('the compiler', bin('tsc'), ['-p', 'server/tsconfig.json', '--watch', '--preserveWatchOutput'], toolEnv()),
      keep('the server', process.execPath, ['--watch', '--watch-preserve-output', serverFile], {
        ...serverEnv(root, settings, urls, secrets),
        NODE_ENV: 'development',
      }),
      keep("the app's server", bin('ng'), ['serve', '--live-reload'], toolEnv()),
    ];
    say('Migrations run at the start alone: after a new one, stop with Ctrl-C and start again.');
    const { name, code } = await Promise.race(ended);
    if (!isStopping()) throw new StartProblem(`${name} ended by itself (code ${code}): see above, then start again.`);
  } catch (error) {
    await tellAndExit(error);
  }
}

/**
 * @param {string} name
 * @param {string} program
 * @param {string[]} args
 * @param {NodeJS.ProcessEnv} env
 */
async function keep(name, program, args, env) {
  const child = spawn(program, args, { env, detached: true, stdio: ['ignore', 'inherit', 'inherit'] });
  const exit = once(child, 'exit');
  atStop(async () => {
    endGroup(child.pid);
    await exit;
  });
  const [code] = await exit;
  return { name, code };
}
