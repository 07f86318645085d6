import { randomUUID } from 'node:crypto';
import { LedgerService } from '../src/ledger/ledger.service';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeMember, makeShop, type TestShop } from './support/factories';

let test: TestApp;
let shop: TestShop;
beforeAll(async () => {
  test = await createTestApp();
  shop = await makeShop(test);
});
afterAll(() => test.close());

const entry = (number: number) => ({
  actor: { shopId: shop.id, printedName: 'Test' },
  action: 'machine.changed',
  subjectType: 'machine',
  subjectId: randomUUID(),
  after: { number },
});
const seqs = async () => {
  const rows = await asSuperuser(
    test,
    (sql) => sql<{ seq: string }[]>`select seq from ledger_event where shop_id = ${shop.id} order by seq`,
  );
  return rows.map((row) => Number(row.seq));
};

describe('LedgerService.record()', () => {
  it('leaves nothing when the transaction fails, and no gap', async () => {
    const before = await seqs();
    const failing = test.unitOfWork.run({ shopId: shop.id }, async (tx) => {
      await test.app.get(LedgerService).record(tx, entry(1));
      throw new Error('the use case fails after its event');
    });
    await expect(failing).rejects.toThrow('the use case fails');
    expect(await seqs()).toEqual(before);
    await test.unitOfWork.run({ shopId: shop.id }, (tx) => test.app.get(LedgerService).record(tx, entry(2)));
    expect(await seqs()).toEqual([...before, before.length + 1]);
  });

  it('keeps one chain without gaps under forty writers at once', async () => {
    const before = (await seqs()).length;
    const writers = Array.from({ length: 40 }, (_, number) =>
      test.unitOfWork.run({ shopId: shop.id }, (tx) => test.app.get(LedgerService).record(tx, entry(number))),
    );
    await Promise.all(writers);
    expect(await seqs()).toEqual(Array.from({ length: before + 40 }, (_, index) => index + 1));
    const lead = await makeMember(test, shop, 'lead');
    const verified = await test.app.inject({ method: 'POST', url: '/api/ledger/verify', headers: lead.headers });
    expect(verified.json()).toMatchObject({ isIntact: true, eventCount: before + 40 });
  });

  it('is written after everything else of its transaction', async () => {
    const order: string[] = [];
    await test.unitOfWork.run({ shopId: shop.id }, async (tx) => {
      await test.app.get(LedgerService).record(tx, entry(1));
      const rows = await tx.execute<{ locked: boolean }>(`select exists (select from pg_locks l join pg_class c on c.oid = l.relation
        where c.relname = 'ledger_head' and l.pid = pg_backend_pid()) as locked`);
      order.push(rows[0]?.locked === true ? 'head touched first' : 'head untouched');
    });
    expect(order).toEqual(['head untouched']);
  });

  it('refuses rows of another shop, whatever the caller says', async () => {
    const other = await makeShop(test);
    const stray = test.unitOfWork.run({ shopId: other.id }, (tx) => test.app.get(LedgerService).record(tx, entry(1)));
    await expect(stray).rejects.toThrow('the shop has no ledger');
  });
});
