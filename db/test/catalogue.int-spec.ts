import postgres from 'postgres';
import { cloneDatabase } from '../src/testing';

/** Tables known before any shop is. Each has been looked at: no shop_id, no direct rights for the application. */
const BEFORE_ANY_SHOP = ['account_event', 'password_reset', 'person', 'refresh_token', 'session', 'sign_in_throttle'];
/** Tables whose own id is the shop. */
const SHOP_ITSELF = ['shop'];
/** References to people, who may belong to several shops: the only keys that may leave the shop. */
const REFERENCES_TO_PEOPLE = ['member_person_id_person_id_fk'];
const PERMANENT = [
  'account_event',
  'coupon_correction',
  'deviation',
  'ledger_event',
  'logged_time',
  'machine_profile',
  'measurement',
  'part_set_up',
  'power_calibration',
  'sign_off',
  'spot_measurement',
  'training_record',
];

let sql: ReturnType<typeof postgres>;

beforeAll(async () => {
  const { superuser } = await cloneDatabase();
  sql = postgres(superuser, { max: 1, onnotice: () => undefined });
});
afterAll(() => sql.end());

async function tenantTables(): Promise<string[]> {
  const rows = await sql<{ name: string }[]>`
    select c.relname as name from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where n.nspname = 'public' and c.relkind in ('r', 'p') and c.relname <> all(${BEFORE_ANY_SHOP}) order by 1`;
  return rows.map((row) => row.name);
}

test('every table either carries shop_id or is on the reviewed list', async () => {
  const rows = await sql<{ name: string }[]>`
    select c.relname as name from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where n.nspname = 'public' and c.relkind in ('r', 'p')
      and not exists (select from pg_attribute a where a.attrelid = c.oid and a.attname = 'shop_id' and a.attnum > 0)
    order by 1`;
  const withoutShop = rows.map((row) => row.name);
  expect(withoutShop).toEqual([...BEFORE_ANY_SHOP.filter((name) => name !== 'session'), ...SHOP_ITSELF].sort());
});

test('every tenant table has forced row-level security with a policy that reads and writes one shop', async () => {
  for (const table of await tenantTables()) {
    const [security] = await sql<{ enabled: boolean; forced: boolean; reads: string | null; writes: string | null }[]>`
      select c.relrowsecurity as enabled, c.relforcerowsecurity as forced,
        pg_get_expr(p.polqual, p.polrelid) as reads, pg_get_expr(p.polwithcheck, p.polrelid) as writes
      from pg_class c left join pg_policy p on p.polrelid = c.oid where c.oid = ${table}::regclass`;
    expect({ table, enabled: security?.enabled, forced: security?.forced }).toEqual({ table, enabled: true, forced: true });
    expect(security?.reads).toContain("current_setting('app.shop_id'::text)");
    expect(security?.writes).toContain("current_setting('app.shop_id'::text)");
  }
});

test('primary keys, unique keys and foreign keys of tenant tables carry shop_id', async () => {
  const tables = (await tenantTables()).filter((table) => !SHOP_ITSELF.includes(table));
  const rows = await sql<{ name: string }[]>`
    select con.conname as name from pg_constraint con
    where con.contype in ('p', 'u', 'f') and con.conrelid = any(${tables}::regclass[])
      and not exists (select from pg_attribute a where a.attrelid = con.conrelid and a.attnum = any(con.conkey) and a.attname = 'shop_id')
    union all
    select i.indexrelid::regclass::text from pg_index i
    where i.indisunique and i.indrelid = any(${tables}::regclass[])
      and not exists (select from pg_attribute a where a.attrelid = i.indrelid and a.attnum = any(i.indkey) and a.attname = 'shop_id')
    order by 1`;
  expect(rows.map((row) => row.name)).toEqual(REFERENCES_TO_PEOPLE);
});

test('permanent tables refuse UPDATE, DELETE and TRUNCATE even to a superuser', async () => {
  for (const table of PERMANENT) {
    const rows = await sql<{ on_update: boolean; on_delete: boolean; on_truncate: boolean }[]>`
      select bool_or((tgtype & 16) <> 0) as on_update, bool_or((tgtype & 8) <> 0) as on_delete, bool_or((tgtype & 32) <> 0) as on_truncate
      from pg_trigger where tgrelid = ${table}::regclass and tgfoid = 'refuse_change'::regproc and tgenabled = 'O'`;
    expect({ table, ...rows[0] }).toEqual({ table, on_update: true, on_delete: true, on_truncate: true });
    await expect(sql.unsafe(`truncate ${table} cascade`)).rejects.toMatchObject({ code: 'PP001' });
  }
});

test('tables of the evidence refuse TRUNCATE', async () => {
  for (const table of ['coupon', 'test_grid', 'cell', 'cell_rating', 'photo', 'recipe', 'revision', 'revision_evidence', 'run', 'hold']) {
    await expect(sql.unsafe(`truncate ${table} cascade`)).rejects.toMatchObject({ code: 'PP001' });
  }
});

test('the application owns nothing, cannot bypass row-level security and has no right to truncate or to touch accounts directly', async () => {
  const [role] = await sql<{ bypass: boolean; superuser: boolean; owns: string }[]>`
    select rolbypassrls as bypass, rolsuper as superuser, (select count(*)::text from pg_class where relowner = r.oid) as owns
    from pg_roles r where rolname = 'proofplate_app'`;
  expect(role).toEqual({ bypass: false, superuser: false, owns: '0' });
  const rights = await sql<{ name: string }[]>`
    select table_name || ' ' || privilege_type as name from information_schema.role_table_grants
    where grantee = 'proofplate_app' and (privilege_type in ('TRUNCATE', 'REFERENCES', 'TRIGGER') or table_name = any(${BEFORE_ANY_SHOP}))`;
  expect(rights.map((row) => row.name)).toEqual([]);
});

test('facets are text with a check, never an enum type', async () => {
  const rows =
    await sql`select typname from pg_type t join pg_namespace n on n.oid = t.typnamespace where n.nspname = 'public' and typtype = 'e'`;
  expect(rows).toHaveLength(0);
});

test('functions that run with their owner’s rights fix their search_path', async () => {
  const rows = await sql<{ name: string }[]>`
    select p.proname as name from pg_proc p join pg_namespace n on n.oid = p.pronamespace
    where n.nspname = 'public' and p.prosecdef
      and not exists (select from unnest(coalesce(p.proconfig, '{}')) as setting where setting like 'search_path=%')`;
  expect(rows.map((row) => row.name)).toEqual([]);
});

test('views read with the rights of whoever asks, so that row-level security holds in them', async () => {
  const rows = await sql<{ name: string; options: string[] | null }[]>`
    select c.relname as name, c.reloptions as options from pg_class c join pg_namespace n on n.oid = c.relnamespace
    where n.nspname = 'public' and c.relkind in ('v', 'm') order by 1`;
  expect([...rows]).toEqual([{ name: 'revision_now', options: ['security_invoker=true'] }]);
});
