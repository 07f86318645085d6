import { randomUUID } from 'node:crypto';
import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { CorrectionDto, InspectionDto } from '../src/coupons/dto/inspection.dto';
import { createTestApp, type TestApp } from './support/app';
import { makePlanningShop, type PlanningShop } from './support/coupons';
import { asSuperuser } from './support/database';
import { editing } from './support/equipment';
import { newKey } from './support/idempotency';
import { inspectionOf, makeMarkedCoupon, putPhoto, rateAll, setPhotoState } from './support/inspections';
import { expectProblem, pointersOf } from './support/problem';

// A marked coupon takes ten requests, more than the usual time on a busy machine.

let test: TestApp;
let shop: PlanningShop;
let elsewhere: PlanningShop;
let coupon: CouponDto;
let calls: ReturnType<typeof inspectionOf>;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makePlanningShop(test), await makePlanningShop(test)];
});
beforeEach(async () => {
  coupon = await makeMarkedCoupon(test, shop);
  calls = inspectionOf(test, coupon.id, shop.operator);
});
afterAll(() => test.close());

const cellId = (address: string) => coupon.cells.find((cell) => cell.address === address)?.id ?? '';
const DARK = { quantity: 'lightness', comparison: 'at most', value: 30 };
const seal = async () => {
  await rateAll(test, coupon, shop.operator);
  await putPhoto(test, coupon, shop.operator, 'ready');
  await calls.inspect();
  return calls.seal();
};

describe('acceptance criteria', () => {
  it('are proposed by the effect, recorded with their units, and may be recorded anew until the first result', async () => {
    const before = await calls.read();
    expect(before).toMatchObject({ criteria: null, areCriteriaFixed: false });
    expect(before.missingToInspect.map(({ code }) => code)).toEqual(['criteria', 'ratings']);
    const recorded = (await calls.recordCriteria([DARK])).json<InspectionDto>();
    expect(recorded).toMatchObject({ criteria: [{ ...DARK, unit: '1' }], criteriaRecordedAt: expect.any(String) });
    expect(recorded.version).toBe(before.version + 1);
    expect((await calls.recordCriteria([{ ...DARK, value: 35 }])).statusCode).toBe(200);
    await calls.rate([{ cellId: cellId('A1'), seenVersion: null, rating: 3 }]);
    expectProblem(await calls.recordCriteria([{ ...DARK, value: 60 }]), 409, 'criteria-fixed');
    expect(await calls.read()).toMatchObject({ criteria: [{ value: 35 }], areCriteriaFixed: true });
  });

  it('of an older version, with a wrong unit or the limits the wrong way round are refused', async () => {
    const url = `/api/coupons/${coupon.id}/criteria`;
    const stale = await test.app.inject({ method: 'PUT', url, headers: editing(shop.operator, 99), payload: { criteria: [] } });
    expectProblem(stale, 412, 'stale-version');
    const bad = await calls.recordCriteria([
      { ...DARK, unit: 'µm' },
      { quantity: 'depth', comparison: 'between', value: 30, upper: 20 },
    ]);
    expect(pointersOf(expectProblem(bad, 422, 'invalid-fields'))).toEqual(['#/criteria/0/unit', '#/criteria/1/upper']);
  });
});

describe('the inspection', () => {
  it('ends when every cell is rated, skipped, or named with the reason', async () => {
    await calls.recordCriteria([]);
    await calls.rate([{ cellId: cellId('A1'), seenVersion: null, rating: 5 }]);
    const early = expectProblem(await calls.inspect(), 409, 'inspection-incomplete');
    expect(early).toMatchObject({ missing: [{ code: 'ratings', addresses: ['B1', 'B2'] }] });
    await calls.rate([{ cellId: cellId('B1'), seenVersion: null, rating: null, note: 'dirty' }]);
    const unratedCells = ['B1', 'B2'].map((address) => ({ cellId: cellId(address), reason: 'plate bent there' }));
    const done = await calls.inspect({ unratedCells });
    expect(done.json<CouponDto>()).toMatchObject({ state: 'inspected', inspected: { by: shop.operator.printedName } });
    const { ratings } = await calls.read();
    expect(ratings.map(({ rating, tags, note }) => [rating, tags, note])).toEqual([
      [5, [], ''],
      [null, ['not rated'], 'dirty – plate bent there'],
      [null, ['not rated'], 'plate bent there'],
    ]);
    expectProblem(await calls.inspect(), 409, 'coupon-state');
  });

  it('refuses a reason for a rated or foreign cell and a reason without words', async () => {
    await rateAll(test, coupon, shop.operator);
    const bad = await calls.inspect({
      unratedCells: [
        { cellId: cellId('A1'), reason: 'why' },
        { cellId: randomUUID(), reason: 'why' },
      ],
    });
    expect(pointersOf(expectProblem(bad, 422, 'invalid-fields'))).toEqual(['#/unratedCells/0/cellId', '#/unratedCells/1/cellId']);
    const blank = await calls.inspect({ unratedCells: [{ cellId: cellId('A1'), reason: ' ' }] });
    expect(pointersOf(expectProblem(blank, 422, 'invalid-fields'))).toEqual(['#/unratedCells/0/reason']);
  });
});

