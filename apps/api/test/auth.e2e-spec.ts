import { createHmac, randomUUID } from 'node:crypto';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeMember, makeShop, TEST_PASSWORD } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
});
afterAll(() => test.close());

/** A network address of its own keeps one test's failures from counting against another's. */
let lastAddress = 0;
const newAddress = () => `10.1.${Math.floor(++lastAddress / 250)}.${(lastAddress % 250) + 1}`;

const ORIGIN = 'http://localhost:3000';
const SAME_ORIGIN = { origin: ORIGIN, 'x-requested-by': 'web' };
const post = (path: string, payload: object, headers: Record<string, string> = {}, remoteAddress = newAddress()) =>
  test.app.inject({ method: 'POST', url: `/api/auth/${path}`, payload, headers, remoteAddress });
const cookieOf = (answer: { cookies: { name: string; value: string }[] }) => {
  const cookie = answer.cookies.find(({ name }) => name === 'proofplate-refresh');
  return cookie === undefined ? '' : `${cookie.name}=${cookie.value}`;
};
const refresh = (cookie: string, headers: Record<string, string> = SAME_ORIGIN) => post('refresh', {}, { ...headers, cookie });
const session = (accessToken: string) => test.app.inject({ url: '/api/session', headers: { authorization: `Bearer ${accessToken}` } });

const newSignUp = (overrides: object = {}) => ({
  shopName: 'Bright Mark Works',
  name: 'Ada Brandt',
  email: `${randomUUID()}@example.com`,
  password: TEST_PASSWORD,
  unitSystem: 'metric',
  timeZone: 'Europe/Berlin',
  locale: 'en-GB',
  ...overrides,
});

