import { AccountsRepository } from '../src/auth/accounts.repository';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeMember, makeShop, TEST_PASSWORD, type TestMember, type TestShop } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';
import { signInAs } from './support/sign-in';

const NEW_PASSWORD = 'slow barges under willow';

let test: TestApp;
let shop: TestShop;
let person: TestMember;
beforeAll(async () => {
  test = await createTestApp();
  shop = await makeShop(test, { name: 'Quay Marking' });
});
beforeEach(async () => {
  person = await makeMember(test, shop, 'trainee');
});
afterAll(() => test.close());

type Session = { id: string; isCurrent: boolean; shopName: string | null; userAgent: string | null; lastSeenAt: string };
const changePassword = (headers: Record<string, string>, payload: object) =>
  test.app.inject({ method: 'POST', url: '/api/auth/change-password', headers, payload });
const sessionsOf = (headers: Record<string, string>) => test.app.inject({ method: 'GET', url: '/api/auth/sessions', headers });
const end = (headers: Record<string, string>, id: string) =>
  test.app.inject({ method: 'DELETE', url: `/api/auth/sessions/${id}`, headers });
const signIn = (password: string) =>
  test.app.inject({ method: 'POST', url: '/api/auth/sign-in', payload: { email: person.email, password } });
const otherDevice = () => signInAs(test, { personId: person.personId, shopId: shop.id, memberId: person.id });
const eventKinds = async () => {
  const rows = await asSuperuser(
    test,
    (sql) => sql<{ kind: string }[]>`select kind from account_event where person_id = ${person.personId}`,
  );
  return rows.map(({ kind }) => kind);
};

describe('POST /api/auth/change-password', () => {
  it('sets the new password, keeps this device and signs every other one out at once', async () => {
    const other = await otherDevice();
    const answer = await changePassword(person.headers, { password: TEST_PASSWORD, newPassword: NEW_PASSWORD });
    expect(answer.statusCode).toBe(204);
    expect((await sessionsOf(person.headers)).statusCode).toBe(200);
    expectProblem(await sessionsOf(other.headers), 401, 'session-over');
    expectProblem(await signIn(TEST_PASSWORD), 401, 'wrong-credentials');
    expect((await signIn(NEW_PASSWORD)).statusCode).toBe(200);
    expect(await eventKinds()).toContain('password changed');
  });

  it('makes a reset link useless that was sent before', async () => {
    const accounts = test.app.get(AccountsRepository);
    const hash = `hash of ${person.id}`;
    await test.unitOfWork.outsideShop((db) => accounts.openReset(db, hash, person.personId, 30));
    await changePassword(person.headers, { password: TEST_PASSWORD, newPassword: NEW_PASSWORD });
    expect(await test.unitOfWork.outsideShop((db) => accounts.resetPassword(db, hash, 'x'))).toBeUndefined();
  });

  it('refuses a wrong present password at its field and changes nothing', async () => {
    const other = await otherDevice();
    const refused = await changePassword(person.headers, { password: 'not this one at all', newPassword: NEW_PASSWORD });
    expect(pointersOf(expectProblem(refused, 403, 'password-not-confirmed'))).toEqual(['#/password']);
    expect((await sessionsOf(other.headers)).statusCode).toBe(200);
    expect((await signIn(TEST_PASSWORD)).statusCode).toBe(200);
  });

  it('lets nobody at an unlocked screen guess the password', async () => {
    const tries = [];
    for (let attempt = 0; attempt < 6; attempt += 1)
      tries.push(await changePassword(person.headers, { password: `guess number ${attempt}`, newPassword: NEW_PASSWORD }));
    expect(tries.map(({ statusCode }) => statusCode)).toEqual([403, 403, 403, 403, 403, 429]);
  });

  it('refuses a new password that is too weak, unknown fields and anonymous calls', async () => {
    const weak = await changePassword(person.headers, { password: TEST_PASSWORD, newPassword: 'short', personId: person.personId });
    expect(pointersOf(expectProblem(weak, 422, 'invalid-fields'))).toEqual(['#/newPassword', '#/personId']);
    expectProblem(await changePassword({}, { password: TEST_PASSWORD, newPassword: NEW_PASSWORD }), 401, 'not-signed-in');
  });
});

describe('/api/auth/sessions', () => {
  it('lists the devices of the person alone, this one marked', async () => {
    const other = await otherDevice();
    await makeMember(test, shop, 'owner');
    const { items } = (await sessionsOf(person.headers)).json<{ items: Session[] }>();
    expect(items).toHaveLength(2);
    expect(items.find(({ id }) => id === person.sessionId)).toMatchObject({ isCurrent: true, shopName: 'Quay Marking', userAgent: 'test' });
    expect(items.find(({ id }) => id === other.sessionId)).toMatchObject({ isCurrent: false });
  });

  it('signs one device out at once, after which it is no longer listed', async () => {
    const other = await otherDevice();
    expect((await end(person.headers, other.sessionId)).statusCode).toBe(204);
    expectProblem(await sessionsOf(other.headers), 401, 'session-over');
    const { items } = (await sessionsOf(person.headers)).json<{ items: Session[] }>();
    expect(items.map(({ id }) => id)).toEqual([person.sessionId]);
    expectProblem(await end(person.headers, other.sessionId), 404, 'not-found');
    expect(await eventKinds()).toContain('session ended');
  });

  it('touches no session of anybody else', async () => {
    const owner = await makeMember(test, shop, 'owner');
    expectProblem(await end(owner.headers, person.sessionId), 404, 'not-found');
    expect((await sessionsOf(person.headers)).statusCode).toBe(200);
    expectProblem(await end({}, person.sessionId), 401, 'not-signed-in');
    expectProblem(await sessionsOf({}), 401, 'not-signed-in');
  });
});
