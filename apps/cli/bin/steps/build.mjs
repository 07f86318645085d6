// Builds when a source changed since the last build.
import { spawnSync } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, readdirSync, readFileSync, statSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { CHECKOUT } from './checkout.mjs';

/** The science pages are part of the web. */
const SOURCE_FOLDERS = ['apps', 'packages', 'db', 'docs/science'];
const NOT_SOURCE = new Set(['node_modules', 'dist', 'test', 'e2e', '.data', 'coverage', 'bench']);
const SOURCE_NAME = /\.(?:ts|tsx|css|html|json|woff2|svg|md)$/;
const STAMP = join(CHECKOUT, 'apps/web/dist/.built-from');
const OUTPUTS = ['apps/api/dist/main.js', 'apps/web/dist/index.html', 'db/dist/index.js'];

export function buildWhenChanged(say) {
  const fingerprint = fingerprintOfSources();
  const isBuilt = OUTPUTS.every((path) => existsSync(join(CHECKOUT, path))) && existsSync(STAMP);
  if (isBuilt && readFileSync(STAMP, 'utf8') === fingerprint) return;
  say('Building …');
  const result = spawnSync('npm', ['run', '--silent', 'build'], { cwd: CHECKOUT, stdio: ['ignore', 'ignore', 'inherit'] });
  if (result.status !== 0) {
    // The compiler writes its findings to the standard output, which is only worth showing when it has some.
    spawnSync('npm', ['run', '--silent', 'build:node'], { cwd: CHECKOUT, stdio: 'inherit' });
    throw new Error('The build failed; see the lines above.');
  }
  writeFileSync(STAMP, fingerprint);
}

function fingerprintOfSources() {
  const hash = createHash('sha256');
  for (const path of SOURCE_FOLDERS.flatMap((folder) => sourcesIn(join(CHECKOUT, folder))).sort()) {
    const { mtimeMs, size } = statSync(path);
    hash.update(`${path}\0${mtimeMs}\0${size}\n`);
  }
  return hash.digest('hex');
}

function sourcesIn(folder) {
  return readdirSync(folder, { withFileTypes: true }).flatMap((entry) => {
    if (NOT_SOURCE.has(entry.name)) return [];
    const path = join(folder, entry.name);
    if (entry.isDirectory()) return sourcesIn(path);
    return SOURCE_NAME.test(entry.name) ? [path] : [];
  });
}
