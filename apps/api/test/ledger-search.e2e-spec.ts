import { randomUUID } from 'node:crypto';
import { LedgerService } from '../src/ledger/ledger.service';
import { firstFault, GENESIS_HASH, type LinkedEvent, linkEvent } from '../src/ledger/ledger-chain';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { editing } from './support/equipment';
import { makeMember, makeShop, makeStaffedShop, type TestMember } from './support/factories';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
beforeAll(async () => {
  test = await createTestApp();
});
afterAll(() => test.close());

type Written = { action?: string; subjectType?: string; subjectId?: string; subjectCode?: string; before?: unknown; after?: unknown };
const write = (actor: TestMember, entry: Written) =>
  test.unitOfWork.run({ shopId: actor.shopId }, (tx) =>
    test.app.get(LedgerService).record(tx, {
      actor: { shopId: actor.shopId, memberId: actor.id, printedName: actor.printedName, sessionId: actor.sessionId },
      ...{ action: 'coupon.planned', subjectType: 'coupon', subjectId: randomUUID() },
      ...entry,
    }),
  );
const get = (headers: Record<string, string>, path: string) => test.app.inject({ method: 'GET', url: `/api/ledger${path}`, headers });
const seqsOf = async (headers: Record<string, string>, query: string) =>
  (await get(headers, query)).json<{ items: { seq: number }[] }>().items.map(({ seq }) => seq);

/** Many events in one statement, linked as the service links them. */
async function continueChain(shopId: string, count: number): Promise<void> {
  await asSuperuser(test, async (sql) => {
    const [first] = await sql<{ hash: string }[]>`select hash from ledger_head where shop_id = ${shopId}`;
    let head = { seq: 1, hash: first?.hash ?? '' };
    const rows = Array.from({ length: count }, (_, number) => {
      const who = { shopId, actorMemberId: null, actorName: 'Test', sessionId: null };
      const what = { action: 'coupon.planned', subjectType: 'coupon', subjectId: randomUUID(), subjectCode: null };
      const event = linkEvent({ ...who, at: new Date(number).toISOString(), ...what, before: null, after: null }, head);
      head = { seq: event.seq, hash: event.hash };
      return {
        ...{ shop_id: shopId, seq: event.seq, at: event.at, actor_name: event.actorName, action: event.action },
        ...{ subject_type: event.subjectType, subject_id: event.subjectId },
        ...{ body_hash: event.bodyHash, previous_hash: event.previousHash, hash: event.hash },
      };
    });
    await sql.begin(async (tx) => {
      await tx`set local session_replication_role = replica`;
      await tx`insert into ledger_event ${tx(rows)}`;
      await tx`update ledger_head set seq = ${head.seq}, hash = ${head.hash} where shop_id = ${shopId}`;
    });
  });
}

