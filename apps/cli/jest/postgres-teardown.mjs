export default async function tearDown() {
  const cluster = await globalThis.proofplateCluster;
  globalThis.proofplateCluster = undefined;
  cluster?.stop();
}
