// What a fresh machine lacks: installed when we may, else said in one line.
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { ensurePostgres, installDebianPackages } from '../../../../db/postgres/binaries.mjs';
import { CHECKOUT } from './checkout.mjs';

const SAY_EVERY_MS = 20_000;
const OLDEST_NODE = [20, 19];
const CHROMIUM_PATHS = ['/usr/bin/chromium', '/usr/bin/chromium-browser', '/usr/bin/google-chrome'];

export function requireNode() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major > OLDEST_NODE[0] || (major === OLDEST_NODE[0] && minor >= OLDEST_NODE[1])) return;
  throw new Error(`Node ${OLDEST_NODE.join('.')} or newer is needed, this is ${process.versions.node}.`);
}

/** Installs the npm packages when they are missing or older than the lock file, and makes sure that the driver is patched. */
export function ensurePackages(say) {
  if (!packagesAreCurrent()) {
    say('Installing npm packages …');
    const status = runSayingSo('npm', ['ci', '--no-audit', '--no-fund'], 'Still installing npm packages');
    if (status !== 0) throw new Error('npm ci failed; see the lines above.');
  }
  const patch = spawnSync(process.execPath, [join(CHECKOUT, 'db/patches/apply.mjs')], { stdio: ['ignore', 'ignore', 'inherit'] });
  if (patch.status !== 0) throw new Error('The PostgreSQL driver could not be patched; see the lines above.');
}

/**
 * Runs a quiet program to its end and prints a line every so often, so that nobody takes a slow network for a hang. A program of its own
 * prints them: this thread waits.
 */
export function runSayingSo(program, args, words, everyMs = SAY_EVERY_MS) {
  const runner = fileURLToPath(new URL('say-so.mjs', import.meta.url));
  const call = [runner, String(everyMs), words, program, ...args];
  return spawnSync(process.execPath, call, { cwd: CHECKOUT, stdio: ['ignore', 'inherit', 'inherit'] }).status;
}

export { ensurePostgres };

/** Path of a Chromium, installed first when it is missing. */
export function ensureChromium(say) {
  const find = () => [process.env.CHROMIUM_BIN, ...CHROMIUM_PATHS].find((path) => path && existsSync(path));
  const present = find();
  if (present) return present;
  installDebianPackages(['chromium'], say);
  const installed = find();
  if (!installed) throw new Error('Chromium is not installed: apt-get install chromium (or set CHROMIUM_BIN to its path).');
  return installed;
}

/** npm writes down what it installed: every package of the lock file must be there in the same version. */
function packagesAreCurrent() {
  const installedList = join(CHECKOUT, 'node_modules/.package-lock.json');
  if (!existsSync(installedList)) return false;
  const installed = JSON.parse(readFileSync(installedList, 'utf8')).packages;
  const wanted = JSON.parse(readFileSync(join(CHECKOUT, 'package-lock.json'), 'utf8')).packages;
  return Object.entries(wanted)
    .filter(([path, entry]) => path.includes('node_modules/') && !entry.optional && !entry.link)
    .every(([path, entry]) => installed[path]?.version === entry.version);
}
