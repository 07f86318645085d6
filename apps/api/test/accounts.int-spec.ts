import { randomUUID } from 'node:crypto';
import { AccountsRepository } from '../src/auth/accounts.repository';
import { SessionOverError } from '../src/auth/auth.errors';
import { PasswordHasher } from '../src/auth/hashing/password-hasher';
import { SessionsService } from '../src/auth/sessions.service';
import { readEnv } from '../src/config/env.validation';
import { InvitationsService } from '../src/members/invitations.service';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeMember, makeShop, type TestMember } from './support/factories';
import { expectProblem } from './support/problem';
import { TEST_DEVICE } from './support/sign-in';

let test: TestApp;
let owner: TestMember;
beforeAll(async () => {
  test = await createTestApp();
  owner = await makeMember(test, await makeShop(test), 'owner');
});
afterAll(() => test.close());

describe('refresh()', () => {
  const open = () => {
    const opening = { personId: owner.personId, version: 1, shopId: owner.shopId, memberId: owner.id, device: TEST_DEVICE };
    return test.unitOfWork.outsideShop((db) => test.app.get(SessionsService).open(db, opening));
  };

  it('gives fifty callers at once one and the same successor: never two live branches', async () => {
    const { refreshToken, sessionId } = await open();
    const sessions = test.app.get(SessionsService);
    const results = await Promise.all(
      Array.from({ length: 50 }, () => sessions.refresh(refreshToken, TEST_DEVICE).catch((error: unknown) => error)),
    );
    const successors = results.flatMap((result) =>
      typeof result === 'object' && result !== null && 'refreshToken' in result ? [result.refreshToken] : [],
    );
    expect(new Set(successors).size).toBe(1);
    const unused = await asSuperuser(
      test,
      (sql) => sql`select token_hash from refresh_token where session_id = ${sessionId} and used_at is null`,
    );
    expect(unused).toHaveLength(1);
  });

  it('forgets sealed successors once their grace is over', async () => {
    const { refreshToken, sessionId } = await open();
    const sessions = test.app.get(SessionsService);
    const next = await sessions.refresh(refreshToken, TEST_DEVICE);
    await asSuperuser(
      test,
      (sql) => sql`update refresh_token set used_at = used_at - interval '11 seconds' where session_id = ${sessionId}`,
    );
    await sessions.refresh(next.refreshToken, TEST_DEVICE);
    const sealed = await asSuperuser(
      test,
      (sql) => sql`select token_hash from refresh_token where session_id = ${sessionId} and successor is not null`,
    );
    expect(sealed).toHaveLength(1);
  });

  it('notes the reuse of a token as an account event and says no more than that the session is over', async () => {
    const { refreshToken } = await open();
    const sessions = test.app.get(SessionsService);
    await sessions.refresh(refreshToken, TEST_DEVICE);
    await asSuperuser(test, (sql) => sql`update refresh_token set used_at = used_at - interval '11 seconds'`);
    await expect(sessions.refresh(refreshToken, TEST_DEVICE)).rejects.toThrow(SessionOverError);
    const events = await asSuperuser(test, (sql) => sql`select kind from account_event where kind = 'refresh token reused'`);
    expect(events).toHaveLength(1);
  });
});

describe('an invitation accepted by two at once', () => {
  it('makes one member, whoever is first', async () => {
    const shop = await makeShop(test);
    const host = await makeMember(test, shop, 'owner');
    const accept = (token: string) =>
      test.app.inject({
        method: 'POST',
        url: '/api/auth/accept-invitation',
        payload: { token, name: 'Lin Okafor', password: 'seven green bottles standing' },
      });
    for (let round = 0; round < 10; round += 1) {
      const email = `${randomUUID()}@example.com`;
      await test.app.get(InvitationsService).create({ ...host, memberId: host.id }, { email, role: 'operator' });
      const [mail] = await asSuperuser(
        test,
        (sql) => sql<{ token: string }[]>`select payload ->> 'token' as token from outbox where payload -> 'to' ->> 'address' = ${email}`,
      );
      const answers = await Promise.all([accept(mail?.token ?? ''), accept(mail?.token ?? '')]);
      expect(answers.map(({ statusCode }) => statusCode).sort()).toEqual([201, 409]);
    }
    const members = await asSuperuser(test, (sql) => sql`select id from member where shop_id = ${shop.id} and role = 'operator'`);
    expect(members).toHaveLength(10);
  });
});

describe('the tables of accounts', () => {
  it('hold no password, no token and no address of a tried account in the clear', async () => {
    await test.app.inject({
      method: 'POST',
      url: '/api/auth/sign-in',
      payload: { email: owner.email, password: 'another kettle on the roof' },
    });
    const rows = await asSuperuser(
      test,
      (sql) => sql<{ text: string }[]>`select person.password_hash as text from person union all select token_hash from refresh_token
        union all select subject from sign_in_throttle`,
    );
    const text = rows.map((row) => row.text).join('\n');
    expect(text).toMatch(/\$2b\$04\$/);
    for (const secret of [owner.password, 'another kettle', owner.email]) expect(text).not.toContain(secret);
  });

  it.each(['person', 'session', 'refresh_token', 'password_reset', 'sign_in_throttle', 'account_event'])(
    'give the api no direct right on %s',
    async (table) => {
      const reading = test.unitOfWork.outsideShop((db) => db.execute(`select * from ${table}`));
      await expect(reading).rejects.toMatchObject({ cause: { code: '42501' } });
    },
  );
});

describe('sign-in', () => {
  it('brings an old hash to the present cost', async () => {
    const member = await makeMember(test, await makeShop(test), 'operator');
    const costlier = await hashAtCost('5', member.password);
    await asSuperuser(test, (sql) => sql`update person set password_hash = ${costlier} where id = ${member.personId}`);
    const answer = await test.app.inject({
      method: 'POST',
      url: '/api/auth/sign-in',
      payload: { email: member.email, password: member.password },
    });
    expect(answer.statusCode).toBe(200);
    const person = await test.unitOfWork.outsideShop((db) => test.app.get(AccountsRepository).findPerson(db, member.personId));
    expect(person?.passwordHash).toMatch(/^\$2b\$04\$/);
  });
});

describe('in production', () => {
  it('a password that nobody could choose opens nothing, such as that of a demo shop', async () => {
    const secrets = { JWT_SECRET: 'a'.repeat(43), PASSWORD_PEPPER: 'b'.repeat(43), URL_SIGNING_SECRET: 'c'.repeat(43) };
    const served = { NODE_ENV: 'production', PASSWORD_COST: '12', PUBLIC_ORIGIN: 'https://plates.example' };
    const live = await createTestApp({ env: { ...secrets, ...served } });
    const shop = await makeShop(live);
    const signIn = async (password: string) => {
      const { email } = await makeMember(live, shop, 'owner', { password });
      return live.app.inject({ method: 'POST', url: '/api/auth/sign-in', payload: { email, password } });
    };
    expectProblem(await signIn('proofplate demo owner'), 401, 'wrong-credentials');
    expect((await signIn('violet kettle on the roof')).statusCode).toBe(200);
    await live.close();
  });
});

/** A hash of the same secret with another cost. */
async function hashAtCost(cost: string, password: string): Promise<string> {
  const hasher = new PasswordHasher(readEnv({ NODE_ENV: 'test', PASSWORD_COST: cost }));
  try {
    return await hasher.hash(password);
  } finally {
    await hasher.onApplicationShutdown();
  }
}
