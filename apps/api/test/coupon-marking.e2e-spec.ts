import type { CouponCellDto, CouponDto } from '../src/coupons/dto/coupon.dto';
import type { MarkedCellDto } from '../src/coupons/dto/mark-cell.dto';
import { createTestApp, type TestApp } from './support/app';
import { makeCoupon, makePlanningShop, type PlanningShop, typed } from './support/coupons';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: PlanningShop;
let elsewhere: PlanningShop;
let coupon: CouponDto;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makePlanningShop(test), await makePlanningShop(test)];
});
beforeEach(async () => {
  coupon = await makeCoupon(test, shop);
});
afterAll(() => test.close());

const post = (act: string, payload: object = {}, headers: Record<string, string> = shop.operator.headers, couponId = coupon.id) =>
  test.app.inject({ method: 'POST', url: `/api/coupons/${couponId}/marking/${act}`, headers: { ...headers, ...newKey() }, payload });
const read = async (): Promise<CouponDto> => {
  const answer = await test.app.inject({ url: `/api/coupons/${coupon.id}`, headers: shop.operator.headers });
  return answer.json<CouponDto>();
};
const cellAt = (address: string, from = coupon): CouponCellDto => {
  const cell = from.cells.find((other) => other.address === address);
  if (cell === undefined) throw new Error(`no cell ${address}`);
  return cell;
};
const mark = (address: string, given: object = {}) => {
  const { id: cellId, version: cellVersion } = cellAt(address);
  return post('cells', { cellId, cellVersion, outcome: 'marked', ...given });
};
const markAll = async () => {
  await post('start');
  for (const { address } of coupon.cells) await mark(address);
};

