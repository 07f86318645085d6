// Roles and an empty database in a cluster, by its superuser. Idempotent; two at once wait for each other.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import postgres from 'postgres';

const ROLES_SQL = readFileSync(join(import.meta.dirname, 'roles.sql'), 'utf8');
const BOOTSTRAP_LOCK = '7203154001';
const LOGIN_ROLES = ['migrator', 'app', 'backup', 'worker'];

/**
 * @param superuserUrl any database of the cluster
 * @param database     name to create when missing
 * @param passwords    { migrator, app, backup, worker }, each optional: a trusting throw-away cluster needs none
 */
export async function bootstrap({ superuserUrl, database = 'proofplate', passwords = {} }) {
  const admin = postgres(superuserUrl, { max: 1, onnotice() {} });
  try {
    await admin.begin(async (tx) => {
      await tx.unsafe(ROLES_SQL);
      for (const role of LOGIN_ROLES.filter((name) => passwords[name])) {
        const [{ statement }] =
          await tx`select format('alter role %I password %L', ${`proofplate_${role}`}::text, ${passwords[role]}::text) as statement`;
        await tx.unsafe(statement);
      }
    });
    await createDatabase(admin, database);
  } finally {
    await admin.end();
  }
}

/** CREATE DATABASE cannot run in a transaction, so a session lock keeps two starters apart. */
async function createDatabase(admin, database) {
  await admin`select pg_advisory_lock(${BOOTSTRAP_LOCK}::bigint)`;
  try {
    const [present] = await admin`select 1 as found from pg_database where datname = ${database}`;
    if (!present) await admin`create database ${admin(database)} owner proofplate_owner`;
    await admin`revoke all on database ${admin(database)} from public`;
    await admin.unsafe(
      `grant connect on database "${database.replaceAll('"', '""')}" to proofplate_migrator, proofplate_app, proofplate_backup, proofplate_worker`,
    );
  } finally {
    await admin`select pg_advisory_unlock(${BOOTSTRAP_LOCK}::bigint)`;
  }
}

/** The address of a role in the same cluster as `superuserUrl`. */
export function roleUrl({ superuserUrl, role, password = '', database = 'proofplate' }) {
  const url = new URL(superuserUrl);
  url.username = `proofplate_${role}`;
  url.password = password;
  url.pathname = `/${database}`;
  return url.href;
}
