import { sql } from 'drizzle-orm';
import { assertPatchedDriver, ConnectionWaitError, createDb, type DbHandle, type DbOptions } from '../src/client';
import { cloneDatabase, type TestDatabase } from '../src/testing';

describe('createDb()', () => {
  let database: TestDatabase;
  const handles: DbHandle[] = [];

  beforeAll(async () => {
    database = await cloneDatabase();
  });

  afterAll(async () => {
    await Promise.all(handles.map((handle) => handle.end()));
    await database.drop();
  });

  function open(options: DbOptions): DbHandle {
    const handle = createDb(database.app, options);
    handles.push(handle);
    return handle;
  }

  it('gives up waiting for a connection while all of them are in transactions, and works again when one is free', async () => {
    const { db } = open({ max: 2, acquireTimeoutMs: 50 });
    const { opened: finished, open: finish } = latch();
    const busy = [0, 1].map(() => db.transaction(async () => finished));

    await expect(db.execute(sql`select 1`)).rejects.toMatchObject({ cause: expect.any(ConnectionWaitError) });
    await expect(db.transaction(async () => undefined)).rejects.toThrow(ConnectionWaitError);

    finish();
    await Promise.all(busy);
    expect(await db.execute(sql`select 1 as one`)).toEqual([{ one: 1 }]);
  });

  it('admits those who wait in the order they came', async () => {
    const { db } = open({ max: 1, acquireTimeoutMs: 5_000 });
    const served: number[] = [];

    await Promise.all([1, 2, 3, 4].map((n) => db.transaction(async () => void served.push(n))));

    expect(served).toEqual([1, 2, 3, 4]);
  });

  it('frees the place of a transaction that failed', async () => {
    const { db } = open({ max: 1, acquireTimeoutMs: 500 });

    for (let attempt = 0; attempt < 3; attempt += 1) {
      await expect(db.transaction(async (tx) => tx.execute(sql`select 1 / 0`))).rejects.toMatchObject({ cause: { code: '22012' } });
    }

    expect(await db.execute(sql`select 1 as one`)).toEqual([{ one: 1 }]);
  });

  it('ends a statement that outlives its deadline', async () => {
    const { db } = open({ max: 1, statementTimeoutMs: 30 });

    await expect(db.execute(sql`select pg_sleep(30)`)).rejects.toMatchObject({ cause: { code: '57014' } });
  });

  it('ends the wait for a lock at its own, shorter deadline', async () => {
    const { db } = open({ max: 2, lockTimeoutMs: 30 });
    const { opened: finished, open: finish } = latch();
    const { opened: locked, open: reportLocked } = latch();
    const holder = db.transaction(async (tx) => {
      await tx.execute(sql`select pg_advisory_xact_lock(1)`);
      reportLocked();
      await finished;
    });
    await locked;

    await expect(db.transaction(async (tx) => tx.execute(sql`select pg_advisory_xact_lock(1)`))).rejects.toMatchObject({
      cause: { code: '55P03' },
    });

    finish();
    await holder;
  });

  it('ends a transaction that idles and refuses its later statements', async () => {
    const { db } = open({ max: 1, idleInTransactionTimeoutMs: 30 });
    const { opened: refused, open: reportRefusal } = latch<unknown>();

    const idling = db.transaction(async (tx) => {
      await tx.execute(sql`select 1`);
      await untilOtherConnectionsEnd(database);
      await tx.execute(sql`select 2`).catch(reportRefusal);
    });

    await expect(idling).rejects.toMatchObject({ code: 'CONNECTION_CLOSED' });
    expect(await refused).toMatchObject({ cause: { code: 'CONNECTION_CLOSED' } });
  });

  it('refuses a statement that a finished transaction left behind', async () => {
    const { db } = open({ max: 1 });
    const leaked = await db.transaction(async (tx) => ({ late: () => tx.execute(sql`select 1`) }));

    await expect(leaked.late()).rejects.toMatchObject({ cause: { code: 'TRANSACTION_OVER' } });
  });

  it('signs in as a role that neither owns tables nor skips row-level security', async () => {
    const { client } = open({ max: 1 });

    const [role] = await client`select rolname, rolsuper, rolbypassrls from pg_roles where rolname = current_user`;

    expect(role).toEqual({ rolname: 'proofplate_app', rolsuper: false, rolbypassrls: false });
  });
});

describe('assertPatchedDriver()', () => {
  it('accepts the installed driver', () => {
    expect(assertPatchedDriver).not.toThrow();
  });

  it('refuses a driver without the mark of our patches and says how to repair it', () => {
    jest.isolateModules(() => {
      jest.doMock('postgres', () => () => undefined);
      const unpatched: typeof import('../src/client') = require('../src/client');

      expect(unpatched.assertPatchedDriver).toThrow(/not patched.*node db\/patches\/apply\.mjs/);
    });
  });
});

function latch<T = void>(): { readonly opened: Promise<T>; readonly open: (value: T) => void } {
  let open: (value: T) => void = () => undefined;
  const opened = new Promise<T>((resolve) => {
    open = resolve;
  });
  return { opened, open };
}

async function untilOtherConnectionsEnd({ superuser }: TestDatabase): Promise<void> {
  const { client, end } = createDb(superuser, { max: 1 });
  try {
    for (;;) {
      const [idle] = await client`
        select 1 as found from pg_stat_activity where datname = current_database() and state = 'idle in transaction'`;
      if (!idle) return;
    }
  } finally {
    await end();
  }
}
