import postgres from 'postgres';
import { uuidv7 } from 'uuidv7';
import { createDb, type DbHandle } from '../src/client';
import * as schema from '../src/schema';
import { cloneDatabase, type TestDatabase } from '../src/testing';
import { makeCoupon, makeProvedShop, makeRevision, type ProvedShop } from './support/proved-shop';

const PERMANENT = 'PP001';
const NO_SUCH_JUMP = 'PP003';
const NO_RIGHT = '42501';
const DONE = 'done';

type Asker = 'app' | 'superuser';
const ASKERS: readonly Asker[] = ['app', 'superuser'];

let database: TestDatabase;
let handle: DbHandle;
let connections: Record<Asker, postgres.Sql>;
let shop: ProvedShop;

beforeAll(async () => {
  database = await cloneDatabase();
  handle = createDb(database.superuser, { max: 1 });
  connections = { app: postgres(database.app, { max: 1 }), superuser: postgres(database.superuser, { max: 1, onnotice: () => undefined }) };
  shop = await makeProvedShop(handle.db);
  await move('coupon', shop.sealed.couponId, ['marked', 'inspected', 'sealed']);
  await submit(shop.submitted.revisionId);
  await handle.db.insert(schema.signOff).values({
    ...{ shopId: shop.shopId, revisionId: shop.submitted.revisionId, memberId: shop.memberId, printedName: 'Ann Lee', role: 'owner' },
    ...{ meaning: 'submitted for review', contentHash: 'x', ledgerHashBefore: '0', method: 'session' },
  });
  await handle.db.insert(schema.ledgerEvent).values({
    ...{ shopId: shop.shopId, seq: 1, at: new Date(0), actorName: 'Ann Lee', action: 'shop.created', subjectType: 'shop' },
    ...{ subjectId: shop.shopId, bodyHash: 'x', previousHash: '0'.repeat(64), hash: '1'.repeat(64) },
  });
  await handle.db.insert(schema.trainingRecord).values({
    ...{ shopId: shop.shopId, memberId: shop.memberId, subject: 'Laser safety', taughtBy: 'Jo', taughtOn: new Date(0) },
    createdBy: shop.memberId,
  });
});
afterAll(async () => {
  await handle.end();
  await Promise.all(Object.values(connections).map((sql) => sql.end()));
  await database.drop();
});

/** SQLSTATE that a statement ends with, or `done`; nothing of it stays. */
async function outcomeOf(asker: Asker, statement: string, shopId = shop.shopId): Promise<string> {
  const undone = new Error('undone');
  const trying = connections[asker].begin(async (sql) => {
    await sql`select set_config('app.shop_id', ${shopId}, true)`;
    await sql.unsafe(statement);
    throw undone;
  });
  const error: unknown = await trying.catch((reason: unknown) => reason);
  if (error === undone) return DONE;
  return error instanceof postgres.PostgresError ? error.code : String(error);
}

async function move(table: 'coupon' | 'revision', id: string, states: readonly string[]): Promise<void> {
  for (const state of states) await connections.superuser`update ${connections.superuser(table)} set state = ${state} where id = ${id}`;
}

async function submit(revisionId: string): Promise<void> {
  await connections.superuser`update revision set state = 'in_review', number = 1, content_hash = 'x' where id = ${revisionId}`;
}

/** A value of the column's type other than the one it holds. */
const OTHER_VALUE: Readonly<Record<string, (column: string) => string>> = {
  text: (column) => `coalesce(${column}, '') || ' changed'`,
  uuid: () => 'gen_random_uuid()',
  jsonb: () => `'{"changed": true}'::jsonb`,
  integer: (column) => `coalesce(${column}, 0) + 1`,
  bigint: (column) => `coalesce(${column}, 0) + 1`,
  'double precision': (column) => `coalesce(${column}, 0) + 1`,
  boolean: (column) => `not coalesce(${column}, false)`,
  'timestamp with time zone': (column) => `coalesce(${column}, now()) + interval '1 day'`,
};

async function columnsOf(table: string): Promise<{ name: string; changed: string }[]> {
  const rows = await connections.superuser<{ name: string; type: string }[]>`
    select column_name as name, data_type as type from information_schema.columns where table_schema = 'public' and table_name = ${table}`;
  return rows.map(({ name, type }) => {
    const other = OTHER_VALUE[type];
    if (other === undefined) throw new Error(`${table}.${name} has the type ${type}, for which this test knows no other value`);
    return { name, changed: other(name) };
  });
}

/** Every column of the rows, one statement each. */
async function outcomesOfChanges(asker: Asker, table: string, where: string, except: readonly string[] = []) {
  const outcomes: Record<string, string> = {};
  for (const { name, changed } of await columnsOf(table))
    if (!except.includes(name)) outcomes[name] = await outcomeOf(asker, `update ${table} set ${name} = ${changed} where ${where}`);
  return outcomes;
}

