import { randomUUID } from 'node:crypto';
import { PasswordResetService } from '../src/auth/password-reset.service';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeMember, makeShop, type TestMember, type TestShop } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: TestShop;
let owner: TestMember;
beforeAll(async () => {
  test = await createTestApp();
  shop = await makeShop(test, { name: 'Bright Mark Works' });
  owner = await makeMember(test, shop, 'owner', { printedName: 'Ada Brandt' });
});
afterAll(() => test.close());

const NEW_PASSWORD = 'seven green bottles standing';
const post = (path: string, payload: object) => test.app.inject({ method: 'POST', url: `/api/auth/${path}`, payload });

/** The token of the newest mail to an address, as its reader would have it. */
async function tokenMailedTo(email: string): Promise<string> {
  const rows = await asSuperuser(
    test,
    (sql) => sql<{ token: string }[]>`select payload ->> 'token' as token from outbox
      where lower(payload -> 'to' ->> 'address') = ${email.toLowerCase()} order by id desc limit 1`,
  );
  return rows[0]?.token ?? '';
}

async function invite(role = 'operator', email = `${randomUUID()}@example.com`) {
  const headers = { ...owner.headers, ...newKey() };
  const answer = await test.app.inject({ method: 'POST', url: '/api/invitations', payload: { email, role }, headers });
  expect(answer.statusCode).toBe(201);
  return { email, id: answer.json<{ id: string }>().id, token: await tokenMailedTo(email) };
}

describe('an invitation', () => {
  it('shows what it is about and lets a new person in, once', async () => {
    const { email, token } = await invite('lead');
    const preview = await post('invitation-preview', { token });
    expect(preview.json()).toEqual({ shopName: 'Bright Mark Works', email, role: 'lead', hasAccount: false });
    const accepted = await post('accept-invitation', { token, name: 'Lin Okafor', password: NEW_PASSWORD });
    expect(accepted.statusCode).toBe(201);
    expect(accepted.json()).toMatchObject({
      person: { email },
      member: { role: 'lead', printedName: 'Lin Okafor' },
      shop: { id: shop.id },
    });
    expectProblem(await post('accept-invitation', { token, name: 'Lin Okafor', password: NEW_PASSWORD }), 409, 'invitation-not-usable');
    expectProblem(await post('invitation-preview', { token }), 409, 'invitation-not-usable');
  });

  it('asks a new person for a name and a good password, both at once', async () => {
    const { token } = await invite();
    const problem = expectProblem(await post('accept-invitation', { token, password: 'short' }), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/name', '#/password']);
  });

  it('needs the password of an address that has an account', async () => {
    const elsewhere = await makeMember(test, await makeShop(test), 'owner', { printedName: 'Mo Lindqvist' });
    const { token } = await invite('operator', elsewhere.email);
    expect((await post('invitation-preview', { token })).json()).toMatchObject({ hasAccount: true });
    expectProblem(await post('accept-invitation', { token, name: 'Impostor', password: NEW_PASSWORD }), 409, 'address-taken');
    const accepted = await post('accept-invitation', { token, password: elsewhere.password });
    expect(accepted.json()).toMatchObject({
      person: { id: elsewhere.personId },
      member: { printedName: 'Mo Lindqvist' },
      shop: { id: shop.id },
    });
  });

  it('is useless once a newer one was sent', async () => {
    const first = await invite();
    await invite('trainee', first.email);
    expectProblem(await post('invitation-preview', { token: first.token }), 409, 'invitation-not-usable');
  });

  it.each(['x', randomUUID(), Buffer.alloc(48, 1).toString('base64url')])('does not exist for a made-up token (%s)', async (token) => {
    expectProblem(await post('invitation-preview', { token }), 409, 'invitation-not-usable');
    expectProblem(await post('accept-invitation', { token, name: 'A', password: NEW_PASSWORD }), 409, 'invitation-not-usable');
  });

  it('has run out after three days', async () => {
    const { id, token } = await invite();
    await asSuperuser(test, (sql) => sql`update invitation set expires_at = now() where id = ${id}`);
    expectProblem(await post('accept-invitation', { token, name: 'A', password: NEW_PASSWORD }), 409, 'invitation-not-usable');
  });

  it('names every wrong field of an empty request', async () => {
    expect(pointersOf(expectProblem(await post('accept-invitation', {}), 422, 'invalid-fields'))).toEqual(['#/password', '#/token']);
    expect(pointersOf(expectProblem(await post('invitation-preview', {}), 422, 'invalid-fields'))).toEqual(['#/token']);
  });
});

describe('a forgotten password', () => {
  const forgot = async (email: string) => {
    const answer = await post('forgot-password', { email });
    await test.app.get(PasswordResetService).settled();
    return answer;
  };

  it('is answered alike for a known and an unknown address', async () => {
    const member = await makeMember(test, shop, 'operator');
    const [known, unknown] = [await forgot(member.email), await forgot(`${randomUUID()}@example.com`)];
    expect([known.statusCode, known.body]).toEqual([202, '']);
    expect([unknown.statusCode, unknown.body]).toEqual([202, '']);
  });

  it('is replaced by the link, once; every session ends', async () => {
    const member = await makeMember(test, shop, 'operator');
    await forgot(member.email);
    const token = await tokenMailedTo(member.email);
    expect((await post('reset-password', { token, password: NEW_PASSWORD })).statusCode).toBe(204);
    expectProblem(await test.app.inject({ url: '/api/session', headers: member.headers }), 401, 'session-over');
    expectProblem(await post('sign-in', { email: member.email, password: member.password }), 401, 'wrong-credentials');
    expect((await post('sign-in', { email: member.email, password: NEW_PASSWORD })).statusCode).toBe(200);
    expectProblem(await post('reset-password', { token, password: NEW_PASSWORD }), 409, 'reset-not-usable');
  });

  it('can only be replaced by the newest link', async () => {
    const member = await makeMember(test, shop, 'operator');
    await forgot(member.email);
    const first = await tokenMailedTo(member.email);
    await forgot(member.email);
    expectProblem(await post('reset-password', { token: first, password: NEW_PASSWORD }), 409, 'reset-not-usable');
  });

  it('cannot be replaced after half an hour', async () => {
    const member = await makeMember(test, shop, 'operator');
    await forgot(member.email);
    await asSuperuser(test, (sql) => sql`update password_reset set expires_at = now() where person_id = ${member.personId}`);
    expectProblem(
      await post('reset-password', { token: await tokenMailedTo(member.email), password: NEW_PASSWORD }),
      409,
      'reset-not-usable',
    );
  });

  it('is asked for with an address and replaced by a good one', async () => {
    expect(pointersOf(expectProblem(await post('forgot-password', { email: 'x' }), 422, 'invalid-fields'))).toEqual(['#/email']);
    const problem = expectProblem(await post('reset-password', { token: '', password: 'passwordpassword' }), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/password', '#/token']);
  });
});
