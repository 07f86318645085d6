// Brings a database to the present schema: our migrations first, then those of the job queue, each as the role that owns them.
// Plain CommonJS because it runs unbuilt (tests, first start) as well as from the compiled package.
const { existsSync, readFileSync } = require('node:fs');
const { join } = require('node:path');
const { drizzle } = require('drizzle-orm/postgres-js');
const { migrate } = require('drizzle-orm/postgres-js/migrator');
const postgres = require('postgres');

const MIGRATIONS_FOLDER = join(__dirname, '..', 'migrations');
const QUEUE_SCHEMA = 'graphile_worker';
const MIGRATION_LOCK = '7203154002';
/** A migration that cannot get its lock gives up rather than queue up everybody behind it. */
const LOCK_TIMEOUT_MS = 10_000;

/** @param migratorUrl address of the role proofplate_migrator. Two at once: the second waits and finds nothing to do. */
async function migrateAll(migratorUrl) {
  const client = postgres(migratorUrl, { max: 1, onnotice() {}, connection: { role: 'proofplate_owner', application_name: 'migrate' } });
  try {
    await client`select pg_advisory_lock(${MIGRATION_LOCK}::bigint)`;
    await client`select set_config('lock_timeout', ${String(LOCK_TIMEOUT_MS)}, false)`;
    if (existsSync(join(MIGRATIONS_FOLDER, 'meta', '_journal.json'))) {
      await migrate(drizzle(client), { migrationsFolder: MIGRATIONS_FOLDER });
    }
    await migrateQueue(client, migratorUrl);
    await client.begin((tx) => tx.unsafe(readFileSync(join(__dirname, 'queue.sql'), 'utf8')));
  } finally {
    await client.end();
  }
}

/** The queue's installer says CREATE SCHEMA even when it exists, which takes CREATE on the database: lent for that moment only. */
async function migrateQueue(client, migratorUrl) {
  // Loaded here, because every start of the api imports this file and hardly any migrates.
  const { Logger, runMigrations } = require('graphile-worker');
  const [{ database, isInstalled }] = await client`
    select current_database() as database, to_regclass(${`${QUEUE_SCHEMA}.migrations`}) is not null as "isInstalled"`;
  if (!isInstalled) await client`grant create on database ${client(database)} to proofplate_worker`;
  try {
    const url = new URL(migratorUrl);
    url.searchParams.set('options', '-c role=proofplate_worker');
    await runMigrations({ connectionString: url.href, schema: QUEUE_SCHEMA, logger: new Logger(logProblems) });
  } finally {
    if (!isInstalled) await client`revoke create on database ${client(database)} from proofplate_worker`;
  }
}

function logProblems() {
  return (level, message) => {
    if (level === 'error' || level === 'warning') console.error(`job queue: ${message}`);
  };
}

module.exports = { migrateAll };
