import { createDb, type DbHandle } from '@proofplate/db';
import type { TestApp } from './app';

/** Looks at what really is in the tables, or breaks it on purpose: past row-level security. */
export async function asSuperuser<T>(test: TestApp, look: (sql: DbHandle['client']) => Promise<T>): Promise<T> {
  const handle = createDb(test.database.superuser, { max: 1 });
  try {
    return await look(handle.client);
  } finally {
    await handle.end();
  }
}
