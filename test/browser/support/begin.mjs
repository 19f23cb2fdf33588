// @ts-check
import { stopAll, stopOnSignals } from '../../../server/start/stopping.mjs';
import { ensureChromium } from '../../support/ensure-chromium.mjs';
import { startTestCluster } from '../../support/test-cluster.mjs';

/**
 * Before all browser tests: where `npm test` has not given a PostgreSQL already, sees to Chromium and starts a fresh
 * PostgreSQL. What it returns removes that again.
 */
export default async function begin() {
  if (process.env['BAYHAND_TEST_DATABASE_URL']) return undefined;
  stopOnSignals(() => 130);
  await ensureChromium();
  process.env['BAYHAND_TEST_DATABASE_URL'] = (await startTestCluster()).url;
  return stopAll;
}
