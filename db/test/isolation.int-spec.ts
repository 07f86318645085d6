import postgres from 'postgres';
import { uuidv7 } from 'uuidv7';
import { createDb, type DbHandle } from '../src/client';
import { cloneDatabase, type TestDatabase } from '../src/testing';
import { makeProvedShop, type ProvedShop } from './support/proved-shop';

const SETTING_UNKNOWN = '42704';
const NOT_A_UUID = '22P02';
const FOREIGN_KEY = '23503';
const NO_RIGHT = '42501';

let database: TestDatabase;
let handle: DbHandle;
let here: ProvedShop;
let there: ProvedShop;

beforeAll(async () => {
  database = await cloneDatabase();
  handle = createDb(database.superuser, { max: 1 });
  here = await makeProvedShop(handle.db);
  there = await makeProvedShop(handle.db);
});
afterAll(async () => {
  await handle.end();
  await database.drop();
});

/** A connection that nothing was done on before. */
async function withFreshConnection<T>(work: (sql: postgres.Sql) => Promise<T>): Promise<T> {
  const sql = postgres(database.app, { max: 1 });
  try {
    return await work(sql);
  } finally {
    await sql.end();
  }
}

const codeOf = (statement: Promise<unknown>) =>
  statement.then(
    (rows) => `${Array.isArray(rows) ? rows.length : '?'} rows`,
    (error: unknown) => (error instanceof postgres.PostgresError ? error.code : String(error)),
  );

/** Tenant tables that hold rows: an empty one has nothing to hide and PostgreSQL does not even ask whose it is. */
async function tablesWithRows(): Promise<string[]> {
  const tables = await handle.client<{ name: string }[]>`
    select c.relname as name from pg_class c join pg_policy p on p.polrelid = c.oid where c.relnamespace = 'public'::regnamespace order by 1`;
  const filled: string[] = [];
  for (const { name } of tables) {
    const rows = await handle.client`select 1 from ${handle.client(name)} limit 1`;
    if (rows.length > 0) filled.push(name);
  }
  return filled;
}

describe('a transaction that names no shop', () => {
  it('gets an error from every table with rows, never an empty answer', async () => {
    const tables = await tablesWithRows();
    expect(tables).toEqual(
      expect.arrayContaining(['cell', 'coupon', 'member', 'photo', 'recipe', 'revision', 'revision_evidence', 'shop']),
    );
    await withFreshConnection(async (sql) => {
      for (const table of tables) {
        const answer = await codeOf(sql`select 1 from ${sql(table)}`);
        expect({ table, answer }).toEqual({ table, answer: SETTING_UNKNOWN });
      }
    });
  });

  it('gets an error too where an earlier transaction of the same connection had named one', async () => {
    const tables = await tablesWithRows();
    await withFreshConnection(async (sql) => {
      const named = await sql.begin(async (tx) => {
        await tx`select set_config('app.shop_id', ${here.shopId}, true)`;
        return tx`select code from coupon`;
      });
      expect(named).toHaveLength(2);
      for (const table of tables) {
        const answer = await codeOf(sql`select 1 from ${sql(table)}`);
        expect({ table, answer }).toEqual({ table, answer: NOT_A_UUID });
      }
    });
  });

  it('can neither write nor change anything', async () => {
    await withFreshConnection(async (sql) => {
      expect(await codeOf(sql`update coupon set lot = 'other'`)).toBe(SETTING_UNKNOWN);
      expect(await codeOf(sql`delete from revision`)).toBe(SETTING_UNKNOWN);
      expect(
        await codeOf(sql`insert into lens (shop_id, id, name, focal_length_mm, field_size_mm, created_by)
        values (${here.shopId}, ${uuidv7()}, 'F254', 254, 175, ${here.memberId})`),
      ).toBe(SETTING_UNKNOWN);
    });
  });
});

