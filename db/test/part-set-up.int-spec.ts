import postgres from 'postgres';
import { uuidv7 } from 'uuidv7';
import { createDb, type DbHandle } from '../src/client';
import * as schema from '../src/schema';
import { cloneDatabase, type TestDatabase } from '../src/testing';
import { makeProvedShop, type ProvedShop } from './support/proved-shop';

const PERMANENT = 'PP001';
const FOREIGN_KEY = '23503';

let database: TestDatabase;
let handle: DbHandle;
let app: postgres.Sql;
let shop: ProvedShop;
let elsewhere: ProvedShop;

beforeAll(async () => {
  database = await cloneDatabase();
  handle = createDb(database.superuser, { max: 1 });
  app = postgres(database.app, { max: 1 });
  shop = await makeProvedShop(handle.db);
  elsewhere = await makeProvedShop(handle.db);
});
afterAll(async () => {
  await app.end();
  await handle.end();
  await database.drop();
});

async function makeRun({ shopId, memberId, submitted, keys }: ProvedShop, code: string): Promise<string> {
  const id = uuidv7();
  await handle.db.insert(schema.run).values({
    ...{ id, shopId, code, kind: 'production', recipeId: submitted.recipeId, revisionId: submitted.revisionId },
    ...{ machineId: keys.machineId, contentHash: 'x', clientId: uuidv7(), createdBy: memberId },
  });
  return id;
}

/** SQLSTATE of a save by the application, or `done`. */
function save({ shopId, memberId, keys }: ProvedShop, runId: string, number: number): Promise<string> {
  return app
    .begin(async (sql) => {
      await sql`select set_config('app.shop_id', ${shopId}, true)`;
      await sql`insert into part_set_up (shop_id, id, run_id, number, lens_id, entered, ground, results, saved_by_name, created_by)
        values (${shopId}, ${uuidv7()}, ${runId}, ${number}, ${keys.lensId}, '{}', '{}', '{}', 'Ann Lee', ${memberId})`;
      return 'done';
    })
    .catch((error: unknown) => (error instanceof postgres.PostgresError ? error.code : String(error)));
}

describe('the part set-up of a run', () => {
  it('is added to until the run is finished, and never after', async () => {
    const runId = await makeRun(shop, 'J-0001');
    expect(await save(shop, runId, 1)).toBe('done');
    expect(await save(shop, runId, 2)).toBe('done');
    await handle.db.update(schema.run).set({ state: 'finished' });
    expect(await save(shop, runId, 3)).toBe(PERMANENT);
  });

  it('belongs to a run of the same shop', async () => {
    const runId = await makeRun(elsewhere, 'J-0001');
    expect(await save(shop, runId, 1)).toBe(FOREIGN_KEY);
  });
});