const allAre = (outcomes: Record<string, string>, code: string) =>
  expect(outcomes).toEqual(Object.fromEntries(Object.keys(outcomes).map((name) => [name, code])));

describe('rows that are written once', () => {
  it.each(['ledger_event', 'sign_off', 'measurement', 'coupon_correction', 'training_record', 'machine_profile'])(
    '%s refuses a change of any column and its removal, by right to the application and by trigger to a superuser',
    async (table) => {
      for (const [asker, code] of [
        ['app', NO_RIGHT],
        ['superuser', PERMANENT],
      ] as const) {
        allAre(await outcomesOfChanges(asker, table, `shop_id = '${shop.shopId}'`), code);
        expect(await outcomeOf(asker, `delete from ${table} where shop_id = '${shop.shopId}'`)).toBe(code);
        expect(await outcomeOf(asker, `truncate ${table} cascade`)).toBe(code);
      }
    },
  );
});

describe('a sealed coupon', () => {
  const PARTS = ['coupon', 'test_grid', 'cell', 'cell_rating', 'photo'] as const;
  const whereIs = (table: (typeof PARTS)[number]) =>
    ({
      coupon: `id = '${shop.sealed.couponId}'`,
      test_grid: `id = '${shop.sealed.gridId}'`,
      cell: `id = '${shop.sealed.cellId}'`,
      cell_rating: `id = '${shop.sealed.ratingId}'`,
      photo: `id = '${shop.sealed.photoId}'`,
    })[table];

  it.each(PARTS)('refuses a change of any column of %s, its removal and its emptying', async (table) => {
    for (const asker of ASKERS) {
      allAre(await outcomesOfChanges(asker, table, whereIs(table)), PERMANENT);
      expect(await outcomeOf(asker, `delete from ${table} where ${whereIs(table)}`)).toBe(asker === 'app' ? NO_RIGHT : PERMANENT);
      expect(await outcomeOf(asker, `truncate ${table} cascade`)).toBe(asker === 'app' ? NO_RIGHT : PERMANENT);
    }
  });

  it('lets none of its parts go to another coupon, and takes none of another', async () => {
    const { sealed, open } = shop;
    for (const asker of ASKERS) {
      for (const [from, to] of [
        [sealed, open],
        [open, sealed],
      ] as const) {
        const moves = {
          grid: `update test_grid set coupon_id = '${to.couponId}', number = 2 where id = '${from.gridId}'`,
          cell: `update cell set coupon_id = '${to.couponId}' where id = '${from.cellId}'`,
          photo: `update photo set coupon_id = '${to.couponId}', received_sha256 = 'other' where id = '${from.photoId}'`,
          rating: `update cell_rating set cell_id = '${to.cellId}' where id = '${from.ratingId}'`,
        };
        const outcomes: Record<string, string> = {};
        for (const [part, statement] of Object.entries(moves)) outcomes[part] = await outcomeOf(asker, statement);
        allAre(outcomes, PERMANENT);
      }
    }
  });

  it('takes no new part, but a late measurement that says why', async () => {
    const copyOf = (table: string, changes: Record<string, unknown>, where: string) =>
      `insert into ${table} select (jsonb_populate_record(t, '${JSON.stringify({ id: uuidv7(), ...changes })}')).* from ${table} t where ${where}`;
    for (const asker of ASKERS) {
      expect(await outcomeOf(asker, copyOf('test_grid', { number: 2 }, whereIs('test_grid')))).toBe(PERMANENT);
      expect(await outcomeOf(asker, copyOf('cell', { address: 'A2' }, whereIs('cell')))).toBe(PERMANENT);
      expect(await outcomeOf(asker, copyOf('photo', { received_sha256: 'other' }, whereIs('photo')))).toBe(PERMANENT);
      expect(await outcomeOf(asker, copyOf('cell_rating', {}, whereIs('cell_rating')))).toBe(PERMANENT);
      const measured = `cell_id = '${shop.sealed.cellId}'`;
      expect(await outcomeOf(asker, copyOf('measurement', { reason: '' }, measured))).toBe(PERMANENT);
      expect(await outcomeOf(asker, copyOf('measurement', { reason: 'measured again with the colorimeter' }, measured))).toBe(DONE);
    }
  });
});

