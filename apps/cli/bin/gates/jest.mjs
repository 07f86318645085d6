// All jest projects in one run, two at a time, counted from jest's own report.
import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { CHECKOUT } from '../steps/checkout.mjs';

const WORKERS = 2;
/** Not a measure of speed: a busy machine must not turn a slow test into a failed one. */
const TEST_LIMIT_MS = 60_000;

/** @returns {Promise<{ passed: number, failed: number, problem?: string }>} */
export async function runJest() {
  const folder = mkdtempSync(join(tmpdir(), 'proofplate-jest-'));
  const report = join(folder, 'report.json');
  try {
    const jest = join(CHECKOUT, 'node_modules/jest/bin/jest.js');
    const args = [jest, '--ci', '--json', `--outputFile=${report}`, `--maxWorkers=${WORKERS}`, `--testTimeout=${TEST_LIMIT_MS}`];
    const child = spawn(process.execPath, args, { cwd: CHECKOUT, stdio: ['ignore', 'ignore', 'inherit'] });
    const [status] = await once(child, 'exit');
    if (!existsSync(report)) return { passed: 0, failed: 1, problem: `jest ended with ${status} and without a report` };
    return verdict(JSON.parse(readFileSync(report, 'utf8')), status);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

function verdict(report, status) {
  const passed = report.numPassedTests;
  // A skipped test proves nothing, and a suite that could not even start has no tests to count.
  const skipped = report.numPendingTests + report.numTodoTests;
  const failed = report.numFailedTests + report.numRuntimeErrorTestSuites + skipped;
  if (failed > 0) {
    const skippedNote = skipped > 0 ? `, ${skipped} skipped` : '';
    return {
      passed,
      failed,
      problem: `${report.numFailedTests} tests failed, ${report.numRuntimeErrorTestSuites} suites did not run${skippedNote}`,
    };
  }
  return status === 0 ? { passed, failed } : { passed, failed: 1, problem: `jest ended with ${status} though every test passed` };
}
