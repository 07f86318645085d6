import { seedDemoShop } from '@proofplate/db/seed';
import { ROLES, type Role, roleAtLeast } from '@proofplate/recipe-model';
import { RIGHTS_MATRIX, type RightsRow } from './rights-matrix';
import { createTestApp, type TestApp } from './support/app';
import { makeMember, makeShop, type TestMember } from './support/factories';
import { newKey } from './support/idempotency';
import { type ObjectStore, startObjectStore } from './support/object-store';
import { idsOfShop, type ShopIds } from './support/shop-ids';

const PICTURE = { widthPx: 160, heightPx: 120 };
jest.setTimeout(180_000);
/** Answers of their own come from the framework, not from a handler: HEAD and OPTIONS follow the routes that they belong to. */
const WITHOUT_ROW = ['HEAD', 'OPTIONS'];

let test: TestApp;
let store: ObjectStore;
let ids: ShopIds;
let stranger: TestMember;
const registered = new Set<string>();

beforeAll(async () => {
  store = await startObjectStore();
  test = await createTestApp({
    env: { OBJECT_STORE_ENDPOINT: store.endpoint },
    onRoute: ({ method, url }) => {
      for (const each of [method].flat()) if (!WITHOUT_ROW.includes(each)) registered.add(`${each} ${url}`);
    },
  });
  const { OBJECT_STORE_BUCKET: bucket, OBJECT_STORE_ACCESS_KEY: accessKeyId, OBJECT_STORE_SECRET_KEY: secretAccessKey } = test.env;
  await seedDemoShop({
    databaseUrl: test.database.superuser,
    passwordPepper: test.env.PASSWORD_PEPPER,
    passwordCost: test.env.PASSWORD_COST,
    objectStore: { endpoint: store.endpoint, bucket, accessKeyId, secretAccessKey },
    pictureSize: PICTURE,
  });
  ids = await idsOfShop(test);
  stranger = await makeMember(test, await makeShop(test), 'owner');
});

afterAll(async () => {
  await test.close();
  await store.stop();
});

type Method = 'GET' | 'POST' | 'PUT' | 'PATCH' | 'DELETE';
type Call = { readonly headers?: Record<string, string>; readonly body?: object; readonly query?: string; readonly namesField?: boolean };

/** The answer as the table writes it. */
async function answerTo({ route }: RightsRow, { headers = {}, body, query, namesField = false }: Call): Promise<string> {
  const [method = '', path = ''] = route.split(' ');
  const url = ids.fill(`${path}${query === undefined ? '' : `?${query}`}`);
  const payload = body === undefined ? {} : { payload: JSON.parse(ids.fill(JSON.stringify(body))) };
  // the router registered these very methods
  const answer = await test.app.inject({ method: method as Method, url, headers, ...payload });
  const isProblem = String(answer.headers['content-type']).startsWith('application/problem+json');
  if (!isProblem) return String(answer.statusCode);
  const { code, errors: [first] = [] } = answer.json<{ code: string; errors?: { pointer: string }[] }>();
  const blamed = namesField && first !== undefined ? ` ${first.pointer}` : '';
  return `${answer.statusCode} ${code}${blamed}`;
}

const takesBody = ({ route }: RightsRow) => /^(?:POST|PUT|PATCH) /.test(route);
const isEnough = ({ least }: RightsRow, role: Role) => least === 'anybody' || roleAtLeast(role, least);

describe('the table of rights', () => {
  it('has exactly one row for every route', () => {
    const rows = RIGHTS_MATRIX.map(({ route }) => route);
    expect([...rows].sort()).toEqual([...registered].sort());
  });
});

describe.each(RIGHTS_MATRIX)('$route', (row) => {
  const own = (role: Role) => (typeof row.own === 'string' ? row.own : row.own[role]);

  it('answers each role as the table says', async () => {
    const empty = takesBody(row) ? { body: {} } : {};
    const answers: Record<string, string> = {};
    if (row.least !== 'anybody') answers.anonymous = await answerTo(row, empty);
    for (const role of ROLES) answers[role] = await answerTo(row, { ...empty, headers: await ids.headersOf(role, row.endsSessions) });
    const expected = Object.fromEntries(ROLES.map((role) => [role, isEnough(row, role) ? own(role) : '403 not-permitted']));
    expect(answers).toEqual({ ...(row.least === 'anybody' ? {} : { anonymous: '401 not-signed-in' }), ...expected });
  });

  const { foreign } = row;
  if (foreign === undefined) return;
  it('knows nothing of another shop', async () => {
    const headers = { ...stranger.headers, ...newKey(), 'if-match': '"v1"' };
    const { answer = '404 not-found', ...request } = foreign;
    expect(await answerTo(row, { headers, namesField: true, ...request })).toBe(answer);
  });
});
