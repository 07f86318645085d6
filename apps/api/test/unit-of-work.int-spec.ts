import { inspect } from 'node:util';
import { sql } from 'drizzle-orm';
import { UnavailableError } from '../src/common/errors/domain-error';
import { Codes } from '../src/database/codes.repository';
import type { Tx } from '../src/database/unit-of-work';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { makeShop, type TestShop } from './support/factories';

let test: TestApp;
let shop: TestShop;
beforeAll(async () => {
  test = await createTestApp();
  shop = await makeShop(test);
});
afterAll(() => test.close());

describe('UnitOfWork', () => {
  it('shows a transaction the rows of its shop only', async () => {
    const other = await makeShop(test);
    const names = await test.unitOfWork.read({ shopId: shop.id }, (tx) => tx.execute<{ id: string }>('select id from shop'));
    expect(names.map(({ id }) => id)).toEqual([shop.id]);
    expect(names.map(({ id }) => id)).not.toContain(other.id);
  });

  it('refuses writes in a read', async () => {
    const writing = test.unitOfWork.read({ shopId: shop.id }, (tx) => tx.execute(`update shop set name = 'x'`));
    await expect(writing).rejects.toMatchObject({ cause: { code: '25006' } });
  });

  it('leaves shop tables closed outside a shop', async () => {
    const reading = test.unitOfWork.outsideShop((db) => db.execute('select * from shop'));
    await expect(reading).rejects.toMatchObject({ cause: { code: expect.stringMatching(/^(?:42704|22P02)$/) } });
  });

  it('repeats a read once when its backend was told to go, and no write', async () => {
    let attempts = 0;
    const killedOnce = async (run: 'read' | 'run') => {
      attempts = 0;
      return test.unitOfWork[run]({ shopId: shop.id }, async (tx) => {
        attempts += 1;
        if (attempts > 1) return 'answered';
        const [row] = await tx.execute<{ pid: number }>('select pg_backend_pid() as pid');
        await asSuperuser(test, (sql) => sql`select pg_terminate_backend(${row?.pid ?? 0})`);
        await tx.execute('select 1');
        return 'never reached';
      });
    };
    await expect(killedOnce('read')).resolves.toBe('answered');
    await expect(killedOnce('run')).rejects.toThrow();
    expect(attempts).toBe(1);
  });

  it('tells of a failed statement without the values that were sent with it', async () => {
    const secret = 'token-that-nobody-may-read';
    const failing = (db: Pick<Tx, 'execute'>) => db.execute(sql`select ${secret}::text, 1 / 0`);
    for (const run of [
      () => test.unitOfWork.run({ shopId: shop.id }, failing),
      () => test.unitOfWork.read({ shopId: shop.id }, failing),
      () => test.unitOfWork.outsideShop(failing),
    ]) {
      const error: unknown = await run().catch((failure: unknown) => failure);
      expect(error).toMatchObject({ cause: { code: '22012' } });
      expect(inspect(error)).not.toContain(secret);
    }
  });

  it('gives up a statement at its limit', async () => {
    const slow = test.unitOfWork.read({ shopId: shop.id }, (tx) => tx.execute('select pg_sleep(5)'), { statementTimeoutMs: 50 });
    await expect(slow).rejects.toMatchObject({ cause: { code: '57014' } });
  });
});

describe('Codes.nextCode()', () => {
  const next = (shopId: string) => test.unitOfWork.run({ shopId }, (tx) => test.app.get(Codes).nextCode(tx, shopId, 'coupon'));

  it('counts per shop and kind, without doubles under load', async () => {
    const fresh = await makeShop(test);
    const codes = await Promise.all(Array.from({ length: 20 }, () => next(fresh.id)));
    expect(codes.sort()).toEqual(Array.from({ length: 20 }, (_, index) => `C-${String(index + 1).padStart(4, '0')}`));
    const kinds = await test.unitOfWork.run({ shopId: fresh.id }, async (tx) => {
      const codeOf = (kind: 'recipe' | 'run') => test.app.get(Codes).nextCode(tx, fresh.id, kind);
      return [await codeOf('recipe'), await codeOf('run')];
    });
    expect(kinds).toEqual(['R-0001', 'J-0001']);
  });

  it('leaves no gap behind a transaction that failed', async () => {
    const fresh = await makeShop(test);
    const failing = test.unitOfWork.run({ shopId: fresh.id }, async (tx) => {
      await test.app.get(Codes).nextCode(tx, fresh.id, 'coupon');
      throw new UnavailableError();
    });
    await expect(failing).rejects.toThrow(UnavailableError);
    expect(await next(fresh.id)).toBe('C-0001');
  });
});