describe('a submitted revision', () => {
  const isSubmitted = () => `id = '${shop.submitted.revisionId}'`;

  it('refuses a change of any column but those that move with its state, its removal and its emptying', async () => {
    for (const asker of ASKERS) {
      const outcomes = await outcomesOfChanges(asker, 'revision', isSubmitted(), ['state', 'version']);
      allAre(outcomes, PERMANENT);
      expect(await outcomeOf(asker, `delete from revision where ${isSubmitted()}`)).toBe(PERMANENT);
      expect(await outcomeOf(asker, 'truncate revision cascade')).toBe(asker === 'app' ? NO_RIGHT : PERMANENT);
    }
  });

  it('refuses a change of its content in the same statement that moves it on', async () => {
    const statement = `update revision set state = 'approved', content = '{"changed": true}' where ${isSubmitted()}`;
    for (const asker of ASKERS) expect(await outcomeOf(asker, statement)).toBe(PERMANENT);
  });

  it('keeps the time of its approval when it is withdrawn', async () => {
    const { revisionId } = await makeRevision(handle.db, shop, 'R-0002');
    await submit(revisionId);
    await connections.superuser`update revision set state = 'approved', approved_at = now() where id = ${revisionId}`;
    const withdraw = (more: string) => `update revision set state = 'withdrawn', withdrawn_at = now()${more} where id = '${revisionId}'`;
    for (const asker of ASKERS) {
      expect(await outcomeOf(asker, withdraw(`, approved_at = now() - interval '1 day'`))).toBe(PERMANENT);
      expect(await outcomeOf(asker, withdraw(''))).toBe(DONE);
    }
  });

  it('neither gains nor loses nor changes evidence', async () => {
    const { open, submitted, shopId, memberId } = shop;
    const link = `insert into revision_evidence (shop_id, revision_id, coupon_id, cell_id, kind, created_by)
      values ('${shopId}', '${submitted.revisionId}', '${open.couponId}', '${open.cellId}', 'confirmation', '${memberId}')`;
    for (const asker of ASKERS) {
      expect(await outcomeOf(asker, link)).toBe(PERMANENT);
      expect(await outcomeOf(asker, `delete from revision_evidence where revision_id = '${submitted.revisionId}'`)).toBe(PERMANENT);
      allAre(await outcomesOfChanges(asker, 'revision_evidence', `revision_id = '${submitted.revisionId}'`), PERMANENT);
      expect(await outcomeOf(asker, 'truncate revision_evidence')).toBe(asker === 'app' ? NO_RIGHT : PERMANENT);
    }
  });
});

type Arrows = Readonly<Record<string, readonly string[]>>;

/** Every way from a state to another, drawn or not. */
const pairsOf = (arrows: Arrows) =>
  Object.keys(arrows).flatMap((from) => Object.keys(arrows).flatMap((to) => (from === to ? [] : [[from, to] as const])));

/** The states between the first one and this, along the arrows. */
function wayTo(state: string, arrows: Arrows, first: string): string[] {
  if (state === first) return [];
  const before = Object.keys(arrows).find((from) => arrows[from]?.includes(state));
  if (before === undefined) throw new Error(`no arrow leads to ${state}`);
  return [...wayTo(before, arrows, first), state];
}

describe('the states of a revision', () => {
  const ARROWS: Arrows = {
    draft: ['in_review'],
    in_review: ['approved', 'scheduled', 'returned'],
    scheduled: ['approved', 'withdrawn'],
    approved: ['superseded', 'withdrawn'],
    returned: [],
    superseded: [],
    withdrawn: [],
  };
  let lastCode = 10;

  it.each(pairsOf(ARROWS))('from %s to %s: only along an arrow', async (from, to) => {
    lastCode += 1;
    const { revisionId } = await makeRevision(handle.db, shop, `R-${lastCode}`);
    const [firstStep, ...rest] = wayTo(from, ARROWS, 'draft');
    if (firstStep !== undefined) await submit(revisionId);
    await move('revision', revisionId, rest);
    const numbered = from === 'draft' ? `, number = 1, content_hash = 'x'` : '';
    for (const asker of ASKERS) {
      const outcome = await outcomeOf(asker, `update revision set state = '${to}'${numbered} where id = '${revisionId}'`);
      expect(outcome).toBe(ARROWS[from]?.includes(to) ? DONE : NO_SUCH_JUMP);
    }
  });

  it('begin with a draft', async () => {
    const copy = (state: string) => `insert into revision select (jsonb_populate_record(t,
      '{"id": "${uuidv7()}", "state": "${state}", "number": 9}')).* from revision t where id = '${shop.submitted.revisionId}'`;
    for (const asker of ASKERS)
      for (const state of Object.keys(ARROWS).filter((own) => own !== 'draft'))
        expect(await outcomeOf(asker, copy(state))).toBe(NO_SUCH_JUMP);
  });
});

describe('the states of a coupon', () => {
  const ARROWS: Arrows = { planned: ['marked'], marked: ['inspected'], inspected: ['sealed'], sealed: [] };
  let lastCode = 10;

  it.each(pairsOf(ARROWS))('from %s to %s: only along an arrow', async (from, to) => {
    lastCode += 1;
    const { couponId } = await makeCoupon(handle.db, shop, `C-${lastCode}`);
    await move('coupon', couponId, wayTo(from, ARROWS, 'planned'));
    // a sealed coupon refuses every change before anybody looks where it would lead
    const refused = from === 'sealed' ? PERMANENT : NO_SUCH_JUMP;
    for (const asker of ASKERS) {
      const outcome = await outcomeOf(asker, `update coupon set state = '${to}' where id = '${couponId}'`);
      expect(outcome).toBe(ARROWS[from]?.includes(to) ? DONE : refused);
    }
  });
});
