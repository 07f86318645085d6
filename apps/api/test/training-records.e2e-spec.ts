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

const LASER_SAFETY = { subject: 'Laser safety, yearly', taughtBy: 'R. Amsel', taughtOn: '2026-02-03', expiresOn: '2027-02-03' };
const urlOf = (memberId: string) => `/api/members/${memberId}/training-records`;
const list = (headers: Record<string, string>, memberId: string) => test.app.inject({ method: 'GET', url: urlOf(memberId), headers });
const add = (headers: Record<string, string>, memberId: string, payload: object = LASER_SAFETY) =>
  test.app.inject({ method: 'POST', url: urlOf(memberId), headers: { ...headers, ...newKey() }, payload });

describe('training records', () => {
  it('are written by an owner, read by a lead, the latest training first, and stand in the ledger', async () => {
    await add(staff.owner.headers, staff.operator.id, { subject: 'Rotary device', taughtBy: 'Jo Lind', taughtOn: '2026-05-04' });
    const answer = await add(staff.owner.headers, staff.operator.id);
    expect(answer.statusCode).toBe(201);
    const { items } = (await list(staff.lead.headers, staff.operator.id)).json<{ items: object[] }>();
    expect(items).toMatchObject([
      { subject: 'Rotary device', taughtOn: '2026-05-04', expiresOn: null, isExpired: false, recordedBy: staff.owner.printedName },
      { ...LASER_SAFETY, isExpired: false },
    ]);
    expect(answer.json()).toEqual({ items });
    const [event] = await asSuperuser(
      test,
      (sql) =>
        sql`select subject_id, after from ledger_event where shop_id = ${staff.shop.id} and action = 'member.trained' order by seq desc`,
    );
    expect(event).toEqual({ subject_id: staff.operator.id, after: LASER_SAFETY });
  });

  it('say when they no longer count', async () => {
    const past = { subject: 'Fire watch', taughtBy: 'Jo Lind', taughtOn: '2020-01-01', expiresOn: '2020-12-31' };
    const { items } = (await add(staff.owner.headers, staff.lead.id, past)).json<{ items: object[] }>();
    expect(items).toMatchObject([{ ...past, isExpired: true }]);
  });

  it('refuse days that cannot be, each at its field', async () => {
    const impossible = await add(staff.owner.headers, staff.trainee.id, { subject: ' ', taughtBy: 'Jo', taughtOn: '2026-02-30' });
    expect(pointersOf(expectProblem(impossible, 422, 'invalid-fields'))).toEqual(['#/subject', '#/taughtOn']);
    const reversed = { subject: 'Optics', taughtBy: 'Jo', taughtOn: '9999-01-01', expiresOn: '2026-01-01' };
    const answer = await add(staff.owner.headers, staff.trainee.id, reversed);
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/expiresOn', '#/taughtOn']);
    expect((await list(staff.owner.headers, staff.trainee.id)).json()).toEqual({ items: [] });
  });

  it('are no business of lower roles, anonymous callers and other shops', async () => {
    for (const member of [staff.trainee, staff.operator]) expectProblem(await list(member.headers, member.id), 403, 'not-permitted');
    expectProblem(await add(staff.lead.headers, staff.operator.id), 403, 'not-permitted');
    expectProblem(await list({}, staff.operator.id), 401, 'not-signed-in');
    expectProblem(await list(foreign.owner.headers, staff.operator.id), 404, 'not-found');
    expectProblem(await add(foreign.owner.headers, staff.operator.id), 404, 'not-found');
  });
});
