import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { CouponPreviewDto } from '../src/coupons/dto/coupon-preview.dto';
import { createTestApp, type TestApp } from './support/app';
import { makePlanningShop, type PlanningShop, planBody, smallPlan, typed } from './support/coupons';
import { allCautions, created, makeLens, makeMaterial } from './support/equipment';
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
const preview = async (given: object = {}) => {
  const answer = await post('/api/coupons/preview', planBody(shop, { ...given }));
  if (answer.statusCode !== 200) throw new Error(answer.body);
  return answer.json<CouponPreviewDto>();
};
const couponsOf = async () => {
  const answer = await test.app.inject({ url: '/api/coupons?limit=100', headers: shop.operator.headers });
  return answer.json<{ items: CouponDto[] }>().items;
};

describe('POST /api/coupons/preview', () => {
  it('gives levels that the panel can show, the dose of every cell, size and time, and stores nothing', async () => {
    const before = (await couponsOf()).length;
    const seen = await preview();
    expect(seen.rowFactor?.levels.map(({ entered }) => entered.value)).toEqual([100, 140, 190, 270, 370, 520, 720, 1000]);
    expect(seen.columnFactor?.levels.map(({ entered }) => entered.value)).toEqual([15, 20, 25, 30, 35, 40, 45, 50, 55, 60]);
    // 60 % of 20 W over 100 mm/s and 12 µm
    expect(seen.cells.find(({ address }) => address === 'A10')?.dose.value).toBeCloseTo(12 / (100 * 0.012), 9);
    expect(seen.cells.map(({ runOrder }) => runOrder).sort((a, b) => a - b)).toEqual(Array.from({ length: 80 }, (_, index) => index + 1));
    expect(seen.plate).toEqual({ widthMm: 84.8, heightMm: 74.8 });
    expect(seen.powerBasis).toBe('not calibrated');
    expect(seen.markingTime.totalS).toBeGreaterThan(seen.markingTime.beamOnS ?? Number.POSITIVE_INFINITY);
    expect((await couponsOf()).length).toBe(before);
  });

  it('repeats a run order for the same seed and goes row by row without one', async () => {
    const order = ({ cells }: CouponPreviewDto) => cells.map(({ runOrder }) => runOrder);
    const [first, again, other, plain] = [
      await preview(),
      await preview(),
      await preview({ runOrderSeed: 8 }),
      await preview({ runOrderSeed: null }),
    ];
    expect(order(again)).toEqual(order(first));
    expect(order(other)).not.toEqual(order(first));
    expect(order(plain)).toEqual(Array.from({ length: 80 }, (_, index) => index + 1));
  });

  it('flags the cells above the dose that was entered and says where to begin and stop', async () => {
    const { warnings, doseCaution } = await preview({ doseCautionJPerMm2: 7 });
    expect(doseCaution).toEqual({ doseJPerMm2: 7, source: 'The dose entered in this plan' });
    expect(warnings.find(({ code }) => code === 'dose')).toEqual({
      code: 'dose',
      title: '5 cells at or above 7 J/mm² may burn too deep',
      detail: 'The dose entered in this plan. Begin the scan speed at 190 mm/s, or stop the power at 40 %.',
      addresses: ['A7', 'A8', 'A9', 'A10', 'B10'],
    });
  });

  it('warns of spots and lines that do not touch, and of a plate beyond the field', async () => {
    const base = {
      ...planBody(shop).base,
      values: { ...planBody(shop).base.values, frequencyKhz: typed(2, 'kHz'), lineSpacingUm: typed(0.1, 'mm') },
    };
    const codes = (await preview({ base, cellMm: 12 })).warnings.map(({ code }) => code);
    expect(codes).toEqual(expect.arrayContaining(['spots-apart', 'lines-apart', 'plate-too-large']));
  });

  it('leaves dose out with the reason where the power is not known', async () => {
    const base = { ...planBody(shop).base, values: { ...planBody(shop).base.values, pulseWidthNs: typed(200, 'ns') } };
    const seen = await preview({ base });
    expect(seen.powerBasis).toBe('unknown');
    expect(seen.cells[0]?.dose).toEqual({ value: null, missingBecause: expect.stringContaining('largest pulse energy') });
    expect(seen.warnings.map(({ code }) => code)).toContain('no-dose');
  });

  it('stands the cautions of the material beside the plan', async () => {
    const { cautions } = await preview();
    expect(cautions.length).toBeGreaterThan(0);
    expect(cautions[0]).toEqual({
      id: expect.any(String),
      subject: expect.any(String),
      text: expect.any(String),
      source: expect.any(String),
    });
  });

  it('refuses values that the panel cannot show, each at its field with the two nearest', async () => {
    const base = {
      ...planBody(shop).base,
      values: { ...planBody(shop).base.values, lineSpacingUm: typed(0.0125, 'mm'), pulseWidthNs: typed(31, 'ns') },
    };
    const rows = { ...planBody(shop).rows, from: 105 };
    const problem = expectProblem(await post('/api/coupons/preview', planBody(shop, { base, rows })), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/base/values/lineSpacingUm', '#/base/values/pulseWidthNs', '#/rows/from']);
    const detail = problem.errors?.find(({ pointer }) => pointer === '#/base/values/lineSpacingUm')?.detail;
    expect(detail).toContain('0.012 mm or 0.013 mm');
  });

  it('refuses a grid that makes no sense', async () => {
    const same = planBody(shop, { rows: planBody(shop).columns });
    expect(pointersOf(expectProblem(await post('/api/coupons/preview', same), 422, 'invalid-fields'))).toContain('#/rows/parameter');
    const many = planBody(shop, {
      rows: { parameter: 'speedMmPerS', from: 100, to: 2600, count: 26, spacing: 'steps' },
      columns: { parameter: 'powerPercent', from: 1, to: 26, count: 26, spacing: 'steps' },
    });
    expect(pointersOf(expectProblem(await post('/api/coupons/preview', many), 422, 'invalid-fields'))).toEqual(['#/columns/count']);
    const close = planBody(shop, { columns: { parameter: 'powerPercent', from: 15, to: 20, count: 10, spacing: 'steps' } });
    expect(pointersOf(expectProblem(await post('/api/coupons/preview', close), 422, 'invalid-fields'))).toEqual(['#/columns/count']);
  });

  it('names everything that is missing', async () => {
    const problem = expectProblem(await post('/api/coupons/preview', {}), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(
      expect.arrayContaining(['#/base', '#/cellMm', '#/columns', '#/effectId', '#/finishId', '#/lensId', '#/machineId', '#/materialId']),
    );
  });

  it('refuses anonymous callers, trainees and foreign things', async () => {
    expectProblem(await post('/api/coupons/preview', planBody(shop), {}), 401, 'not-signed-in');
    expectProblem(await post('/api/coupons/preview', planBody(shop), shop.trainee.headers), 403, 'not-permitted');
    expectProblem(await post('/api/coupons/preview', planBody(shop), elsewhere.operator.headers), 404, 'not-found');
  });
});

describe('POST /api/coupons', () => {
  it('stores the plan with every cell, once for a repeated key', async () => {
    const headers = { ...shop.operator.headers, ...newKey() };
    const send = () => test.app.inject({ method: 'POST', url: '/api/coupons', headers, payload: planBody(shop, { lot: 'L-7' }) });
    const [first, again] = [await send(), await send()];
    expect(first.statusCode).toBe(201);
    expect(again.json<CouponDto>().id).toBe(first.json<CouponDto>().id);
    const coupon = first.json<CouponDto>();
    expect(coupon).toMatchObject({
      state: 'planned',
      purpose: 'exploration',
      lot: 'L-7',
      material: { id: shop.material.id, family: 'titanium' },
      profile: { number: 1 },
      allowedActions: expect.arrayContaining(['mark']),
    });
    expect(coupon.code).toMatch(/^C-\d{4}$/);
    expect(coupon.cells).toHaveLength(80);
    const b3 = coupon.cells.find(({ address }) => address === 'B3');
    expect(b3?.parameters.values).toMatchObject({
      speedMmPerS: { entered: { value: 140, unit: 'mm/s' }, physical: 140 },
      powerPercent: { entered: { value: 25, unit: 'percentFromZero' }, physical: 25 },
      lineSpacingUm: { entered: { value: 0.012, unit: 'mm' }, physical: 12 },
    });
    expect(b3?.parameters.power).toEqual({ watts: 5, basis: 'not calibrated' });
    const events = await test.app.inject({ url: `/api/ledger?subjectId=${coupon.id}`, headers: shop.lead.headers });
    expect(events.json<{ items: { action: string }[] }>().items.map(({ action }) => action)).toEqual(['coupon.planned']);
  });

  it('keeps only cautions that belong to the work as acknowledged', async () => {
    const cautions = (await preview()).cautions.map(({ id }) => id);
    const [elsewhereCaution] = await allCautions(test, elsewhere.lead);
    const coupon = await created<CouponDto>(
      test,
      shop.operator,
      '/api/coupons',
      smallPlan(shop, { acknowledgedCautionIds: [...cautions, elsewhereCaution?.id] }),
    );
    expect([...coupon.acknowledgedCautionIds].sort()).toEqual([...cautions].sort());
  });

  it('refuses a material that must never be marked, with the source', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { family: 'vinyl' });
    const problem = expectProblem(
      await post('/api/coupons', planBody({ keys: { ...shop.keys, materialId: vinyl.id } })),
      409,
      'never-mark',
    );
    expect(problem).toMatchObject({ cautions: [{ subject: expect.any(String), source: expect.stringMatching(/\S/) }] });
  });

  it('refuses a lens that is not one of the machine’s', async () => {
    const lens = await makeLens(test, shop.lead);
    const answer = await post('/api/coupons', planBody({ keys: { ...shop.keys, lensId: lens.id } }));
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/lensId']);
  });

  it('refuses what is archived', async () => {
    const material = await makeMaterial(test, shop.lead, { family: 'titanium' });
    await test.app.inject({
      method: 'POST',
      url: `/api/materials/${material.id}/archive`,
      headers: { ...shop.lead.headers, 'if-match': '"v1"' },
    });
    const answer = await post('/api/coupons', planBody({ keys: { ...shop.keys, materialId: material.id } }));
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/materialId']);
  });

  it('refuses anonymous callers, trainees and a missing key', async () => {
    expectProblem(await post('/api/coupons', planBody(shop), {}), 401, 'not-signed-in');
    expectProblem(await post('/api/coupons', planBody(shop), shop.trainee.headers), 403, 'not-permitted');
    const answer = await test.app.inject({ method: 'POST', url: '/api/coupons', headers: shop.operator.headers, payload: planBody(shop) });
    expectProblem(answer, 400, 'idempotency-key-required');
  });
});
