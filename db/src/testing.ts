// For tests only: a database of their own, cloned from the migrated template of the throw-away cluster.
import { randomUUID } from 'node:crypto';
import postgres from 'postgres';

const TEMPLATE = 'proofplate_template';

export type TestDatabase = {
  readonly name: string;
  /** DDL and unrestricted writes: signs in as the migrator and acts as proofplate_owner. FORCEd policies still apply. */
  readonly owner: string;
  readonly app: string;
  readonly worker: string;
  readonly backup: string;
  /** Skips row-level security; for looking at what really is in a table. */
  readonly superuser: string;
  readonly drop: () => Promise<void>;
};

/** Clones the migrated template, so that a test file neither sees nor disturbs another one's rows. */
export async function cloneDatabase(): Promise<TestDatabase> {
  const superuserUrl = testClusterUrl();
  const name = `test_${randomUUID().replaceAll('-', '')}`;
  await asSuperuser(superuserUrl, `create database ${name} owner proofplate_owner template ${TEMPLATE} strategy file_copy`);
  const owner = new URL(urlOf(superuserUrl, 'proofplate_migrator', name));
  owner.searchParams.set('role', 'proofplate_owner');
  return {
    name,
    owner: owner.href,
    app: urlOf(superuserUrl, 'proofplate_app', name),
    worker: urlOf(superuserUrl, 'proofplate_worker', name),
    backup: urlOf(superuserUrl, 'proofplate_backup', name),
    superuser: urlOf(superuserUrl, new URL(superuserUrl).username, name),
    drop: () => asSuperuser(superuserUrl, `drop database if exists ${name} with (force)`),
  };
}

/** An empty database with the roles but without the schema, for tests of the migrations themselves. */
export async function createEmptyDatabase(): Promise<{ readonly name: string; readonly migrator: string; readonly superuser: string }> {
  const superuserUrl = testClusterUrl();
  const name = `empty_${randomUUID().replaceAll('-', '')}`;
  await asSuperuser(superuserUrl, `create database ${name} owner proofplate_owner`);
  return {
    name,
    migrator: urlOf(superuserUrl, 'proofplate_migrator', name),
    superuser: urlOf(superuserUrl, new URL(superuserUrl).username, name),
  };
}

/** Address of the throw-away cluster's superuser, handed over by the set-up of the jest projects. */
export function testClusterUrl(): string {
  const url = process.env.PROOFPLATE_TEST_PG;
  if (!url) throw new Error('PROOFPLATE_TEST_PG is not set: this test belongs into a jest project with the PostgreSQL set-up');
  return url;
}

function urlOf(superuserUrl: string, user: string, database: string): string {
  const url = new URL(superuserUrl);
  url.username = user;
  url.pathname = `/${database}`;
  return url.href;
}

async function asSuperuser(url: string, statement: string): Promise<void> {
  const admin = postgres(url, { max: 1, onnotice: () => undefined });
  try {
    await admin.unsafe(statement);
  } finally {
    await admin.end();
  }
}
