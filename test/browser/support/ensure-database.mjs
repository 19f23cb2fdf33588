// @ts-check
import { stopAll, stopOnSignals } from '../../../server/start/stopping.mjs';
import { startTestCluster } from '../../support/test-cluster.mjs';

/**
 * Before all browser tests: where `npm test` has not given a PostgreSQL already, starts a fresh one. What it returns
 * removes it again.
 */
export default async function ensureDatabase() {
  if (process.env['BAYHAND_TEST_DATABASE_URL']) return undefined;
  stopOnSignals(() => 130);
  process.env['BAYHAND_TEST_DATABASE_URL'] = (await startTestCluster()).url;
  return stopAll;
}
