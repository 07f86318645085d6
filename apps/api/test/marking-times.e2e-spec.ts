import { randomUUID } from 'node:crypto';
import { type HeadOverheads, markTime } from '@proofplate/recipe-model';
import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { CouponPreviewDto } from '../src/coupons/dto/coupon-preview.dto';
import type { CouponTimesDto } from '../src/coupons/dto/coupon-times.dto';
import type { LedgerEventDto } from '../src/ledger/dto/ledger-event.dto';
import type { LoggedTimeDto, MachineMarkingTimeDto } from '../src/machines/dto/marking-time.dto';
import type { RunDto } from '../src/runs/dto/run.dto';
import type { RunTimesDto, SettingTimingDto } from '../src/runs/dto/run-times.dto';
import { createTestApp, type TestApp } from './support/app';
import { type ApprovedRecipe, makeRecipe } from './support/approved-recipe';
import { makePlanningShop, PLANNING_MACHINE, type PlanningShop, planBody } from './support/coupons';
import { created, makeMachine } from './support/equipment';
import type { TestMember } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

type Given = Readonly<Record<string, unknown>>;
let test: TestApp;
let shop: PlanningShop;
let elsewhere: PlanningShop;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makePlanningShop(test), await makePlanningShop(test)];
});
afterAll(() => test.close());

const post = (url: string, payload: Given, member: TestMember = shop.trainee, key = newKey()) =>
  test.app.inject({ method: 'POST', url, headers: { ...member.headers, ...key }, payload });
const get = async <Dto>(url: string, member: TestMember = shop.operator) =>
  (await test.app.inject({ url, headers: member.headers })).json<Dto>();

/** A recipe on a machine of its own, so that the times of one test are not those of another. */
async function recipeOnNewMachine(): Promise<ApprovedRecipe> {
  return makeRecipe(test, shop.lead, { machine: await makeMachine(test, shop.lead, PLANNING_MACHINE), lens: shop.lens });
}
const startRun = (recipe: ApprovedRecipe, member: TestMember = shop.trainee) =>
  created<RunDto>(test, member, '/api/runs', {
    ...{ clientId: randomUUID(), kind: 'production', revisionId: recipe.revisionId, lensFittedId: recipe.lens.id, ticks: ['set-up.0'] },
  });
const timesOf = (run: { id: string }) => `/api/runs/${run.id}/logged-times`;
const ofMachine = ({ machine }: { machine: { id: string } }) => `/api/machines/${machine.id}/logged-times`;

/** 900 mm/s and 30 µm as the recipe has them, with 0.6 ms a line and nothing a scan. */
const truth: HeadOverheads = {
  ...{ basis: 'fitted', jumpSpeedMmPerS: 5000, n: 9, spreadS: 0, lineMs: 0.6, lineStandardErrorMs: 0 },
  ...{ scanMs: null, scanStandardErrorMs: null, scanMissingBecause: null },
};
function clocked(widthMm: number, heightMm: number): { seconds: number; widthMm: number; heightMm: number } {
  const area = { widthMm, heightMm, lineSpacingUm: 30, speedMmPerS: 900, passes: 1, fill: 'both directions', count: 1 } as const;
  const { totalS } = markTime({ areas: [area], pausesS: 0 }, { physical: {}, overheads: truth });
  return { seconds: totalS ?? 0, widthMm, heightMm };
}

