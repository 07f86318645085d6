// A PostgreSQL cluster of our own on loopback. Plain Node and no packages: it runs before anything is installed or built.
import { spawnSync } from 'node:child_process';
import { randomBytes } from 'node:crypto';
import { chmodSync, chownSync, existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { tmpdir } from 'node:os';
import { dirname, join, resolve } from 'node:path';
import { blockedFolder, isRoot, serverAccount } from './account.mjs';
import { findBinDir } from './binaries.mjs';
import { portOfRunning } from './postmaster.mjs';

export { ensurePostgres, findBinDir } from './binaries.mjs';

export const SUPERUSER = 'postgres';
const LONGEST_SOCKET_FOLDER = 80;
const THROW_AWAY_PREFIX = 'proofplate-test-';

/** Small on purpose: many of these run beside each other on a developer's machine. Contents may be lost at any time. */
const THROW_AWAY_SETTINGS = {
  fsync: 'off',
  synchronous_commit: 'off',
  full_page_writes: 'off',
  wal_level: 'minimal',
  max_wal_senders: 0,
  autovacuum: 'off',
  shared_buffers: '32MB',
  max_connections: 120,
  jit: 'off',
};

/** `archive_timeout` bounds what a lost disk can cost to one minute of work. */
function durableSettings(walArchive) {
  const target = `"${walArchive}/%f"`;
  return {
    fsync: 'on',
    synchronous_commit: 'on',
    full_page_writes: 'on',
    wal_level: 'replica',
    archive_mode: 'on',
    archive_timeout: 60,
    archive_command: `test ! -f ${target} && cp "%p" "${walArchive}/%f.part" && mv "${walArchive}/%f.part" ${target}`,
    password_encryption: 'scram-sha-256',
    jit: 'off',
  };
}

export function freePort() {
  return new Promise((found, failed) => {
    const probe = createServer()
      .once('error', failed)
      .listen(0, '127.0.0.1', () => {
        const address = probe.address();
        probe.close(() => found(typeof address === 'object' && address ? address.port : 0));
      });
  });
}

/**
 * A folder the server account can live in: the wished one, else one under the temporary folder, with the reason in words.
 * Returns { dir, reason }; reason is undefined when the wish was granted.
 */
export function usableFolder(wished) {
  const dir = resolve(wished);
  if (!isRoot()) return { dir };
  const blocked = blockedFolder(dir);
  if (!blocked) return { dir };
  const fallback = join(tmpdir(), `proofplate-${createFolderKey(dir)}`);
  return { dir: fallback, reason: `the account "${serverAccount().name}" cannot enter ${blocked}, so the database lives in ${fallback}` };
}

/** The same checkout finds the same fallback folder at its second start. */
function createFolderKey(dir) {
  let hash = 5381;
  for (const character of dir) hash = (hash * 33 + character.charCodeAt(0)) % 0xffffffff;
  return hash.toString(16);
}

/**
 * Starts the cluster in `dir` (made when missing) and returns how to reach and stop it. A running one is reused.
 * durable: survives a crash, archives its log, asks for passwords. Otherwise throw-away: fast, trusting, removed by stop().
 */
export async function startCluster({ dir, port, durable = false, superuserPassword = '' }) {
  const root = resolve(dir);
  const bin = findBinDir();
  const pgData = join(root, 'pgdata');
  const walArchive = join(root, 'wal-archive');
  makeFolders(root, walArchive);
  if (!existsSync(join(pgData, 'PG_VERSION'))) initialise({ bin, root, pgData, durable, superuserPassword });

  const runningPort = await portOfRunning(pgData);
  const usedPort = runningPort ?? port ?? (await freePort());
  const socketDir = runningPort === undefined ? makeSocketFolder(root) : undefined;
  if (socketDir) {
    const settings = durable ? durableSettings(walArchive) : THROW_AWAY_SETTINGS;
    writeSettings(pgData, { listen_addresses: '127.0.0.1', port: usedPort, unix_socket_directories: socketDir, ...settings });
    asServer(join(bin, 'pg_ctl'), ['-D', pgData, '-w', '-t', '60', '-l', join(root, 'postgres.log'), 'start']);
  }
  const secret = superuserPassword ? `:${encodeURIComponent(superuserPassword)}` : '';
  return {
    port: usedPort,
    dir: root,
    pgData,
    url: (database = 'postgres') => `postgres://${SUPERUSER}${secret}@127.0.0.1:${usedPort}/${database}`,
    stop(mode = durable ? 'fast' : 'immediate') {
      try {
        asServer(join(bin, 'pg_ctl'), ['-D', pgData, '-w', '-t', '60', '-m', mode, 'stop']);
      } finally {
        if (socketDir) rmSync(socketDir, { recursive: true, force: true });
        if (!durable) rmSync(root, { recursive: true, force: true });
      }
    },
  };
}

/** A throw-away cluster under the temporary folder, after removing those whose owner was killed before it could. */
export async function startThrowAwayCluster() {
  for (const name of readdirSync(tmpdir()).filter((entry) => entry.startsWith(THROW_AWAY_PREFIX))) {
    const ownerPid = Number(name.slice(THROW_AWAY_PREFIX.length).split('-')[0]);
    if (!existsSync(`/proc/${ownerPid}`)) removeLeftover(join(tmpdir(), name));
  }
  return startCluster({ dir: mkdtempSync(join(tmpdir(), `${THROW_AWAY_PREFIX}${process.pid}-`)) });
}

function removeLeftover(root) {
  try {
    asServer(join(findBinDir(), 'pg_ctl'), ['-D', join(root, 'pgdata'), '-w', '-m', 'immediate', 'stop']);
  } catch {
    // It was not running any more.
  }
  rmSync(root, { recursive: true, force: true });
}

function makeFolders(root, walArchive) {
  // Parents keep the umask's mode: made 0700 by root they would lock the server account out.
  mkdirSync(dirname(root), { recursive: true });
  mkdirSync(walArchive, { recursive: true });
  for (const folder of [root, walArchive]) {
    chmodSync(folder, 0o700);
    giveToServer(folder);
  }
  const blocked = isRoot() ? blockedFolder(root) : undefined;
  if (blocked)
    throw new Error(`The account "${serverAccount().name}" cannot enter ${blocked}; choose another folder with PROOFPLATE_DATA.`);
}

function initialise({ bin, root, pgData, durable, superuserPassword }) {
  const options = ['-D', pgData, '-U', SUPERUSER, '-E', 'UTF8', '--locale=C.UTF-8'];
  if (!durable) {
    asServer(join(bin, 'initdb'), [...options, '-A', 'trust', '--no-sync']);
    return;
  }
  if (!superuserPassword) throw new Error('A durable cluster needs a superuser password.');
  const passwordFile = join(root, `.initial-${randomBytes(6).toString('hex')}`);
  writeFileSync(passwordFile, `${superuserPassword}\n`, { mode: 0o600 });
  giveToServer(passwordFile);
  try {
    asServer(join(bin, 'initdb'), [...options, '-A', 'scram-sha-256', '--data-checksums', `--pwfile=${passwordFile}`]);
  } finally {
    rmSync(passwordFile, { force: true });
  }
}

/** Settings live in a file of their own, so that a restart by hand with pg_ctl runs with the same ones. */
function writeSettings(pgData, settings) {
  const own = join(pgData, 'proofplate.conf');
  const lines = Object.entries(settings).map(([name, value]) => `${name} = '${String(value).replaceAll("'", "''")}'`);
  writeFileSync(own, `${lines.join('\n')}\n`, { mode: 0o600 });
  giveToServer(own);
  const main = join(pgData, 'postgresql.conf');
  const include = "include = 'proofplate.conf'";
  const text = readFileSync(main, 'utf8');
  if (!text.includes(include)) writeFileSync(main, `${text}\n${include}\n`);
}

/** The path of a socket may have about 100 bytes, so below a deep folder it goes to the temporary one. */
function makeSocketFolder(root) {
  const inside = join(root, 'socket');
  const folder = inside.length <= LONGEST_SOCKET_FOLDER ? inside : mkdtempSync(join(tmpdir(), 'proofplate-socket-'));
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  giveToServer(folder);
  return folder;
}

function giveToServer(path) {
  if (!isRoot()) return;
  const account = serverAccount();
  chownSync(path, account.uid, account.gid);
}

function asServer(command, args) {
  const identity = isRoot() ? { uid: serverAccount().uid, gid: serverAccount().gid } : {};
  const result = spawnSync(command, args, {
    stdio: ['ignore', 'pipe', 'pipe'],
    encoding: 'utf8',
    cwd: '/',
    env: { PATH: process.env.PATH, LC_ALL: 'C.UTF-8', TZ: 'UTC' },
    ...identity,
  });
  if (result.status === 0) return result.stdout;
  throw new Error(`${command} ${args.at(-1)} failed (${result.status}): ${result.error ?? ''}${result.stderr ?? ''}${result.stdout ?? ''}`);
}