describe('the seal', () => {
  it('is refused with everything that is missing', async () => {
    await putPhoto(test, coupon, shop.operator, 'processing');
    const problem = expectProblem(await calls.seal(), 409, 'not-ready-to-seal');
    expect(problem).toMatchObject({
      missing: ['criteria', 'ratings', 'inspection', 'photo', 'photo-processing'].map((code) => ({ code })),
    });
  });

  it('waits for a photo that is still being processed', async () => {
    await rateAll(test, coupon, shop.operator);
    await calls.inspect();
    await putPhoto(test, coupon, shop.operator, 'ready');
    const pending = await putPhoto(test, coupon, shop.operator, 'processing');
    expect(expectProblem(await calls.seal(), 409, 'not-ready-to-seal')).toMatchObject({ missing: [{ code: 'photo-processing' }] });
    await setPhotoState(test, pending, 'refused');
    expect((await calls.seal()).json<CouponDto>()).toMatchObject({ state: 'sealed', sealed: { by: shop.operator.printedName } });
  });

  it('makes the coupon citable and closes it for good, with an event for each step', async () => {
    expect((await seal()).statusCode).toBe(200);
    const rating = { cellId: cellId('A1'), seenVersion: 1, rating: 1 };
    const depth = { cellId: cellId('A1'), quantity: 'depth', value: 1, method: 'manual' };
    expectProblem(await calls.rate([rating]), 409, 'coupon-sealed');
    expectProblem(await calls.measure([depth]), 409, 'coupon-sealed');
    expectProblem(await calls.recordCriteria([]), 409, 'coupon-sealed');
    expectProblem(await calls.inspect(), 409, 'coupon-sealed');
    expectProblem(await calls.seal(), 409, 'coupon-sealed');
    expect((await calls.read()).allowedActions).toEqual(expect.arrayContaining(['correct', 'draft-recipe']));
    const events = await asSuperuser(test, (sql) => sql`select action from ledger_event where subject_id = ${coupon.id} order by seq`);
    expect(events.map(({ action }) => action).slice(-4)).toEqual([
      'coupon.criteria-recorded',
      'coupon.cells-rated',
      'coupon.inspected',
      'coupon.sealed',
    ]);
  });

  it('happens once when it is sent twice with the same key, and not at all on an older version', async () => {
    await rateAll(test, coupon, shop.operator);
    await putPhoto(test, coupon, shop.operator, 'ready');
    const inspected = (await calls.inspect()).json<CouponDto>();
    const url = `/api/coupons/${coupon.id}/seal`;
    const send = (version: number, key = newKey()) =>
      test.app.inject({ method: 'POST', url, headers: { ...editing(shop.operator, version), ...key } });
    expectProblem(await send(inspected.version - 1), 412, 'stale-version');
    const key = newKey();
    const [first, second] = [await send(inspected.version, key), await send(inspected.version, key)];
    expect([first.statusCode, second.statusCode, second.headers['idempotency-replayed']]).toEqual([200, 200, 'true']);
  });

  it('and a rating at the same moment never leave a rating on a sealed coupon that the seal did not see', async () => {
    await rateAll(test, coupon, shop.operator);
    await putPhoto(test, coupon, shop.operator, 'ready');
    await calls.inspect();
    const change = { cellId: cellId('A1'), seenVersion: 1, rating: 2 };
    const [sealed, rated] = await Promise.all([calls.seal(), calls.rate([change])]);
    expect(sealed.statusCode).toBe(200);
    const stored = (await calls.read()).ratings.find((row) => row.cellId === cellId('A1'))?.rating;
    expect([rated.statusCode, stored]).toEqual(rated.statusCode === 200 ? [200, 2] : [409, 4]);
  });
});

describe('corrections', () => {
  it('stand beside a sealed coupon with their reason', async () => {
    await seal();
    const whole = await calls.correct({ text: 'The lot is 2292.', reason: 'label was misread' });
    expect(whole.json<CorrectionDto>()).toMatchObject({ cellId: null, address: null, by: shop.operator.printedName });
    await calls.correct({ cellId: cellId('B1'), text: 'Marked twice.', reason: 'seen under the microscope' }, shop.lead);
    expect((await calls.read()).corrections).toMatchObject([
      { text: 'The lot is 2292.', reason: 'label was misread', address: null },
      { text: 'Marked twice.', address: 'B1', by: shop.lead.printedName },
    ]);
  });

  it('need a sealed coupon, words and a cell of the coupon', async () => {
    expectProblem(await calls.correct({ text: 'x', reason: 'y' }), 409, 'coupon-state');
    expect(pointersOf(expectProblem(await calls.correct({ text: '', reason: ' ' }), 422, 'invalid-fields'))).toEqual([
      '#/reason',
      '#/text',
    ]);
    await seal();
    const foreign = await calls.correct({ cellId: randomUUID(), text: 'x', reason: 'y' });
    expect(pointersOf(expectProblem(foreign, 422, 'invalid-fields'))).toEqual(['#/cellId']);
  });
});

describe('inspection routes', () => {
  it('are closed to the anonymous, to trainees and to other shops', async () => {
    const url = `/api/coupons/${coupon.id}`;
    const routes = [
      { method: 'GET', url: `${url}/inspection` },
      { method: 'PUT', url: `${url}/criteria`, payload: { criteria: [] } },
      { method: 'POST', url: `${url}/inspect`, payload: {} },
      { method: 'POST', url: `${url}/seal` },
      { method: 'POST', url: `${url}/corrections`, payload: { text: 'x', reason: 'y' } },
    ] as const;
    for (const route of routes) {
      const send = (headers: Record<string, string>) =>
        test.app.inject({ ...route, headers: { ...headers, 'if-match': '"v1"', 'idempotency-key': randomUUID() } });
      expectProblem(await send({}), 401, 'not-signed-in');
      expectProblem(await send(shop.trainee.headers), 403, 'not-permitted');
      expectProblem(await send(elsewhere.owner.headers), 404, 'not-found');
    }
  });
});