describe('searching the ledger', () => {
  it('finds a code and what belongs to it, and no longer code that begins the same', async () => {
    const { operator } = await makeStaffedShop(test);
    for (const subjectCode of ['C-0117', 'C-0117 B4', 'C-01170', 'C-011', 'C-0118']) await write(operator, { subjectCode });
    expect(await seqsOf(operator.headers, '?subjectCode=c-0117')).toEqual([3, 2]);
    expect(await seqsOf(operator.headers, '?subjectCode=C-0117%20B4')).toEqual([3]);
  });

  it('finds who did it and what was done, together', async () => {
    const { operator, lead } = await makeStaffedShop(test);
    await write(operator, {});
    await write(lead, {});
    await write(lead, { action: 'coupon.sealed' });
    expect(await seqsOf(operator.headers, `?actorMemberId=${lead.id}`)).toEqual([4, 3]);
    expect(await seqsOf(operator.headers, `?actorMemberId=${lead.id}&action=coupon.planned`)).toEqual([3]);
  });

  it('takes days as those of the shop, both ends included', async () => {
    const { shop, operator, lead } = await makeStaffedShop(test);
    // in Berlin: one minute before and at midnight of 14 May, and one minute before and at midnight of 15 May
    const moments = ['2026-05-13T21:59:00Z', '2026-05-13T22:00:00Z', '2026-05-14T21:59:00Z', '2026-05-14T22:00:00Z'];
    for (const _ of moments) await write(operator, {});
    await asSuperuser(test, (sql) =>
      sql.begin(async (tx) => {
        await tx`set local session_replication_role = replica`;
        for (const [index, at] of moments.entries())
          await tx`update ledger_event set at = ${at} where shop_id = ${shop.id} and seq = ${index + 2}`;
      }),
    );
    expect(await seqsOf(lead.headers, '?action=coupon.planned&fromDay=2026-05-14&toDay=2026-05-14')).toEqual([4, 3]);
    expect(await seqsOf(lead.headers, '?action=coupon.planned&toDay=2026-05-13')).toEqual([2]);
    expect(await seqsOf(lead.headers, '?action=coupon.planned&fromDay=2026-05-15')).toEqual([5]);
  });

  it('refuses days that no calendar has and codes that nobody reads', async () => {
    const { operator } = await makeStaffedShop(test);
    const problem = expectProblem(await get(operator.headers, '?fromDay=2026-02-30&subjectCode=%25'), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/fromDay', '#/subjectCode']);
  });
});

describe('GET /api/ledger/actors', () => {
  it('names everybody who is or was in the shop', async () => {
    const shop = await makeShop(test);
    const owner = await makeMember(test, shop, 'owner', { printedName: 'Amy Rook' });
    const left = await makeMember(test, shop, 'operator', { printedName: 'Ben Holt' });
    await test.app.inject({ method: 'DELETE', url: `/api/members/${left.id}`, headers: editing(owner, 1) });
    expect((await get(owner.headers, '/actors')).json()).toEqual({
      items: [
        { memberId: owner.id, name: 'Amy Rook', isActive: true },
        { memberId: left.id, name: 'Ben Holt', isActive: false },
      ],
    });
  });

  it('is for those who may read the ledger', async () => {
    const { trainee } = await makeStaffedShop(test);
    expectProblem(await get(trainee.headers, '/actors'), 403, 'not-permitted');
    expectProblem(await get({}, '/actors'), 401, 'not-signed-in');
  });
});

describe('exporting the ledger', () => {
  it('gives a JSON file from which the chain can be recomputed, over several stretches', async () => {
    const { shop, lead } = await makeStaffedShop(test);
    await continueChain(shop.id, 1_001);
    const answer = await get(lead.headers, '/export.json');
    expect(answer.headers).toMatchObject({
      'content-type': 'application/json; charset=utf-8',
      'content-disposition': 'attachment; filename="ledger.json"',
      'cache-control': 'no-store',
    });
    const file = answer.json<{ shopId: string; headSeq: number; headHash: string; events: LinkedEvent[] }>();
    expect(file).toMatchObject({ shopId: shop.id, headSeq: 1_002 });
    expect(file.events.map(({ seq }) => seq)).toEqual(Array.from({ length: 1_002 }, (_, index) => index + 1));
    expect(firstFault(file.events, { seq: 0, hash: GENESIS_HASH })).toBeUndefined();
    expect(file.events.at(-1)?.hash).toBe(file.headHash);
  });

  it('gives a CSV file of what was searched for, in which no cell is a formula', async () => {
    const { operator, lead } = await makeStaffedShop(test);
    await write(operator, { subjectCode: 'C-0001' });
    await asSuperuser(test, (sql) => sql`update member set printed_name = '=1+1' where id = ${lead.id}`);
    await write({ ...lead, printedName: '=1+1' }, { subjectCode: 'C-0002', before: { title: 'a' }, after: { title: 'b, "c"' } });
    const answer = await get(lead.headers, '/export.csv?subjectCode=C-0002');
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8');
    const [header, row, ...rest] = answer.body
      .replace(/^\uFEFF/, '')
      .trimEnd()
      .split('\n');
    expect(header).toMatch(/^Number,Time \(UTC\),Who,What,Kind of thing,Code,Id,Before,After,/);
    expect(row).toContain(`,'=1+1,coupon.planned,coupon,C-0002,`);
    expect(row).toContain('"{""title"":""b, \\""c\\""""}"');
    expect(rest).toEqual([]);
  });

  it('gives a file without rows when nothing matches', async () => {
    const { owner } = await makeStaffedShop(test);
    expect((await get(owner.headers, '/export.json?action=no.such')).json()).toMatchObject({ events: [] });
  });

  it('is for leads and owners', async () => {
    const { trainee, operator } = await makeStaffedShop(test);
    for (const path of ['/export.csv', '/export.json']) {
      for (const member of [trainee, operator]) expectProblem(await get(member.headers, path), 403, 'not-permitted');
      expectProblem(await get({}, path), 401, 'not-signed-in');
    }
    const { lead } = await makeStaffedShop(test);
    expect(pointersOf(expectProblem(await get(lead.headers, '/export.csv?limit=5'), 422, 'invalid-fields'))).toEqual(['#/limit']);
  });
});
