import { randomUUID } from 'node:crypto';
import type { Role } from '@proofplate/recipe-model';
import postgres from 'postgres';
import type { TestApp } from './app';
import { makeMember, TEST_PASSWORD, type TestMember } from './factories';
import { newKey } from './idempotency';
import { signInAs } from './sign-in';

export type ShopIds = {
  readonly shopId: string;
  /** Puts ids of the shop where a path names a parameter or a body an id in braces. */
  readonly fill: (text: string) => string;
  /** A fresh session of a member with the role, or of one made for a call that ends all of them. */
  readonly headersOf: (role: Role, isDisposable?: boolean) => Promise<Record<string, string>>;
};

/** Where each parameter of a path and each id in braces comes from. */
const PARAMETERS: Readonly<Record<string, string>> = {
  machineId: 'machine',
  lensId: 'lens',
  calibrationId: 'calibration',
  loggedTimeId: 'logged time',
  materialId: 'material',
  finishId: 'finish',
  groupId: 'group',
  effectId: 'effect',
  cautionId: 'caution',
  couponId: 'coupon',
  photoId: 'photo',
  recipeId: 'recipe',
  revisionId: 'revision',
  run: 'run',
  runId: 'run',
  holdId: 'hold',
  requestId: 'request',
};

const QUERIES: Readonly<Record<string, string>> = {
  machine: `select c.machine_id as id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  lens: `select c.lens_id as id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  calibration: `select c.calibration_id as id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  material: `select c.material_id as id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  finish: `select c.finish_id as id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  effect: `select c.effect_id as id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  coupon: `select c.id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  cell: `select e.id from cell e join photo p on p.coupon_id = e.coupon_id join coupon c on c.id = e.coupon_id order by c.code, e.address limit 1`,
  photo: `select p.id from coupon c join photo p on p.coupon_id = c.id order by c.code limit 1`,
  caution: `select id from caution order by id limit 1`,
  revision: `select id from revision where state = 'approved' order by id limit 1`,
  recipe: `select recipe_id as id from revision where state = 'approved' order by id limit 1`,
  draft: `select id from revision where state = 'draft' order by id limit 1`,
  run: `select r.id from run r join member m on m.id = r.created_by where m.role = 'operator' order by r.code limit 1`,
  hold: `select id from hold order by id limit 1`,
  request: `select id from setting_request where state = 'answered' order by id limit 1`,
};

/** Ids of the shop that the seed made, with what the seed leaves out: a group of materials and an invitation. */
export async function idsOfShop(test: TestApp): Promise<ShopIds> {
  const sql = postgres(test.database.superuser, { max: 1, onnotice: () => undefined });
  const found = new Map<string, string>([['password', TEST_PASSWORD]]);
  try {
    for (const [name, query] of Object.entries(QUERIES)) found.set(name, await oneId(sql, query));
    const shopId = await oneId(sql, 'select id from shop order by id limit 1');
    const members = new Map<Role, TestMember>();
    const shop = { id: shopId, name: '' };
    for (const role of ['trainee', 'operator', 'lead', 'owner'] as const) members.set(role, await makeMember(test, shop, role));
    const headersOf = async (role: Role, isDisposable = false) => {
      const member = isDisposable ? await makeMember(test, shop, role) : members.get(role);
      if (member === undefined) throw new Error(`nobody is ${role}`);
      const { personId, id: memberId } = member;
      return (await signInAs(test, { personId, shopId, memberId })).headers;
    };
    const owner = await headersOf('owner');
    found.set('group', await create(test, owner, '/api/material-groups', { name: 'Sheets', materialIds: [found.get('material')] }));
    found.set('invitation', await create(test, owner, '/api/invitations', { email: `${randomUUID()}@example.com`, role: 'trainee' }));
    found.set('member', (await makeMember(test, shop, 'trainee')).id);
    return { shopId, headersOf, fill: (text) => filled(text, found) };
  } finally {
    await sql.end();
  }
}

async function oneId(sql: postgres.Sql, query: string): Promise<string> {
  const [row] = await sql.unsafe<{ id: string }[]>(query);
  if (row === undefined) throw new Error(`nothing found: ${query}`);
  return row.id;
}

async function create(test: TestApp, headers: Record<string, string>, url: string, payload: object): Promise<string> {
  const answer = await test.app.inject({ method: 'POST', url, headers: { ...headers, ...newKey() }, payload });
  if (answer.statusCode !== 201) throw new Error(`${url}: ${answer.statusCode} ${answer.body}`);
  return answer.json<{ id: string }>().id;
}

function filled(text: string, found: ReadonlyMap<string, string>): string {
  const id = (name: string) => found.get(name) ?? randomUUID();
  return text
    .replace('/auth/sessions/:id', `/auth/sessions/${randomUUID()}`)
    .replace('/members/:id', `/members/${id('member')}`)
    .replace('/invitations/:id', `/invitations/${id('invitation')}`)
    .replace(':code', 'not-found')
    .replace(':size', 'small')
    .replace(/:([a-zA-Z]+)/g, (whole, name: string) => (PARAMETERS[name] === undefined ? whole : id(PARAMETERS[name])))
    .replace(/\{([a-z]+)\}/g, (whole, name: string) => found.get(name) ?? whole);
}
