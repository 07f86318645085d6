import { randomUUID } from 'node:crypto';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeStaffedShop } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let staff: Awaited<ReturnType<typeof makeStaffedShop>>;
let foreign: Awaited<ReturnType<typeof makeStaffedShop>>;
beforeAll(async () => {
  test = await createTestApp();
  staff = await makeStaffedShop(test);
  foreign = await makeStaffedShop(test);
});
afterAll(() => test.close());

const invite = (headers: Record<string, string>, payload: object) =>
  test.app.inject({ method: 'POST', url: '/api/invitations', headers: { ...newKey(), ...headers }, payload });
const newInvitation = () => ({ email: `${randomUUID()}@example.com`, role: 'operator' });

describe('POST /api/invitations', () => {
  it('sends one and shows no secret', async () => {
    const body = newInvitation();
    const answer = await invite(staff.owner.headers, body);
    expect(answer.statusCode).toBe(201);
    expect(answer.json()).toMatchObject({ ...body, state: 'open', invitedBy: staff.owner.printedName, allowedActions: ['revoke'] });
    expect(answer.body).not.toMatch(/token/i);
  });

  it('refuses an address that is in the shop already', async () => {
    expectProblem(await invite(staff.owner.headers, { email: staff.lead.email.toUpperCase(), role: 'lead' }), 409, 'already-member');
  });

  it('is for owners', async () => {
    for (const member of [staff.trainee, staff.operator, staff.lead])
      expectProblem(await invite(member.headers, newInvitation()), 403, 'not-permitted');
    expectProblem(await invite({}, newInvitation()), 401, 'not-signed-in');
  });

  it('names every wrong field', async () => {
    const problem = expectProblem(
      await invite(staff.owner.headers, { email: 'x', role: 'boss', state: 'accepted' }),
      422,
      'invalid-fields',
    );
    expect(pointersOf(problem)).toEqual(['#/email', '#/role', '#/state']);
  });
});

describe('GET and DELETE /api/invitations', () => {
  const list = (headers: Record<string, string>) => test.app.inject({ url: '/api/invitations', headers });
  const revoke = (id: string, headers: Record<string, string>) =>
    test.app.inject({ method: 'DELETE', url: `/api/invitations/${id}`, headers });

  it('shows leads the invitations of the own shop and owners how to take one back', async () => {
    const { id } = (await invite(staff.owner.headers, newInvitation())).json<{ id: string }>();
    const seen = (await list(staff.lead.headers)).json<{ items: { id: string; allowedActions: string[] }[] }>().items;
    expect(seen.find((item) => item.id === id)).toMatchObject({ state: 'open', allowedActions: [] });
    expect((await list(foreign.owner.headers)).json()).toMatchObject({ items: [] });
    expect((await revoke(id, staff.owner.headers)).statusCode).toBe(204);
    expectProblem(await revoke(id, staff.owner.headers), 409, 'invitation-not-usable');
  });

  it('refuses lower roles, anonymous calls and other shops', async () => {
    const { id } = (await invite(staff.owner.headers, newInvitation())).json<{ id: string }>();
    expectProblem(await list(staff.operator.headers), 403, 'not-permitted');
    expectProblem(await list({}), 401, 'not-signed-in');
    expectProblem(await revoke(id, staff.lead.headers), 403, 'not-permitted');
    expectProblem(await revoke(id, {}), 401, 'not-signed-in');
    expectProblem(await revoke(id, foreign.owner.headers), 404, 'not-found');
  });
});

describe('an Idempotency-Key', () => {
  it('is needed, and says so', async () => {
    const answer = await test.app.inject({
      method: 'POST',
      url: '/api/invitations',
      headers: staff.owner.headers,
      payload: newInvitation(),
    });
    expect(expectProblem(answer, 400, 'idempotency-key-required').detail).toContain('Idempotency-Key');
    expectProblem(await invite({ ...staff.owner.headers, 'idempotency-key': 'short' }, newInvitation()), 400, 'idempotency-key-required');
  });

  it('gives a repeat the first answer and no second effect', async () => {
    const [key, body] = [newKey(), newInvitation()];
    const first = await invite({ ...staff.owner.headers, ...key }, body);
    const again = await invite({ ...staff.owner.headers, ...key }, body);
    expect([again.statusCode, again.json(), again.headers['idempotency-replayed']]).toEqual([201, first.json(), 'true']);
    expect(first.headers['idempotency-replayed']).toBeUndefined();
  });

  it('belongs to one request', async () => {
    const key = newKey();
    await invite({ ...staff.owner.headers, ...key }, newInvitation());
    expectProblem(await invite({ ...staff.owner.headers, ...key }, newInvitation()), 422, 'idempotency-key-reused');
  });

  it('is free again after a refusal, which left nothing', async () => {
    const key = newKey();
    expectProblem(await invite({ ...staff.owner.headers, ...key }, { email: staff.lead.email, role: 'lead' }), 409, 'already-member');
    expect((await invite({ ...staff.owner.headers, ...key }, newInvitation())).statusCode).toBe(201);
  });

  it('means nothing to another member or shop', async () => {
    const [key, body] = [newKey(), newInvitation()];
    const [one, other] = [await invite({ ...staff.owner.headers, ...key }, body), await invite({ ...foreign.owner.headers, ...key }, body)];
    expect(other.headers['idempotency-replayed']).toBeUndefined();
    expect(other.json<{ id: string }>().id).not.toBe(one.json<{ id: string }>().id);
  });

  it('used ten times at once has one effect; nobody gets another answer', async () => {
    const [key, body] = [newKey(), newInvitation()];
    const answers = await Promise.all(Array.from({ length: 10 }, () => invite({ ...staff.owner.headers, ...key }, body)));
    const created = answers.filter(({ statusCode }) => statusCode === 201);
    expect(new Set(created.map((answer) => answer.body)).size).toBe(1);
    for (const answer of answers.filter(({ statusCode }) => statusCode !== 201)) expectProblem(answer, 409, 'request-in-flight');
  });

  it('is forgotten after two days, when the member uses the next one', async () => {
    const key = newKey();
    await invite({ ...staff.owner.headers, ...key }, newInvitation());
    await asSuperuser(
      test,
      (sql) => sql`update idempotency_key set created_at = now() - interval '49 hours' where key = ${key['idempotency-key']}`,
    );
    await invite(staff.owner.headers, newInvitation());
    const kept = await asSuperuser(test, (sql) => sql`select key from idempotency_key where key = ${key['idempotency-key']}`);
    expect(kept).toHaveLength(0);
  });
});
