import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { ImportPreviewDto } from '../src/coupons/dto/import-coupon.dto';
import { createTestApp, type TestApp } from './support/app';
import { makePlanningShop, type PlanningShop, typed } from './support/coupons';
import { created, makeMaterial } from './support/equipment';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: PlanningShop;
let elsewhere: PlanningShop;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makePlanningShop(test), await makePlanningShop(test)];
});
afterAll(() => test.close());

const post = (url: string, payload: object, headers: Record<string, string> = shop.operator.headers) =>
  test.app.inject({ method: 'POST', url, headers: { ...headers, ...newKey() }, payload });
const speeds = { parameter: 'speedMmPerS', levels: [typed(200, 'mm/s'), typed(9000, 'mm/s')] };
const known = (given: object = {}) => ({ ...shop.keys, grid: { rows: 2, columns: 3, rowFactor: speeds }, ...given });

describe('POST /api/coupons/import', () => {
  it('enters a plate as marked; what nobody knows is absent and named, never invented', async () => {
    const coupon = await created<CouponDto>(
      test,
      shop.operator,
      '/api/coupons/import',
      known({ common: { pulseWidthNs: typed(30, 'ns') }, title: 'from the drawer' }),
    );
    expect(coupon).toMatchObject({ state: 'marked', isImported: true, marked: null, calibration: null, title: 'from the drawer' });
    expect(coupon.unknownFields).toEqual([
      'powerPercent',
      'frequencyKhz',
      'lineSpacingUm',
      'passes',
      'fill',
      'assist',
      'cellMm',
      'gapMm',
      'markedAt',
      'markedBy',
      'profile',
    ]);
    const b3 = coupon.cells.find(({ address }) => address === 'B3');
    // 9000 mm/s is beyond today's panel, but that is what it was burnt with
    expect(b3).toMatchObject({
      markState: 'marked',
      parameters: { values: { speedMmPerS: { physical: 9000 }, pulseWidthNs: { physical: 30 } } },
    });
    expect(Object.keys(b3?.parameters.values ?? {}).sort()).toEqual(['pulseWidthNs', 'speedMmPerS']);
    expect(b3?.parameters.power).toEqual({ watts: null, reason: 'No power is set.' });
    expect(b3?.dose).toEqual({ value: null, missingBecause: 'It is not known how the cells were filled.' });
  });

  it('marks nothing as unknown that was given', async () => {
    const whole = {
      fill: 'crossed',
      assist: 'air',
      cellMm: 4,
      gapMm: 1,
      markedOn: '2019-06-30',
      markedByMe: true,
      isMachineUnchanged: true,
      common: {
        powerPercent: typed(50, 'percentFromZero'),
        frequencyKhz: typed(100, 'kHz'),
        pulseWidthNs: typed(30, 'ns'),
        lineSpacingUm: typed(0.02, 'mm'),
        passes: typed(1, 'count'),
      },
    };
    const coupon = await created<CouponDto>(test, shop.operator, '/api/coupons/import', known(whole));
    expect(coupon.unknownFields).toEqual([]);
    expect(coupon.marked).toEqual({ at: '2019-06-30T00:00:00.000Z', by: shop.operator.printedName });
    // 10 W, 200 mm/s, 20 µm, two scans a pass
    expect(coupon.cells[0]?.dose.value).toBeCloseTo((2 * 10) / (200 * 0.02), 9);
  });

  it('takes a pasted table and names every refused row', async () => {
    const table = 'Cell\tSpeed (mm/s)\tPower (%)\tNote\nA1\t800\t40\tdark\nA2\t900\tmuch\t\nB1\t1000\t40\t';
    const seen = (await post('/api/coupons/import/preview', { ...shop.keys, table })).json<ImportPreviewDto>();
    expect(seen).toMatchObject({
      rows: 2,
      columns: 1,
      refusedRows: [{ line: 3, text: 'A2 | 900 | much |', reason: expect.stringMatching(/\S/) }],
    });
    const refused = expectProblem(await post('/api/coupons/import', { ...shop.keys, table }), 422, 'invalid-fields');
    expect(refused.errors).toEqual([{ pointer: '#/table', detail: expect.stringMatching(/^Line 3: /) }]);
    const coupon = await created<CouponDto>(test, shop.operator, '/api/coupons/import', { ...shop.keys, table, leaveOutRefusedRows: true });
    expect(coupon.cells.map(({ address, markNote }) => [address, markNote])).toEqual([
      ['A1', 'dark'],
      ['B1', ''],
    ]);
  });

  it('names levels that do not fit the size, and a plate without a size', async () => {
    const short = await post('/api/coupons/import', known({ grid: { rows: 3, columns: 3, rowFactor: speeds } }));
    expect(pointersOf(expectProblem(short, 422, 'invalid-fields'))).toEqual(['#/grid/rowFactor/levels']);
    expect(pointersOf(expectProblem(await post('/api/coupons/import', shop.keys), 422, 'invalid-fields'))).toEqual(['#/grid']);
    const empty = await post('/api/coupons/import/preview', { ...shop.keys, table: 'Customer\nx' });
    expect(empty.json<ImportPreviewDto>().refusedRows).toEqual([{ line: 2, text: 'x', reason: 'It holds no value of a setting.' }]);
  });

  it('refuses a material that must never be marked', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { family: 'vinyl' });
    expectProblem(await post('/api/coupons/import', known({ materialId: vinyl.id })), 409, 'never-mark');
  });

  it.each(['/api/coupons/import', '/api/coupons/import/preview'])(
    '%s refuses anonymous callers, trainees, foreign things and a bad body',
    async (url) => {
      expectProblem(await post(url, known(), {}), 401, 'not-signed-in');
      expectProblem(await post(url, known(), shop.trainee.headers), 403, 'not-permitted');
      expectProblem(await post(url, known(), elsewhere.operator.headers), 404, 'not-found');
      const bad = expectProblem(await post(url, known({ markedOn: 'long ago', fill: 'dots' })), 422, 'invalid-fields');
      expect(pointersOf(bad)).toEqual(['#/fill', '#/markedOn']);
      const week = expectProblem(await post(url, known({ markedOn: '2019-W26' })), 422, 'invalid-fields');
      expect(pointersOf(week)).toEqual(['#/markedOn']);
      const later = expectProblem(await post(url, known({ markedOn: '2999-01-01' })), 422, 'invalid-fields');
      expect(pointersOf(later)).toEqual(['#/markedOn']);
    },
  );
});