describe('POST /api/auth/sign-up', () => {
  it('founds a shop, makes the person its owner and signs in', async () => {
    const body = newSignUp();
    const answer = await post('sign-up', body);
    expect(answer.statusCode).toBe(201);
    expect(answer.json()).toMatchObject({
      accessToken: expect.any(String),
      expiresAt: expect.any(String),
      person: { name: 'Ada Brandt', email: body.email },
      member: { role: 'owner', printedName: 'Ada Brandt' },
      shop: { name: 'Bright Mark Works', unitSystem: 'metric', timeZone: 'Europe/Berlin', locale: 'en-GB' },
      shops: [{ name: 'Bright Mark Works', role: 'owner' }],
    });
    expect(answer.headers['set-cookie']).toMatch(/^proofplate-refresh=[\w-]{43}; Max-Age=2592000; Path=\/; HttpOnly; SameSite=Strict$/);
  });

  it('names every wrong field and gives back no password', async () => {
    const answer = await post('sign-up', {
      shopName: ' ',
      name: 7,
      email: 'nobody',
      password: 'short',
      unitSystem: 'cubits',
      timeZone: 'Moon/Base',
      locale: '!',
    });
    const problem = expectProblem(answer, 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/email', '#/locale', '#/name', '#/password', '#/shopName', '#/timeZone', '#/unitSystem']);
    expect(answer.body).not.toContain('"short"');
  });

  it('refuses fields that nobody asked for', async () => {
    const problem = expectProblem(await post('sign-up', newSignUp({ role: 'owner', shopId: randomUUID() })), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/role', '#/shopId']);
  });

  it('founds a second shop for the same person with the right password, and refuses a wrong one', async () => {
    const first = newSignUp();
    await post('sign-up', first);
    const second = await post('sign-up', { ...first, shopName: 'Annex' });
    expect(second.json<{ shops: { name: string }[] }>().shops.map(({ name }) => name)).toEqual(['Annex', 'Bright Mark Works']);
    expectProblem(await post('sign-up', { ...first, password: 'another kettle on the roof' }), 409, 'address-taken');
  });
});

describe('POST /api/auth/sign-in', () => {
  it('opens a new session in the shop asked for', async () => {
    const [alpha, beta] = [await makeShop(test, { name: 'Alpha' }), await makeShop(test, { name: 'Beta' })];
    const member = await makeMember(test, alpha, 'operator');
    const signUp = await post('sign-up', newSignUp({ email: member.email, shopName: 'Gamma' }));
    expect(signUp.statusCode).toBe(201);
    const plain = await post('sign-in', { email: member.email.toUpperCase(), password: TEST_PASSWORD });
    expect(plain.json()).toMatchObject({ shop: { name: 'Alpha' }, member: { role: 'operator' } });
    const chosen = await post('sign-in', {
      email: member.email,
      password: TEST_PASSWORD,
      shopId: signUp.json<{ shop: { id: string } }>().shop.id,
    });
    expect(chosen.json()).toMatchObject({ shop: { name: 'Gamma' }, member: { role: 'owner' } });
    expectProblem(await post('sign-in', { email: member.email, password: TEST_PASSWORD, shopId: beta.id }), 403, 'no-shop');
  });

  it('answers a wrong password and an unknown address alike', async () => {
    const member = await makeMember(test, await makeShop(test), 'operator');
    const [wrong, unknown] = [
      await post('sign-in', { email: member.email, password: 'another kettle on the roof' }),
      await post('sign-in', { email: `${randomUUID()}@example.com`, password: 'another kettle on the roof' }),
    ];
    const strip = (answer: typeof wrong) => ({ ...expectProblem(answer, 401, 'wrong-credentials'), instance: '' });
    expect(strip(wrong)).toEqual(strip(unknown));
    expect(wrong.cookies).toEqual([]);
  });

  it('names every wrong field', async () => {
    expect(pointersOf(expectProblem(await post('sign-in', {}), 422, 'invalid-fields'))).toEqual(['#/email', '#/password']);
  });

  it('makes an account wait after the fourth wrong password, whoever tries and even with the right one', async () => {
    const member = await makeMember(test, await makeShop(test), 'operator');
    const guess = () => post('sign-in', { email: member.email, password: 'another kettle on the roof' });
    for (let attempt = 1; attempt <= 4; attempt += 1) expectProblem(await guess(), 401, 'wrong-credentials');
    const blocked = await guess();
    expectProblem(blocked, 429, 'too-many-tries');
    expect(Number(blocked.headers['retry-after'])).toBeGreaterThan(0);
    expectProblem(await post('sign-in', { email: member.email, password: member.password }), 429, 'too-many-tries');
  });

  it('stops an address that tries a hundred accounts', async () => {
    const address = newAddress();
    const guess = () => post('sign-in', { email: `${randomUUID()}@example.com`, password: 'another kettle on the roof' }, {}, address);
    for (let attempt = 1; attempt <= 100; attempt += 1) expect((await guess()).statusCode).toBe(401);
    expectProblem(await guess(), 429, 'too-many-tries');
  });
});

describe('GET /api/session', () => {
  it('says who is signed in, and where', async () => {
    const shop = await makeShop(test);
    const member = await makeMember(test, shop, 'trainee');
    const answer = await test.app.inject({ url: '/api/session', headers: member.headers });
    expect(answer.json()).toMatchObject({
      person: { id: member.personId },
      member: { id: member.id, role: 'trainee' },
      shop: { id: shop.id },
    });
    expect(answer.json()).not.toHaveProperty('accessToken');
  });

  it('needs a token', async () => {
    const answer = await test.app.inject({ url: '/api/session' });
    expectProblem(answer, 401, 'not-signed-in');
    expect(answer.headers['www-authenticate']).toBe('Bearer');
  });

  it('refuses every token that is not exactly one of ours', async () => {
    const member = await makeMember(test, await makeShop(test), 'owner');
    const [head = '', body = '', signature = ''] = member.headers.authorization.slice('Bearer '.length).split('.');
    const claims = JSON.parse(Buffer.from(body, 'base64url').toString()) as Record<string, unknown>;
    const sign = (header: object, content: object, secret = test.env.JWT_SECRET) => {
      const text = [header, content].map((part) => Buffer.from(JSON.stringify(part)).toString('base64url')).join('.');
      return `${text}.${createHmac('sha256', secret).update(text).digest('base64url')}`;
    };
    const header = { alg: 'HS256', typ: 'JWT' };
    expect((await session(sign(header, claims))).statusCode).toBe(200);
    const forged = [
      `${head}.${body}.${signature.slice(0, -2)}`,
      `${Buffer.from('{"alg":"none"}').toString('base64url')}.${body}.x`,
      sign(header, claims, 'a secret of somebody else'),
      sign({ alg: 'HS512', typ: 'JWT' }, claims),
      sign(header, { ...claims, typ: 'refresh' }),
      sign(header, { ...claims, aud: 'elsewhere' }),
      sign(header, { ...claims, iss: 'elsewhere' }),
      sign(header, { ...claims, exp: 1 }),
      sign(header, { ...claims, ver: 2 }),
      sign(header, { ...claims, sid: randomUUID() }),
      sign(header, { ...claims, sub: randomUUID() }),
    ];
    for (const token of forged) expectProblem(await session(token), 401, 'session-over');
  });
});

describe('POST /api/auth/refresh', () => {
  const signIn = async () => {
    const body = newSignUp();
    return post('sign-up', body);
  };

  it('gives a new access token and replaces the cookie', async () => {
    const first = cookieOf(await signIn());
    const answer = await refresh(first);
    expect(answer.statusCode).toBe(200);
    expect(cookieOf(answer)).not.toBe(first);
    expect((await session(answer.json<{ accessToken: string }>().accessToken)).statusCode).toBe(200);
  });

  it('gives the same successor to a second tab within the grace time', async () => {
    const first = cookieOf(await signIn());
    const [one, two] = [await refresh(first), await refresh(first)];
    expect(cookieOf(two)).toBe(cookieOf(one));
  });

  it('ends the session for everybody when an old token comes back later', async () => {
    const first = cookieOf(await signIn());
    const next = await refresh(first);
    await ageUsedTokens();
    expectProblem(await refresh(first), 401, 'session-over');
    expectProblem(await refresh(cookieOf(next)), 401, 'session-over');
    expectProblem(await session(next.json<{ accessToken: string }>().accessToken), 401, 'session-over');
  });

  it('clears the cookie of a token that nobody gave out', async () => {
    const answer = await refresh('proofplate-refresh=made-up');
    expectProblem(answer, 401, 'session-over');
    expect(answer.cookies).toEqual([expect.objectContaining({ name: 'proofplate-refresh', value: '' })]);
    expectProblem(await post('refresh', {}, SAME_ORIGIN), 401, 'session-over');
  });

  it.each([
    ['another site', { origin: 'https://evil.example', 'x-requested-by': 'web' }],
    ['a site whose name begins alike', { origin: `${ORIGIN}.evil.example`, 'x-requested-by': 'web' }],
    ['a page without an origin', { origin: 'null', 'x-requested-by': 'web' }],
    ['no origin at all', { 'x-requested-by': 'web' }],
    ['a form, which cannot set the header', { origin: ORIGIN }],
  ])('refuses %s', async (_, headers) => {
    const cookie = cookieOf(await signIn());
    expectProblem(await refresh(cookie, headers as Record<string, string>), 403, 'wrong-origin');
    expect((await refresh(cookie)).statusCode).toBe(200);
  });
});

describe('signing out', () => {
  it('ends the session at once, cookie and access token', async () => {
    const signedIn = await post('sign-up', newSignUp());
    const cookie = cookieOf(signedIn);
    const answer = await post('sign-out', {}, { ...SAME_ORIGIN, cookie });
    expect(answer.statusCode).toBe(204);
    expect(answer.headers['clear-site-data']).toBe('"cache"');
    expectProblem(await refresh(cookie), 401, 'session-over');
    expectProblem(await session(signedIn.json<{ accessToken: string }>().accessToken), 401, 'session-over');
    expectProblem(await post('sign-out', {}, { cookie }), 403, 'wrong-origin');
  });

  it('everywhere ends the sessions of every device', async () => {
    const body = newSignUp();
    const here = await post('sign-up', body);
    const there = await post('sign-in', { email: body.email, password: body.password });
    const token = (answer: typeof here) => answer.json<{ accessToken: string }>().accessToken;
    const answer = await post('sign-out-everywhere', {}, { authorization: `Bearer ${token(here)}` });
    expect(answer.statusCode).toBe(204);
    for (const device of [here, there]) {
      expectProblem(await session(token(device)), 401, 'session-over');
      expectProblem(await refresh(cookieOf(device)), 401, 'session-over');
    }
    expectProblem(await post('sign-out-everywhere', {}), 401, 'not-signed-in');
    const again = await post('sign-in', { email: body.email, password: body.password });
    expect((await session(token(again))).statusCode).toBe(200);
  });
});

/** Moves the uses of all tokens back in time, out of the grace. */
const ageUsedTokens = () => asSuperuser(test, (sql) => sql`update refresh_token set used_at = used_at - interval '11 seconds'`);