describe('POST /api/runs/:runId/logged-times', () => {
  it('keeps what was marked as physical values, beside what the profile predicts', async () => {
    const recipe = await recipeOnNewMachine();
    const run = await startRun(recipe);
    const answer = await post(timesOf(run), { seconds: 14, widthMm: 20, heightMm: 15 });
    expect(answer.statusCode).toBe(201);
    const logged = answer.json<LoggedTimeDto>();
    expect(logged).toMatchObject({
      ...{ runCode: run.code, couponCode: null, seconds: 14, counts: true, loggedBy: shop.trainee.printedName, profileNumber: 1 },
      areas: [{ widthMm: 20, heightMm: 15, lineSpacingUm: 30, speedMmPerS: 900, passes: 1, fill: 'both directions', count: 1 }],
    });
    // 501 lines of 20 mm at 900 mm/s with 0.3 ms each, 500 jumps of 30 µm at 5000 mm/s with 0.5 ms each
    expect(logged.predicted.totalS).toBeCloseTo((501 * 20) / 900 + 501 * 0.0003 + 500 * (0.03 / 5000 + 0.0005), 9);
    const seen = await get<RunTimesDto>(timesOf(run), shop.trainee);
    expect(seen.items).toEqual([logged]);
    expect(seen.timing.steps).toEqual([{ lineSpacingUm: 30, speedMmPerS: 900, passes: 1, fill: 'both directions' }]);
    expect(seen.timing.ground.overheads).toMatchObject({ basis: 'profile', notFittedBecause: 'only 1 time is logged; it takes 3' });
    const events = (await get<{ items: LedgerEventDto[] }>(`/api/ledger?subjectId=${run.id}`)).items;
    expect(events[0]).toMatchObject({ action: 'marking-time.logged', subjectCode: run.code, after: { seconds: 14 } });
  });

  it('fits the overheads from the third time on and predicts with them, for a trainee before any run too', async () => {
    const recipe = await recipeOnNewMachine();
    const run = await startRun(recipe);
    for (const body of [clocked(20, 15), clocked(40, 30), clocked(10, 60)]) await post(timesOf(run), body);
    const { ground, items } = await get<MachineMarkingTimeDto>(ofMachine(recipe));
    expect(ground.overheads).toMatchObject({ basis: 'fitted', n: 3, scanMs: null });
    expect(ground.overheads.lineMs).toBeCloseTo(0.6, 6);
    expect(items.map(({ seconds, predicted }) => Math.abs(seconds - (predicted.totalS ?? 0)) < 1e-6)).toEqual([true, true, true]);
    const timing = await get<SettingTimingDto>(`/api/runs/timing/${recipe.revisionId}`, shop.trainee);
    expect(timing).toMatchObject({ missingBecause: null, pausesS: 0, ground: { overheads: { basis: 'fitted', n: 3 } } });
  });

  it('is carried out once for one key', async () => {
    const [run, key] = [await startRun(await recipeOnNewMachine()), newKey()];
    const body = { seconds: 9, widthMm: 10, heightMm: 10 };
    const [first, again] = [await post(timesOf(run), body, shop.trainee, key), await post(timesOf(run), body, shop.trainee, key)];
    expect(again.json()).toEqual(first.json());
    expect((await get<RunTimesDto>(timesOf(run))).items).toHaveLength(1);
  });

  it('refuses no time, no area and fields of its own, each at its field', async () => {
    const run = await startRun(await recipeOnNewMachine());
    const problem = expectProblem(
      await post(timesOf(run), { seconds: 0, widthMm: -1, heightMm: 'tall', areas: [] }),
      422,
      'invalid-fields',
    );
    expect(pointersOf(problem)).toEqual(['#/areas', '#/heightMm', '#/seconds', '#/widthMm']);
  });

  it('refuses a setting without a line spacing, because nothing can be learnt from its time', async () => {
    const recipe = await makeRecipe(test, shop.lead, {
      ...{ machine: await makeMachine(test, shop.lead, PLANNING_MACHINE), lens: shop.lens },
      values: { lineSpacingUm: { entered: { value: 0, unit: 'mm' }, physical: 0 } },
    });
    const run = await startRun(recipe);
    const problem = expectProblem(await post(timesOf(run), { seconds: 9, widthMm: 10, heightMm: 10 }), 422, 'invalid-fields');
    expect(problem.detail).toMatch(/no line spacing is set/);
    expect((await get<RunTimesDto>(timesOf(run))).timing.missingBecause).toBe('no line spacing is set');
  });

  it('refuses a stranger, another shop and a trainee who did not start the run', async () => {
    const run = await startRun(await recipeOnNewMachine(), shop.operator);
    const body = { seconds: 9, widthMm: 10, heightMm: 10 };
    expectProblem(await test.app.inject({ method: 'POST', url: timesOf(run), headers: newKey(), payload: body }), 401, 'not-signed-in');
    for (const member of [shop.trainee, elsewhere.owner]) expectProblem(await post(timesOf(run), body, member), 404, 'not-found');
  });
});

