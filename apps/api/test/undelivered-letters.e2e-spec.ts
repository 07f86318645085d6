import { OutboxService } from '../src/mail/outbox.service';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeStaffedShop } from './support/factories';
import { expectProblem } from './support/problem';

let test: TestApp;
let staff: Awaited<ReturnType<typeof makeStaffedShop>>;
beforeAll(async () => {
  test = await createTestApp();
  staff = await makeStaffedShop(test);
});
afterAll(() => test.close());

const list = (headers: Record<string, string>) => test.app.inject({ method: 'GET', url: '/api/undelivered-letters', headers });
const writeLetter = (shopId: string, address: string) =>
  test.unitOfWork.run({ shopId }, (tx) =>
    test.app.get(OutboxService).add(tx, {
      ...{ shopId, kind: 'password-reset' },
      payload: { to: { name: 'Ann', address }, token: 'secret of the link', expiresAt: '2030-01-01T00:00:00Z' },
    }),
  );

describe('GET /api/undelivered-letters', () => {
  it('tells an owner which letters never arrived and why, without what they held', async () => {
    await writeLetter(staff.shop.id, 'typo@exmaple.invalid');
    await writeLetter(staff.shop.id, 'waiting@example.invalid');
    await asSuperuser(
      test,
      (sql) => sql`update outbox set state = 'failed', failure = '550 no such mailbox' where payload #>> '{to,address}' like 'typo%'`,
    );
    const answer = await list(staff.owner.headers);
    expect(answer.json()).toMatchObject({
      items: [{ kind: 'password-reset', address: 'typo@exmaple.invalid', reason: '550 no such mailbox', writtenAt: expect.any(String) }],
    });
    expect(answer.body).not.toContain('secret');
  });

  it('shows nothing of another shop', async () => {
    const there = await makeStaffedShop(test);
    expect((await list(there.owner.headers)).json()).toEqual({ items: [] });
  });

  it('is for owners', async () => {
    for (const member of [staff.trainee, staff.operator, staff.lead]) expectProblem(await list(member.headers), 403, 'not-permitted');
    expectProblem(await list({}), 401, 'not-signed-in');
  });
});
