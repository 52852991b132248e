module.exports = async () => {
  await globalThis.ritornelTestCluster?.end();
};