describe('POST /api/machines/:machineId/logged-times/:loggedTimeId/corrections', () => {
  it('puts a time right by another row, and the first one stays on record', async () => {
    const recipe = await recipeOnNewMachine();
    const run = await startRun(recipe);
    const wrong = (await post(timesOf(run), { ...clocked(20, 15), seconds: 120 })).json<LoggedTimeDto>();
    const url = `${ofMachine(recipe)}/${wrong.id}/corrections`;
    const right = (await post(url, { counts: true, seconds: 12, reason: 'Read minutes for seconds' }, shop.operator)).json<LoggedTimeDto>();
    expect(right).toMatchObject({
      seconds: 12,
      replaced: { seconds: 120, loggedBy: shop.trainee.printedName },
      loggedBy: shop.operator.printedName,
    });
    expect((await get<RunTimesDto>(timesOf(run))).items.map(({ seconds }) => seconds)).toEqual([12]);
    expectProblem(await post(url, { counts: false, reason: 'Again' }, shop.operator), 404, 'not-found');
    const events = (await get<{ items: LedgerEventDto[] }>(`/api/ledger?subjectId=${recipe.machine.id}`, shop.lead)).items;
    expect(events[0]).toMatchObject({ action: 'marking-time.corrected', before: { seconds: 120 }, after: { seconds: 12 } });
  });

  it('takes a time out of the count, and the fit falls back to the profile', async () => {
    const recipe = await recipeOnNewMachine();
    const run = await startRun(recipe);
    for (const body of [clocked(20, 15), clocked(40, 30)]) await post(timesOf(run), body);
    const third = (await post(timesOf(run), clocked(10, 60))).json<LoggedTimeDto>();
    const struck = await post(`${ofMachine(recipe)}/${third.id}/corrections`, { counts: false, reason: 'Door was opened' }, shop.operator);
    expect(struck.json()).toMatchObject({ counts: false, reason: 'Door was opened', seconds: third.seconds });
    const { ground } = await get<MachineMarkingTimeDto>(ofMachine(recipe));
    expect(ground.overheads).toMatchObject({ basis: 'profile', notFittedBecause: 'only 2 times are logged; it takes 3' });
  });

  it('refuses no reason, no time where it counts, a trainee and another shop', async () => {
    const recipe = await recipeOnNewMachine();
    const logged = (await post(timesOf(await startRun(recipe)), clocked(20, 15))).json<LoggedTimeDto>();
    const url = `${ofMachine(recipe)}/${logged.id}/corrections`;
    expect(pointersOf(expectProblem(await post(url, { counts: true }, shop.operator), 422, 'invalid-fields'))).toEqual([
      '#/reason',
      '#/seconds',
    ]);
    expectProblem(await post(url, { counts: false, reason: 'No' }, shop.trainee), 403, 'not-permitted');
    expectProblem(await post(url, { counts: false, reason: 'No' }, elsewhere.owner), 404, 'not-found');
    expectProblem(
      await post(`${ofMachine(shop)}/${logged.id}/corrections`, { counts: false, reason: 'No' }, shop.operator),
      404,
      'not-found',
    );
  });

  it('counts no time of an earlier source or scan head', async () => {
    const recipe = await recipeOnNewMachine();
    const run = await startRun(recipe);
    for (const body of [clocked(20, 15), clocked(40, 30), clocked(10, 60)]) await post(timesOf(run), body);
    const physical = { ...PLANNING_MACHINE.physical, jumpSpeedMmPerS: 9000 };
    const headers = { ...shop.lead.headers, 'if-match': '"v1"' };
    const changed = await test.app.inject({ method: 'PATCH', url: `/api/machines/${recipe.machine.id}`, headers, payload: { physical } });
    expect(changed.statusCode).toBe(200);
    const { ground, items } = await get<MachineMarkingTimeDto>(ofMachine(recipe));
    expect(ground.overheads).toMatchObject({ basis: 'profile', jumpSpeedMmPerS: 9000, notFittedBecause: 'no time is logged; it takes 3' });
    expect(items.every(({ isOfPresentMachine }) => !isOfPresentMachine)).toBe(true);
  });
});

describe('POST /api/coupons/:couponId/logged-times', () => {
  const plan = () => created<CouponDto>(test, shop.operator, '/api/coupons', planBody(shop));
  const ofCoupon = ({ id }: CouponDto) => `/api/coupons/${id}/logged-times`;

  it('keeps the time of a cell and of all cells, each with what is really set in them', async () => {
    const coupon = await plan();
    const cell = coupon.cells[0];
    const ofCell = (await post(ofCoupon(coupon), { seconds: 21, cellId: cell?.id ?? '' }, shop.operator)).json<LoggedTimeDto>();
    expect(ofCell).toMatchObject({ couponCode: coupon.code, address: 'A1', areas: [{ speedMmPerS: 100, lineSpacingUm: 12, count: 1 }] });
    const whole = (await post(ofCoupon(coupon), { seconds: 700 }, shop.operator)).json<LoggedTimeDto>();
    expect(whole.address).toBeNull();
    // ten powers share each of the eight speeds
    expect(whole.areas.map(({ count }) => count)).toEqual(Array.from({ length: 8 }, () => 10));
    const seen = await get<CouponTimesDto>(ofCoupon(coupon));
    expect(seen.items.map(({ seconds }) => seconds)).toEqual([700, 21]);
    expect(seen.whole.totalS).toBeCloseTo(whole.predicted.totalS ?? 0, 9);
    expect(seen.cells.find(({ cellId }) => cellId === cell?.id)?.predicted.totalS).toBeCloseTo(ofCell.predicted.totalS ?? 0, 9);
    const preview = (await post('/api/coupons/preview', planBody(shop), shop.operator)).json<CouponPreviewDto>();
    expect(preview.markingTime.totalS).toBeCloseTo(seen.whole.totalS ?? 0, 9);
    expect(preview.markingTime.slowestCellS).toBeCloseTo(ofCell.predicted.totalS ?? 0, 9);
  });

  it('refuses a cell of another coupon, a trainee and another shop', async () => {
    const [coupon, other] = [await plan(), await plan()];
    const body = { seconds: 21, cellId: other.cells[0]?.id };
    expect(pointersOf(expectProblem(await post(ofCoupon(coupon), body, shop.operator), 422, 'invalid-fields'))).toEqual(['#/cellId']);
    expectProblem(await post(ofCoupon(coupon), { seconds: 21 }, shop.trainee), 403, 'not-permitted');
    expectProblem(await post(ofCoupon(coupon), { seconds: 21 }, elsewhere.owner), 404, 'not-found');
  });
});
