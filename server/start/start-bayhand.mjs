// @ts-check
import { join } from 'node:path';
import { begin } from './begin.mjs';
import { buildWhatChanged, builds } from './build-if-changed.mjs';
import { openDatabase, prepareDatabase } from './database.mjs';
import { ensurePackages } from './packages.mjs';
import { StartProblem, say, tellAndExit } from './sentences.mjs';
import { serverEnv, startServer } from './server-process.mjs';
import { atStop, isStopping, stopOnSignals } from './stopping.mjs';

/**
 * Brings Bayhand up and keeps it up until the person stops it.
 * @param {string} root the checkout
 */
export async function startBayhand(root) {
  let isUp = false;
  // Stopping a Bayhand that runs is what was wanted; stopping a start half-way is not.
  stopOnSignals(() => (isUp ? 0 : 130));
  atStop(() => isUp && say('Bayhand is stopped.'));
  try {
    const { settings, dataFolder, noteServer, secrets } = await begin(root);
    await ensurePackages(root, dataFolder);
    await buildWhatChanged(root, dataFolder, [builds.document, builds.server, builds.app]);
    const urls = await openDatabase(root, dataFolder, settings, secrets);
    await prepareDatabase(root, urls, settings.isDemo);
    const address = addressOf(settings);
    const log = join(dataFolder, 'server.log');
    const env = serverEnv(root, settings, urls, secrets);
    const { ended } = await startServer({ root, env, log, address, noteServer });
    isUp = true;
    atStop(() => say('Stopping Bayhand ...'));
    say(`Bayhand is at ${address}`);
    if (settings.isDemo && !isLoopback(settings.host)) {
      say("The network can reach it, and the demo's password is known to everyone: for real work, BAYHAND_DEMO=0.");
    }
    say(`Stop it with Ctrl-C; what was recorded stays. The server's log is ${log}.`);
    const code = await ended;
    if (!isStopping()) {
      throw new StartProblem(`The server ended by itself with code ${code}: ${log} says why. Run npm start again.`);
    }
  } catch (error) {
    await tellAndExit(error);
  }
}

/**
 * @param {import('./settings.mjs').StartSettings} settings
 */
function addressOf({ host, port, tls }) {
  const reachable = host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host;
  return `${tls ? 'https' : 'http'}://${reachable.includes(':') ? `[${reachable}]` : reachable}:${port}/`;
}

/** @param {string} host */
const isLoopback = (host) => /^(127\.|::1$|localhost$)/.test(host);
