// Before the server's specs: names this run, and starts a PostgreSQL of its own where `npm test` has not given one.
const { randomBytes } = require('node:crypto');

module.exports = async () => {
  process.env.BAYHAND_TEST_RUN ??= randomBytes(4).toString('hex');
  if (process.env.BAYHAND_TEST_DATABASE_URL) return;
  const { startTestCluster } = await import('./test-cluster.mjs');
  const cluster = await startTestCluster();
  process.env.BAYHAND_TEST_DATABASE_URL = cluster.url;
  globalThis.ownTestCluster = cluster;
};