describe('a transaction of one shop', () => {
  const inShop = (shop: ProvedShop, statement: string) =>
    withFreshConnection((sql) =>
      codeOf(
        sql.begin(async (tx) => {
          await tx`select set_config('app.shop_id', ${shop.shopId}, true)`;
          return tx.unsafe(statement);
        }),
      ),
    );

  it('sees and changes no row of another', async () => {
    expect(await inShop(here, `select 1 from coupon where id = '${there.open.couponId}'`)).toBe('0 rows');
    expect(await inShop(here, `update coupon set lot = 'other' where id = '${there.open.couponId}' returning 1`)).toBe('0 rows');
    expect(await inShop(here, `update coupon set lot = 'other' where id = '${here.open.couponId}' returning 1`)).toBe('1 rows');
  });

  it('cannot write a row into another', async () => {
    const lens = `insert into lens (shop_id, id, name, focal_length_mm, field_size_mm, created_by)
      values ('${there.shopId}', '${uuidv7()}', 'F254', 254, 175, '${there.memberId}')`;
    expect(await inShop(here, lens)).toBe(NO_RIGHT);
  });

  /** A copy of a row of this shop that differs in what it refers to. */
  const copyOf = (table: string, sourceId: string, changes: Record<string, unknown>) =>
    `insert into ${table} select (jsonb_populate_record(t, '${JSON.stringify({ id: uuidv7(), ...changes })}')).* from ${table} t
     where id = '${sourceId}' returning 1`;

  it.each<[string, () => string]>([
    ['coupon, material', () => copyOf('coupon', here.open.couponId, { code: 'C-9', material_id: there.keys.materialId })],
    ['coupon, lens', () => copyOf('coupon', here.open.couponId, { code: 'C-9', lens_id: there.keys.lensId })],
    ['coupon, machine profile', () => copyOf('coupon', here.open.couponId, { code: 'C-9', profile_id: there.profileId })],
    ['coupon, who marked it', () => copyOf('coupon', here.open.couponId, { code: 'C-9', marked_by: there.memberId })],
    [
      'coupon, draft to prove',
      () => copyOf('coupon', here.open.couponId, { code: 'C-9', confirms_revision_id: there.submitted.revisionId }),
    ],
    ['grid, coupon', () => copyOf('test_grid', here.open.gridId, { number: 9, coupon_id: there.open.couponId })],
    ['cell, grid', () => copyOf('cell', here.open.cellId, { address: 'A9', grid_id: there.open.gridId })],
    ['cell, coupon', () => copyOf('cell', here.open.cellId, { address: 'A9', coupon_id: there.open.couponId })],
    ['rating, cell', () => copyOf('cell_rating', here.open.ratingId, { cell_id: there.open.cellId })],
    ['photo, coupon', () => copyOf('photo', here.open.photoId, { coupon_id: there.open.couponId })],
    ['recipe, machine', () => copyOf('recipe', here.submitted.recipeId, { code: 'R-9', machine_id: there.keys.machineId })],
    ['recipe, finish', () => copyOf('recipe', here.submitted.recipeId, { code: 'R-9', finish_id: there.keys.finishId })],
    ['revision, recipe', () => copyOf('revision', here.submitted.revisionId, { recipe_id: there.submitted.recipeId })],
    ['revision, author', () => copyOf('revision', here.submitted.revisionId, { created_by: there.memberId })],
    ['revision, ground of it', () => copyOf('revision', here.submitted.revisionId, { based_on_id: there.submitted.revisionId })],
    [
      'evidence, cell',
      () => `insert into revision_evidence (shop_id, revision_id, coupon_id, cell_id, kind, created_by) values
        ('${here.shopId}', '${here.submitted.revisionId}', '${there.sealed.couponId}', '${there.sealed.cellId}', 'basis', '${here.memberId}')`,
    ],
    [
      'signature, revision',
      () => `insert into sign_off (shop_id, id, revision_id, member_id, printed_name, role, meaning, content_hash, ledger_hash_before, method)
        values ('${here.shopId}', '${uuidv7()}', '${there.submitted.revisionId}', '${here.memberId}', 'Ann', 'owner', 'approved', 'x', 'x', 'password')`,
    ],
    [
      'training, member',
      () => `insert into training_record (shop_id, id, member_id, subject, taught_by, taught_on, created_by) values
        ('${here.shopId}', '${uuidv7()}', '${there.memberId}', 'Laser safety', 'Jo', now(), '${here.memberId}')`,
    ],
  ])('cannot tie a row to one of another shop: %s', async (_, statement) => {
    expect(await inShop(here, statement())).toBe(FOREIGN_KEY);
  });
});
