// What is generated and committed must be what the sources generate today.
import { cpSync, existsSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, relative } from 'node:path';
import { CHECKOUT } from '../steps/checkout.mjs';
import { problemOf } from './command.mjs';

const API_FILES = ['packages/api-client/openapi.json', 'packages/api-client/src/generated/api.ts'].map((path) => join(CHECKOUT, path));
const MIGRATIONS = join(CHECKOUT, 'db/migrations');

export function openApiDrift() {
  const committed = API_FILES.map((path) => (existsSync(path) ? readFileSync(path, 'utf8') : undefined));
  try {
    const problem = problemOf('npm', ['run', '--silent', 'openapi'], { env: { LOG_LEVEL: 'silent' } });
    if (problem) return problem;
    const changed = API_FILES.filter((path, index) => readFileSync(path, 'utf8') !== committed[index]);
    if (changed.length === 0) return undefined;
    return `The api has changed and its client has not: run "npm run openapi" and commit\n${changed.map((path) => relative(CHECKOUT, path)).join('\n')}`;
  } finally {
    // A check leaves the working tree as it was.
    for (const [index, text] of committed.entries()) {
      if (text === undefined) rmSync(API_FILES[index], { force: true });
      else writeFileSync(API_FILES[index], text);
    }
  }
}

export function migrationDrift() {
  const copy = mkdtempSync(join(tmpdir(), 'proofplate-migrations-'));
  try {
    cpSync(MIGRATIONS, copy, { recursive: true });
    const out = relative(join(CHECKOUT, 'db'), copy);
    const env = { PROOFPLATE_MIGRATIONS_OUT: out };
    const problem = problemOf('npm', ['run', '--silent', 'db:generate'], { env, limitMs: 120_000 });
    if (problem) return problem;
    if (journal(copy) === journal(MIGRATIONS)) return undefined;
    return 'The schema has changed without a migration: run "npm run db:generate" and commit db/migrations.';
  } finally {
    rmSync(copy, { recursive: true, force: true });
  }
}

function journal(folder) {
  return readFileSync(join(folder, 'meta/_journal.json'), 'utf8');
}
