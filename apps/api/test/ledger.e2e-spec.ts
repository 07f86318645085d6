import { randomUUID } from 'node:crypto';
import { LedgerService } from '../src/ledger/ledger.service';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeStaffedShop, type TestMember } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
});
afterAll(() => test.close());

type Event = { seq: number; action: string; previousHash: string; hash: string; before: unknown; after: unknown };
const list = (headers: Record<string, string>, query = '') => test.app.inject({ url: `/api/ledger${query}`, headers });
const verify = (headers: Record<string, string>) => test.app.inject({ method: 'POST', url: '/api/ledger/verify', headers });

/** Events about a machine, written by an operator, one transaction each. */
async function write(actor: TestMember, count: number, subjectId = randomUUID()) {
  for (let number = 1; number <= count; number += 1) {
    await test.unitOfWork.run({ shopId: actor.shopId, memberId: actor.id }, (tx) =>
      test.app.get(LedgerService).record(tx, {
        actor: { shopId: actor.shopId, memberId: actor.id, printedName: actor.printedName, sessionId: actor.sessionId },
        action: 'machine.changed',
        subjectType: 'machine',
        subjectId,
        before: { name: `Laser ${number - 1}`, powerW: 0.1 + 0.2 },
        after: { name: `Laser ${number}`, notedAt: new Date(0), ü: 'é', missing: undefined },
      }),
    );
  }
  return subjectId;
}

describe('GET /api/ledger', () => {
  it('lists events newest first, each linked to the one before, a page at a time', async () => {
    const { operator, lead } = await makeStaffedShop(test);
    await write(operator, 5);
    const first = (await list(lead.headers, '?limit=4')).json<{ items: Event[]; nextCursor: string }>();
    const rest = (await list(lead.headers, `?limit=4&cursor=${first.nextCursor}`)).json<{ items: Event[]; nextCursor: null }>();
    const events = [...first.items, ...rest.items];
    expect(events.map(({ seq }) => seq)).toEqual([6, 5, 4, 3, 2, 1]);
    expect(events.map(({ previousHash }) => previousHash)).toEqual([...events.slice(1).map(({ hash }) => hash), '0'.repeat(64)]);
    expect(events[0]).toMatchObject({ after: { name: 'Laser 5', notedAt: '1970-01-01T00:00:00.000Z', ü: 'é' } });
    expect(rest.nextCursor).toBeNull();
  });

  it('finds the events of one thing', async () => {
    const { operator } = await makeStaffedShop(test);
    await write(operator, 2);
    const subjectId = await write(operator, 1);
    const found = (await list(operator.headers, `?subjectType=machine&subjectId=${subjectId}`)).json<{ items: Event[] }>();
    expect(found.items).toHaveLength(1);
  });

  it('hides people and policy from operators', async () => {
    const { operator, lead } = await makeStaffedShop(test);
    await write(operator, 1);
    const actionsFor = async (member: TestMember) =>
      (await list(member.headers)).json<{ items: Event[] }>().items.map(({ action }) => action);
    expect(await actionsFor(operator)).toEqual(['machine.changed']);
    expect(await actionsFor(lead)).toEqual(['machine.changed', 'shop.created']);
  });

  it('shows nothing of another shop', async () => {
    const [here, there] = [await makeStaffedShop(test), await makeStaffedShop(test)];
    const subjectId = await write(there.operator, 1);
    expect((await list(here.owner.headers, `?subjectId=${subjectId}`)).json()).toEqual({ items: [], nextCursor: null });
  });

  it('refuses trainees, anonymous calls and filters that make no sense', async () => {
    const { trainee, owner } = await makeStaffedShop(test);
    expectProblem(await list(trainee.headers), 403, 'not-permitted');
    expectProblem(await list({}), 401, 'not-signed-in');
    const problem = expectProblem(await list(owner.headers, '?subjectId=x&limit=0&since=1'), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/limit', '#/since', '#/subjectId']);
  });
});

describe('POST /api/ledger/verify', () => {
  it('finds an untouched chain intact', async () => {
    const { operator, lead } = await makeStaffedShop(test);
    await write(operator, 3);
    expect((await verify(lead.headers)).json()).toMatchObject({ isIntact: true, eventCount: 4, firstBrokenSeq: null, reason: null });
  });

  it.each([
    ['an edited value', `update ledger_event set after = '{"name": "Laser 9"}' where seq = 3`, 3, 'content changed'],
    ['another actor', `update ledger_event set actor_name = 'Somebody' where seq = 2`, 2, 'content changed'],
    ['another time', `update ledger_event set at = at + interval '1 millisecond' where seq = 4`, 4, 'content changed'],
    ['a deleted event', 'delete from ledger_event where seq = 3', 3, 'number missing'],
    ['a cut tail', 'delete from ledger_event where seq >= 4', 4, 'number missing'],
    ['another hash before', `update ledger_event set previous_hash = repeat('1', 64) where seq = 3`, 3, 'link broken'],
    ['another head', `update ledger_head set hash = repeat('1', 64)`, 5, 'link broken'],
  ])('names the first event that does not fit after %s', async (_, tampering, firstBrokenSeq, reason) => {
    const { shop, operator, lead } = await makeStaffedShop(test);
    await write(operator, 4);
    await asSuperuser(test, async (sql) => {
      await sql.begin(async (tx) => {
        // replica mode is how somebody with the database's own rights would get past the triggers
        await tx`set local session_replication_role = replica`;
        const target = tampering.includes('where')
          ? `${tampering} and shop_id = '${shop.id}'`
          : `${tampering} where shop_id = '${shop.id}'`;
        await tx.unsafe(target);
      });
    });
    expect((await verify(lead.headers)).json()).toMatchObject({ isIntact: false, firstBrokenSeq, reason });
  });

  it('is for leads and owners', async () => {
    const { trainee, operator, owner } = await makeStaffedShop(test);
    for (const member of [trainee, operator]) expectProblem(await verify(member.headers), 403, 'not-permitted');
    expectProblem(await verify({}), 401, 'not-signed-in');
    expect((await verify(owner.headers)).statusCode).toBe(200);
  });
});
