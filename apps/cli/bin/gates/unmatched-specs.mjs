// A test that no jest project picks up looks like a passing one. This finds it.
import { spawnSync } from 'node:child_process';
import { readdirSync } from 'node:fs';
import { join, relative } from 'node:path';
import { CHECKOUT } from '../steps/checkout.mjs';

const SKIPPED = new Set(['node_modules', 'dist', '.git', '.data', 'coverage']);
const TEST_NAME = /[.-](?:spec|test)\.[cm]?[jt]sx?$/;
const WRONG_NAME = /\.test\.[cm]?[jt]sx?$/;

export function unmatchedSpecs() {
  const matched = new Set(listMatched());
  const all = filesIn(CHECKOUT).filter((path) => TEST_NAME.test(path));
  const wrong = all.filter((path) => WRONG_NAME.test(path) || !matched.has(path)).map((path) => relative(CHECKOUT, path));
  if (wrong.length === 0) return undefined;
  return `No jest project runs these, so they prove nothing (names are *.spec.ts, *.spec.tsx, *.int-spec.ts, *.e2e-spec.ts):\n${wrong.join('\n')}`;
}

function listMatched() {
  const jest = join(CHECKOUT, 'node_modules/jest/bin/jest.js');
  const { status, stdout, stderr } = spawnSync(process.execPath, [jest, '--listTests', '--json'], { cwd: CHECKOUT, encoding: 'utf8' });
  if (status !== 0) throw new Error(stderr);
  return JSON.parse(stdout);
}

function filesIn(folder) {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    if (SKIPPED.has(entry.name)) return [];
    const path = join(folder, entry.name);
    return entry.isDirectory() ? filesIn(path) : [path];
  });
}