describe('marking a coupon', () => {
  it('starts with the labels, keeps every cell at once and ends with who and when', async () => {
    expectProblem(await mark('A1'), 409, 'coupon-state');
    const started = await post('start');
    expect(started.json<CouponDto>().markingStartedAt).not.toBeNull();
    expect((await post('start')).json<CouponDto>().markingStartedAt).toBe(started.json<CouponDto>().markingStartedAt);

    const answer = await mark('A1');
    expect(answer.json<MarkedCellDto>()).toMatchObject({
      doneCount: 1,
      cellCount: 4,
      cell: { address: 'A1', markState: 'marked', version: 2 },
    });
    expect(cellAt('A1', await read()).markState).toBe('marked');

    await mark('A2', { outcome: 'skipped', note: 'clamp in the way' });
    await mark('B1', { outcome: 'differs', actual: { speedMmPerS: typed(500, 'mm/s') } });
    const early = expectProblem(await post('finish'), 409, 'coupon-state');
    expect(early).toMatchObject({ openCells: ['B2'] });
    await mark('B2');
    const finished = (await post('finish', { storedAt: 'Drawer 3' })).json<CouponDto>();
    expect(finished).toMatchObject({
      state: 'marked',
      marked: { by: shop.operator.printedName, at: expect.any(String) },
      storedAt: 'Drawer 3',
      allowedActions: expect.arrayContaining(['rate', 'photograph']),
    });
    expectProblem(await post('finish'), 409, 'coupon-state');
  });

  it('keeps what was really used beside the plan, with its own watts and dose', async () => {
    await post('start');
    const answer = await mark('A1', { outcome: 'differs', actual: { powerPercent: typed(50, 'percentFromZero') }, note: 'panel stuck' });
    const { cell } = answer.json<MarkedCellDto>();
    expect(cell.parameters.values.powerPercent?.physical).toBe(20);
    expect(cell.actualParameters).toMatchObject({
      values: { powerPercent: { physical: 50 }, speedMmPerS: { physical: 200 } },
      power: { watts: 10, basis: 'not calibrated' },
    });
    expect(cell.dose.value).toBeCloseTo(10 / (200 * 0.012), 9);
  });

  it('refuses a difference that is none, or that the panel cannot show, and skipping without a reason', async () => {
    await post('start');
    const same = await mark('A1', { outcome: 'differs', actual: { powerPercent: typed(20, 'percentFromZero') } });
    expect(pointersOf(expectProblem(same, 422, 'invalid-fields'))).toEqual(['#/actual']);
    const odd = await mark('A1', { outcome: 'differs', actual: { powerPercent: typed(20.5, 'percentFromZero') } });
    expect(pointersOf(expectProblem(odd, 422, 'invalid-fields'))).toEqual(['#/actual/powerPercent']);
    expect(pointersOf(expectProblem(await mark('A1', { outcome: 'skipped' }), 422, 'invalid-fields'))).toEqual(['#/note']);
    expect(cellAt('A1', await read()).markState).toBe('planned');
  });

  it('takes a cell back and lets it be marked again; the ledger keeps both', async () => {
    await post('start');
    const marked = (await mark('A1', { outcome: 'skipped', note: 'by mistake' })).json<MarkedCellDto>().cell;
    const undone = (await post('undo', { cellId: marked.id, cellVersion: marked.version })).json<MarkedCellDto>();
    expect(undone).toMatchObject({ doneCount: 0, cell: { markState: 'planned', markNote: '', markedAt: null, actualParameters: null } });
    const again = await post('cells', { cellId: marked.id, cellVersion: undone.cell.version, outcome: 'marked' });
    expect(again.statusCode).toBe(200);
    const events = await test.app.inject({ url: `/api/ledger?subjectId=${marked.id}`, headers: shop.lead.headers });
    expect(events.json<{ items: { action: string }[] }>().items.map(({ action }) => action)).toEqual([
      'cell.marked',
      'cell.mark-undone',
      'cell.skipped',
    ]);
  });

  it('refuses a cell that somebody else marked in the meantime and shows it', async () => {
    await post('start');
    await mark('A1');
    const problem = expectProblem(await mark('A1', { outcome: 'skipped', note: 'late' }), 412, 'stale-version');
    expect(problem.current).toMatchObject({ address: 'A1', markState: 'marked', version: 2 });
  });

  it('lets one of two people marking the same cell at once through', async () => {
    await post('start');
    const answers = await Promise.all([mark('A1'), mark('A1')]);
    expect(answers.map(({ statusCode }) => statusCode).sort()).toEqual([200, 412]);
  });

  it('refuses a plate on which everything was skipped', async () => {
    await post('start');
    for (const { address } of coupon.cells) await mark(address, { outcome: 'skipped', note: 'lamp failed' });
    expectProblem(await post('finish'), 409, 'coupon-state');
  });

  it('never goes back once the plate is marked', async () => {
    await markAll();
    await post('finish');
    expectProblem(await mark('A1'), 409, 'coupon-state');
    const cell = cellAt('A1', await read());
    expectProblem(await post('undo', { cellId: cell.id, cellVersion: cell.version }), 409, 'coupon-state');
  });

  it.each(['start', 'cells', 'undo', 'finish'])('%s refuses anonymous callers, trainees, foreign coupons and unknown ids', async (act) => {
    const { id: cellId, version: cellVersion } = cellAt('A1');
    const body = { start: {}, finish: {}, undo: { cellId, cellVersion }, cells: { cellId, cellVersion, outcome: 'marked' } }[act] ?? {};
    expectProblem(await post(act, body, {}), 401, 'not-signed-in');
    expectProblem(await post(act, body, shop.trainee.headers), 403, 'not-permitted');
    expectProblem(await post(act, body, elsewhere.operator.headers), 404, 'not-found');
    expectProblem(await post(act, body, shop.operator.headers, 'C-0001'), 404, 'not-found');
  });

  it('names each wrong field of a cell', async () => {
    const problem = expectProblem(await post('cells', { cellId: 'x', cellVersion: 0, outcome: 'maybe' }), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/cellId', '#/cellVersion', '#/outcome']);
  });
});
