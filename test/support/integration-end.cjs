// After the server's specs: stops the PostgreSQL that was started for them.
module.exports = async () => {
  await globalThis.ownTestCluster?.stop();
};
