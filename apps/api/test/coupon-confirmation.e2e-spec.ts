import { randomUUID } from 'node:crypto';
import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { ParameterSetDto } from '../src/coupons/dto/parameter-set.dto';
import { createTestApp, type TestApp } from './support/app';
import { makeCoupon, makePlanningShop, type PlanningShop, planBody, typed } from './support/coupons';
import { asSuperuser } from './support/database';
import { created } from './support/equipment';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: PlanningShop;
let elsewhere: PlanningShop;
let parameters: CouponDto['cells'][number]['parameters'];
let draftId: string;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makePlanningShop(test), await makePlanningShop(test)];
  const coupon = await makeCoupon(test, shop);
  const cell = coupon.cells[2];
  if (cell === undefined) throw new Error('the coupon has too few cells');
  parameters = cell.parameters;
  draftId = await makeDraft({ steps: [{ purpose: 'anneal', parameters, pauseAfterS: 0 }] });
});
afterAll(() => test.close());

/** The recipes module has tests of its own; a proof needs a draft's content only. */
async function makeDraft(content: object): Promise<string> {
  const [recipeId, revisionId, code] = [randomUUID(), randomUUID(), `R-${randomUUID().slice(0, 4)}`];
  const { machineId, lensId, materialId, finishId, effectId } = shop.keys;
  const whole = { setUpSteps: [], limits: { notes: '' }, scope: {}, ...content };
  await asSuperuser(test, async (sql) => {
    await sql`insert into recipe (shop_id, id, code, title, material_id, finish_id, effect_id, machine_id, lens_id, created_by)
      values (${shop.shop.id}, ${recipeId}, ${code}, 'Blue tag', ${materialId}, ${finishId}, ${effectId}, ${machineId}, ${lensId}, ${shop.operator.id})`;
    await sql`insert into revision (shop_id, id, recipe_id, content, profile_id, created_by)
      values (${shop.shop.id}, ${revisionId}, ${recipeId}, ${JSON.stringify(whole)}::text::jsonb, ${shop.machine.profile.id}, ${shop.operator.id})`;
  });
  return revisionId;
}
const post = (payload: object, headers: Record<string, string> = shop.operator.headers) =>
  test.app.inject({ method: 'POST', url: '/api/coupons/confirmation', headers: { ...headers, ...newKey() }, payload });

describe('POST /api/coupons/confirmation', () => {
  it('plans equal cells with exactly the parameters of the draft', async () => {
    const coupon = await created<CouponDto>(test, shop.operator, '/api/coupons/confirmation', {
      revisionId: draftId,
      count: 5,
      lot: 'L-8',
    });
    expect(coupon).toMatchObject({
      purpose: 'confirmation',
      state: 'planned',
      lot: 'L-8',
      confirms: { id: draftId, number: null, state: 'draft' },
      grids: [{ rows: 1, columns: 5, rowFactor: null, columnFactor: null }],
    });
    expect(coupon.cells.map(({ address }) => address)).toEqual(['A1', 'A2', 'A3', 'A4', 'A5']);
    for (const cell of coupon.cells) expect(cell.parameters).toEqual(parameters);
  });

  it('folds many cells into a block and leaves the rest of the last row bare', async () => {
    const coupon = await created<CouponDto>(test, shop.operator, '/api/coupons/confirmation', { revisionId: draftId, count: 14 });
    expect(coupon.grids[0]).toMatchObject({ rows: 4, columns: 4 });
    expect(coupon.cells.map(({ address }) => address).slice(-2)).toEqual(['D1', 'D2']);
  });

  it('takes the step that is asked for and refuses one that is not there', async () => {
    const second: ParameterSetDto = { ...parameters, fill: 'crossed' };
    const steps = [parameters, second].map((set) => ({ purpose: 'anneal', parameters: set, pauseAfterS: 0 }));
    const revisionId = await makeDraft({ steps });
    const coupon = await created<CouponDto>(test, shop.operator, '/api/coupons/confirmation', { revisionId, count: 1, stepNumber: 2 });
    expect(coupon.cells[0]?.parameters.fill).toBe('crossed');
    expect(pointersOf(expectProblem(await post({ revisionId, count: 1, stepNumber: 3 }), 422, 'invalid-fields'))).toEqual(['#/stepNumber']);
  });

  it('marks its labels as the coupon that the draft rests on, else as the latest on the same plate', async () => {
    const labelled = (powerPercent: number) => {
      const { labelStep } = planBody(shop);
      return { labelStep: { ...labelStep, values: { ...labelStep.values, powerPercent: typed(powerPercent, 'percentFromZero') } } };
    };
    const basis = await makeCoupon(test, shop, labelled(31));
    await makeCoupon(test, shop, labelled(32));
    await makeCoupon(test, shop, { labelStep: undefined });
    const revisionId = await makeDraft({ steps: [{ purpose: 'anneal', parameters, pauseAfterS: 0 }] });
    const proof = () => created<CouponDto>(test, shop.operator, '/api/coupons/confirmation', { revisionId, count: 1 });
    const labelPowerOf = ({ grids: [grid] }: CouponDto) => grid?.labelStep?.values.powerPercent?.entered.value;
    expect(labelPowerOf(await proof())).toBe(32);
    await asSuperuser(
      test,
      (sql) => sql`insert into revision_evidence (shop_id, revision_id, coupon_id, cell_id, kind, created_by)
        values (${shop.shop.id}, ${revisionId}, ${basis.id}, ${basis.cells[0]?.id ?? ''}, 'basis', ${shop.operator.id})`,
    );
    expect(labelPowerOf(await proof())).toBe(31);
  });

  it('refuses a draft without a step and a revision that is past proving', async () => {
    const empty = await makeDraft({ steps: [] });
    expectProblem(await post({ revisionId: empty, count: 1 }), 422, 'invalid-fields');
    const past = await makeDraft({ steps: [{ purpose: 'anneal', parameters, pauseAfterS: 0 }] });
    await asSuperuser(test, (sql) => sql`update revision set state = 'in_review', number = 1, content_hash = 'x' where id = ${past}`);
    await asSuperuser(test, (sql) => sql`update revision set state = 'returned' where id = ${past}`);
    expectProblem(await post({ revisionId: past, count: 1 }), 409, 'conflict');
  });

  it('refuses anonymous callers, trainees, foreign drafts and a bad body', async () => {
    expectProblem(await post({ revisionId: draftId, count: 1 }, {}), 401, 'not-signed-in');
    expectProblem(await post({ revisionId: draftId, count: 1 }, shop.trainee.headers), 403, 'not-permitted');
    expectProblem(await post({ revisionId: draftId, count: 1 }, elsewhere.operator.headers), 404, 'not-found');
    expect(pointersOf(expectProblem(await post({ revisionId: 'x', count: 0 }), 422, 'invalid-fields'))).toEqual([
      '#/count',
      '#/revisionId',
    ]);
  });
});
