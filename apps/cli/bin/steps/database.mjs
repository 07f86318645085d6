// A durable cluster with roles, database, schema and, once, the demo shop.
import { spawnSync } from 'node:child_process';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';
import { CHECKOUT } from './checkout.mjs';
import { QUIET } from './children.mjs';

const DATABASE = 'proofplate';
const SEED_PROGRAM = join(CHECKOUT, 'db/dist/seed/main.js');
const SEEDED_MARK = 'proofplate: the demo shop was put in';

/** Starts the cluster and brings the database up to date. Returns the cluster and the addresses of the roles. */
export async function openDatabase({ folder, secrets }) {
  const { startCluster } = await import('../../../../db/postgres/cluster.mjs');
  const { bootstrap, roleUrl } = await import('../../../../db/postgres/bootstrap.mjs');
  const { migrateAll } = createRequire(import.meta.url)('../../../../db/postgres/migrate.cjs');
  const cluster = await startCluster({ dir: join(folder, 'postgres'), durable: true, superuserPassword: secrets.superuser });
  try {
    const superuserUrl = cluster.url();
    await bootstrap({ superuserUrl, database: DATABASE, passwords: secrets });
    const urlOf = (role) => roleUrl({ superuserUrl, role, password: secrets[role], database: DATABASE });
    await migrateAll(urlOf('migrator'));
    return { cluster, urls: { app: urlOf('app'), worker: urlOf('worker'), migrator: urlOf('migrator'), superuser: cluster.url(DATABASE) } };
  } catch (error) {
    cluster.stop();
    throw error;
  }
}

/**
 * Puts the demo shop in at the first start. The mark is kept in the database itself: a restored copy remembers it too.
 * The seed program prints its sign-ins as a JSON array on its last line: [{ name, role, email, password }].
 */
export async function seedOnce({ folder, superuserUrl, env, say }) {
  const signInsPath = join(folder, 'demo-sign-ins.json');
  if (existsSync(SEED_PROGRAM) && !(await isSeeded(superuserUrl))) {
    say('Putting in the demo shop …');
    const result = spawnSync(process.execPath, [SEED_PROGRAM], {
      cwd: CHECKOUT,
      env: { ...QUIET, ...process.env, ...env },
      stdio: ['ignore', 'pipe', 'inherit'],
      encoding: 'utf8',
    });
    if (result.status !== 0) throw new Error('The demo shop could not be put in; see the lines above.');
    writeFileSync(signInsPath, lastLine(result.stdout), { mode: 0o600 });
    await markSeeded(superuserUrl);
  }
  return existsSync(signInsPath) ? JSON.parse(readFileSync(signInsPath, 'utf8')) : [];
}

function lastLine(text) {
  return text.trimEnd().split('\n').at(-1) ?? '[]';
}

async function isSeeded(superuserUrl) {
  return withConnection(superuserUrl, async (sql) => {
    const [row] = await sql`
      select shobj_description(oid, 'pg_database') as mark from pg_database where datname = current_database()`;
    return row.mark === SEEDED_MARK;
  });
}

async function markSeeded(superuserUrl) {
  await withConnection(superuserUrl, (sql) => sql.unsafe(`comment on database ${DATABASE} is '${SEEDED_MARK}'`));
}

async function withConnection(url, work) {
  const { default: postgres } = await import('postgres');
  const sql = postgres(url, { max: 1, onnotice() {} });
  try {
    return await work(sql);
  } finally {
    await sql.end();
  }
}
