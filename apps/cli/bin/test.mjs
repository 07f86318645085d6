// npm test: installs what is missing, then every check in order. It stops at the first that fails and says which.
import { ensureChromium, ensurePackages, ensurePostgres, requireNode } from './steps/requirements.mjs';

const say = (line) => console.log(line);
const count = { passed: 0, failed: 0 };
const startedAt = performance.now();
let cluster;

for (const signal of ['SIGINT', 'SIGTERM']) process.once(signal, () => finish(1));
try {
  await runAll();
} catch (error) {
  count.failed += 1;
  console.error(error instanceof Error ? error.message : error);
}
finish(count.failed > 0 ? 1 : 0);

async function runAll() {
  requireNode();
  ensurePackages(say);
  ensurePostgres(say);
  const { problemOf } = await import('./gates/command.mjs');
  const { openApiDrift, migrationDrift } = await import('./gates/drift.mjs');
  const { unmatchedSpecs } = await import('./gates/unmatched-specs.mjs');
  const npm = (script) => () => problemOf('npm', ['run', '--silent', script]);
  await gate('format and lint', npm('lint'));
  await gate('build', npm('build'));
  await gate('types', () => problemOf(process.execPath, ['apps/cli/bin/typecheck.mjs']));
  await gate('import law', npm('imports'));
  await gate('no test that nobody runs', unmatchedSpecs);
  await gate('the api client is up to date', openApiDrift);
  await gate('the migrations are up to date', migrationDrift);
  await runTests();
  await runBrowser();
}

async function gate(name, check) {
  const problem = await Promise.resolve()
    .then(check)
    .catch((error) => String(error?.message ?? error));
  if (problem) throw new Error(`${problem}\n\nStopped at: ${name}`);
  count.passed += 1;
  say(`ok  ${name}  (${elapsedS()} s)`);
}

async function runTests() {
  const { startThrowAwayCluster } = await import('../../../db/postgres/cluster.mjs');
  const { runJest } = await import('./gates/jest.mjs');
  cluster = await startThrowAwayCluster();
  process.env.PROOFPLATE_TEST_PG = cluster.url();
  const { passed, failed, problem } = await runJest();
  count.passed += passed;
  // The one that is thrown below is counted where it is caught.
  count.failed += Math.max(0, failed - 1);
  if (problem) throw new Error(`${problem}\n\nStopped at: tests`);
  say(`ok  ${passed} tests  (${elapsedS()} s)`);
}

async function runBrowser() {
  const { listJourneys, runJourneys } = await import('./gates/journeys.mjs');
  if (listJourneys().length === 0) return;
  await gate('journeys in a browser', () => runJourneys({ chromium: ensureChromium(say), say }));
}

function elapsedS() {
  return Math.round((performance.now() - startedAt) / 1000);
}

function finish(exitCode) {
  cluster?.stop();
  cluster = undefined;
  say(`\n${count.passed} passed, ${count.failed} failed`);
  process.exit(exitCode);
}
