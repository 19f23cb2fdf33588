// @ts-check
import { mkdir, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { ensureDataFolder } from '../../server/start/data-folder.mjs';
import { toolEnv } from '../../server/start/npm.mjs';
import { ensurePackages } from '../../server/start/packages.mjs';
import { say, tellAndExit } from '../../server/start/sentences.mjs';
import { isStopping, stopAll, stopOnSignals } from '../../server/start/stopping.mjs';
import { ensureChromium } from './ensure-chromium.mjs';
import { closingLine, ledgerOf, sum } from './ledger.mjs';
import { runPart } from './run-part.mjs';
import { runSideBySide } from './side-by-side.mjs';
import { startTestCluster } from './test-cluster.mjs';
import { testParts } from './test-parts.mjs';

/** What the machine has; a part that uses both by itself takes both. */
const cores = 2;

/**
 * Runs every part of the tests and ends the process: with 0 only when every part gave a result and nothing failed.
 * @param {string} root the checkout
 */
export async function runAllTests(root) {
  stopOnSignals(() => 130);
  try {
    const beganMs = performance.now();
    /** @type {import('./ledger.mjs').LedgerRow[]} */
    const rows = [];
    const timed = async (/** @type {string} */ name, /** @type {() => Promise<unknown>} */ work) => {
      const partBeganMs = performance.now();
      await work();
      rows.push({ name, seconds: (performance.now() - partBeganMs) / 1000 });
    };
    const results = join(root, 'test-results');
    let databaseUrl = '';
    await timed('set up: packages', () => ensurePackages(root, ensureDataFolder(root)));
    await timed('set up: Chromium', ensureChromium);
    await timed('set up: PostgreSQL', async () => (databaseUrl = (await startTestCluster()).url));
    await rm(results, { recursive: true, force: true });
    await mkdir(results, { recursive: true });
    const env = { ...withoutTheDevelopersOwn(toolEnv()), BAYHAND_TEST_DATABASE_URL: databaseUrl };
    const parts = await runSideBySide(testParts(results), cores, (part) => runPart(part, { root, results, env }));
    if (isStopping()) return;
    await stopAll();
    rows.push(...parts);
    say(ledgerOf(rows, (performance.now() - beganMs) / 1000));
    const counts = sum(parts);
    say(closingLine(counts));
    process.exitCode = counts.failed > 0 || counts.passed === 0 ? 1 : 0;
  } catch (error) {
    // The set-up itself failed: that is one failure, and nothing else was tried.
    process.on('exit', () => say(closingLine({ passed: 0, failed: 1, skipped: 0 })));
    await tellAndExit(error);
  }
}

/**
 * Leaves out what would lead the tests to a database or an address that somebody uses.
 * @param {NodeJS.ProcessEnv} env
 */
function withoutTheDevelopersOwn(env) {
  const isOwn = (/** @type {string} */ name) => /^(DATABASE_|BAYHAND_|PG|PORT$|HOST$|NODE_ENV$)/.test(name);
  return Object.fromEntries(Object.entries(env).filter(([name]) => !isOwn(name)));
}
