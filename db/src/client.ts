import { drizzle, type PostgresJsDatabase } from 'drizzle-orm/postgres-js';
import postgres from 'postgres';
import { ConnectionGate } from './connection-gate';
import * as schema from './schema';

export { migrateAll } from '../postgres/migrate.cjs';
export { ConnectionWaitError } from './connection-gate';

export type Db = PostgresJsDatabase<typeof schema>;
export type Tx = Parameters<Parameters<Db['transaction']>[0]>[0];

export type DbOptions = {
  /** Connections, and with them pieces of work at once. */
  readonly max?: number;
  readonly applicationName?: string;
  readonly statementTimeoutMs?: number;
  readonly lockTimeoutMs?: number;
  readonly idleInTransactionTimeoutMs?: number;
  /** How long work may wait for a free connection before a ConnectionWaitError. */
  readonly acquireTimeoutMs?: number;
};

export type DbHandle = {
  readonly db: Db;
  /** The bare driver: not counted by the limit on waiting. For LISTEN, health checks and tests. */
  readonly client: postgres.Sql;
  readonly end: () => Promise<void>;
};

const DEFAULTS = {
  max: 10,
  applicationName: 'proofplate',
  statementTimeoutMs: 3_000,
  lockTimeoutMs: 2_000,
  idleInTransactionTimeoutMs: 5_000,
  acquireTimeoutMs: 1_000,
} satisfies Required<DbOptions>;

const CONNECT_TIMEOUT_S = 3;
const FIRST_RECONNECT_DELAY_S = 0.02;
/** Short, so that the pool is back within a second of the database. */
const LONGEST_RECONNECT_DELAY_S = 0.5;
const CLOSE_TIMEOUT_S = 5;
const PATCH_LEVEL = '1';

/**
 * A pool of connections with deadlines: on statements, on locks and on idle transactions (kept by the server), and on waiting
 * for a free connection (kept here, because the driver has none).
 */
export function createDb(url: string, options: DbOptions = {}): DbHandle {
  const settings = { ...DEFAULTS, ...options };
  const client = postgres(url, {
    max: settings.max,
    connect_timeout: CONNECT_TIMEOUT_S,
    backoff: reconnectDelayS,
    onnotice: () => undefined,
    connection: {
      application_name: settings.applicationName,
      statement_timeout: settings.statementTimeoutMs,
      lock_timeout: settings.lockTimeoutMs,
      idle_in_transaction_session_timeout: settings.idleInTransactionTimeoutMs,
    },
  });
  const gate = new ConnectionGate(settings.max, settings.acquireTimeoutMs);
  const db = drizzle(gated(client, gate), { schema, casing: 'snake_case' });
  return { db, client, end: () => client.end({ timeout: CLOSE_TIMEOUT_S }) };
}

/**
 * Refuses a driver without our patches (db/patches): it runs statements of a dead transaction inside somebody else's.
 * @throws Error saying how to repair the installation
 */
export function assertPatchedDriver(): void {
  const level: unknown = Reflect.get(postgres, 'proofplatePatch');
  if (level === PATCH_LEVEL) return;
  throw new Error(`The PostgreSQL driver is not patched (found ${String(level)}, want ${PATCH_LEVEL}). Run: node db/patches/apply.mjs`);
}

function reconnectDelayS(retries: number): number {
  const jitter = 0.5 + Math.random() / 2;
  return jitter * Math.min(FIRST_RECONNECT_DELAY_S * 2 ** retries, LONGEST_RECONNECT_DELAY_S);
}

/** The driver as Drizzle sees it: the two entrances it uses pass the gate. */
function gated(client: postgres.Sql, gate: ConnectionGate): postgres.Sql {
  const unsafe = (text: string, parameters?: Parameters<postgres.Sql['unsafe']>[1], queryOptions?: postgres.UnsafeQueryOptions) => {
    const rows = once(() => gate.run(async () => await client.unsafe(text, parameters, queryOptions)));
    const values = once(() => gate.run(async () => await client.unsafe(text, parameters, queryOptions).values()));
    return {
      values,
      // biome-ignore lint/suspicious/noThenProperty: the driver's queries are lazy promises, and so is this one
      then: (...handlers: Parameters<Promise<unknown>['then']>) => rows().then(...handlers),
      catch: (handler: Parameters<Promise<unknown>['catch']>[0]) => rows().catch(handler),
      finally: (handler: Parameters<Promise<unknown>['finally']>[0]) => rows().finally(handler),
    };
  };
  const begin = (...work: readonly unknown[]) => gate.run(() => Reflect.apply(client.begin, client, work));
  return new Proxy(client, {
    get: (target, property) => (property === 'unsafe' ? unsafe : property === 'begin' ? begin : Reflect.get(target, property)),
  });
}

function once<T>(start: () => Promise<T>): () => Promise<T> {
  let started: Promise<T> | undefined;
  return () => {
    started ??= start();
    return started;
  };
}
