// Where the server's programs are, and how they get there on Debian.
import { spawnSync } from 'node:child_process';
import { existsSync, readdirSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { isRoot } from './account.mjs';

const DEBIAN_ROOT = '/usr/lib/postgresql';
const OLDEST_MAJOR = 15; // security_invoker views

/** Folder that holds initdb, pg_ctl and postgres; throws one clear line when there is none. PG_BIN wins. */
export function findBinDir() {
  const found = candidates().find((dir) => dir && ['initdb', 'pg_ctl', 'postgres'].every((name) => existsSync(join(dir, name))));
  if (found) return found;
  throw new Error('PostgreSQL 15 or newer is not installed: apt-get install postgresql (or set PG_BIN to the folder that holds initdb).');
}

/** Installs PostgreSQL from Debian's packages when that is possible. */
export function ensurePostgres(say = console.log) {
  if (isInstalled()) return;
  installDebianPackages(['postgresql'], say);
  findBinDir();
}

/** apt-get as root; otherwise one line saying what to install. */
export function installDebianPackages(packages, say = console.log) {
  const command = `apt-get install -y --no-install-recommends ${packages.join(' ')}`;
  if (!isRoot() || !existsSync('/usr/bin/apt-get')) throw new Error(`Missing: ${packages.join(', ')}. Please run as root: ${command}`);
  say(`Installing ${packages.join(', ')} from Debian's packages …`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  for (const args of [['update'], ['install', '-y', '--no-install-recommends', ...packages]]) {
    const result = spawnSync('apt-get', args, { stdio: ['ignore', 'ignore', 'inherit'], env });
    if (result.status !== 0) throw new Error(`apt-get ${args[0]} failed (${result.status}). Please run by hand: ${command}`);
  }
}

function isInstalled() {
  try {
    findBinDir();
    return true;
  } catch {
    return false;
  }
}

function candidates() {
  const majors = existsSync(DEBIAN_ROOT) ? readdirSync(DEBIAN_ROOT).map(Number) : [];
  const debian = majors
    .filter((major) => major >= OLDEST_MAJOR)
    .sort((a, b) => b - a)
    .map((major) => join(DEBIAN_ROOT, String(major), 'bin'));
  return [process.env.PG_BIN, ...debian, ...(process.env.PATH ?? '').split(delimiter)];
}
