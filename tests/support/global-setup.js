// Jest does not apply its path alias to this file and what it loads, so tsx does.
require('tsx/cjs');

module.exports = async () => {
  const { startTestCluster } = require('./test-cluster.ts');
  globalThis.ritornelTestCluster = await startTestCluster();
};
