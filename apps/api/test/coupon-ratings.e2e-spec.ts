import { randomUUID } from 'node:crypto';
import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { SavedMeasurementsDto, SavedRatingsDto } from '../src/coupons/dto/inspection.dto';
import { createTestApp, type TestApp } from './support/app';
import { makeCoupon, makePlanningShop, type PlanningShop } from './support/coupons';
import { asSuperuser } from './support/database';
import { inspectionOf, makeMarkedCoupon } from './support/inspections';
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
  await calls.recordCriteria([{ quantity: 'lightness', comparison: 'at most', value: 30 }]);
});
afterAll(() => test.close());

const cellId = (address: string) => coupon.cells.find((cell) => cell.address === address)?.id ?? '';
const rated = (address: string, rating: number | null, given: object = {}) => ({
  cellId: cellId(address),
  seenVersion: null,
  rating,
  ...given,
});
const colour = (address: string, value: number, given: object = {}) => ({
  cellId: cellId(address),
  quantity: 'lightness',
  value,
  method: 'colorimeter',
  methodDetail: { illuminant: 'D65', observer: '10°', geometry: '45/0' },
  instrument: 'Colorimeter 1',
  ...given,
});

describe('ratings of cells', () => {
  it('are kept per person, and a batch is one event of the ledger', async () => {
    const batch = [rated('A1', 5, { outcome: 'good', tags: ['even', ' wipe-proof '], note: ' dry cloth ' }), rated('B1', 0)];
    const answer = await calls.rate(batch);
    expect(answer.statusCode).toBe(200);
    expect(answer.json<SavedRatingsDto>().ratings).toMatchObject([
      { rating: 5, outcome: 'good', tags: ['even', 'wipe-proof'], note: 'dry cloth', by: shop.operator.printedName, version: 1 },
      { rating: 0, outcome: null, tags: [], version: 1 },
    ]);
    await calls.rate([rated('A1', 3)], shop.lead);

    const { ratings, verdicts } = await calls.read();
    expect(ratings.map(({ rating, by }) => [rating, by])).toEqual([
      [5, shop.operator.printedName],
      [0, shop.operator.printedName],
      [3, shop.lead.printedName],
    ]);
    expect(verdicts.find((verdict) => verdict.cellId === cellId('A1'))).toMatchObject({ meanRating: 4, rank: 1, meets: null });
    const events = await asSuperuser(
      test,
      (sql) => sql`select before, after from ledger_event where subject_id = ${coupon.id} and action = 'coupon.cells-rated' order by seq`,
    );
    expect(events).toHaveLength(2);
    expect(events[0]).toMatchObject({ before: {}, after: { A1: { rating: 5, note: 'dry cloth' }, B1: { rating: 0 } } });
  });

  it('that moved on since they were seen are refused with both values, and nothing of the batch is stored', async () => {
    await calls.rate([rated('A1', 2)]);
    const problem = expectProblem(await calls.rate([rated('A1', 5), rated('B1', 1)]), 412, 'stale-version');
    expect(problem.current).toMatchObject({
      conflicts: [{ cellId: cellId('A1'), yours: { rating: 5 }, current: { rating: 2, version: 1 } }],
    });
    expect((await calls.read()).ratings).toHaveLength(1);
    const changed = await calls.rate([rated('A1', 5, { seenVersion: 1 })]);
    expect(changed.json<SavedRatingsDto>().ratings).toMatchObject([{ rating: 5, version: 2 }]);
    expectProblem(await calls.rate([rated('B1', 5, { seenVersion: 3 })]), 412, 'stale-version');
  });

  it('sent twice at once are stored once, and the loser is told', async () => {
    const answers = await Promise.all([calls.rate([rated('A1', 1)]), calls.rate([rated('A1', 4)]), calls.rate([rated('A1', 5)])]);
    expect(answers.map(({ statusCode }) => statusCode).sort()).toEqual([200, 412, 412]);
    expect((await calls.read()).ratings).toHaveLength(1);
  });

  it('need a marked plate, recorded criteria and a cell that was marked', async () => {
    const planned = await makeCoupon(test, shop);
    const early = inspectionOf(test, planned.id, shop.operator);
    const [first] = planned.cells;
    expectProblem(await early.rate([{ cellId: first?.id, seenVersion: null, rating: 3 }]), 409, 'coupon-state');
    const fresh = await makeMarkedCoupon(test, shop);
    const [cell] = fresh.cells;
    const open = inspectionOf(test, fresh.id, shop.operator);
    expectProblem(await open.rate([{ cellId: cell?.id, seenVersion: null, rating: 3 }]), 409, 'criteria-first');
    const bad = await calls.rate([rated('A2', 3), { cellId: cell?.id, seenVersion: null, rating: 3 }]);
    expect(pointersOf(expectProblem(bad, 422, 'invalid-fields'))).toEqual(['#/ratings/0/rating', '#/ratings/1/cellId']);
  });

  it('outside 0 to 5, with unknown outcomes or no cells are refused field by field', async () => {
    const bad = await calls.rate([rated('A1', 6, { outcome: 'pretty', tags: [''] }), rated('B1', 2.5)]);
    expect(pointersOf(expectProblem(bad, 422, 'invalid-fields'))).toEqual([
      '#/ratings/0/outcome',
      '#/ratings/0/rating',
      '#/ratings/0/tags',
      '#/ratings/1/rating',
    ]);
    expect(pointersOf(expectProblem(await calls.rate([]), 422, 'invalid-fields'))).toEqual(['#/ratings']);
    expect(pointersOf(expectProblem(await calls.rate([rated('A1', 1), rated('A1', 2)]), 422, 'invalid-fields'))).toEqual(['#/ratings']);
  });
});

describe('measurements of cells', () => {
  it('come in batches, decide about the criteria and are one event of the ledger', async () => {
    const answer = await calls.measure([colour('A1', 25.7, { uncertainty: 0.4 }), colour('B1', 44)]);
    expect(answer.statusCode).toBe(201);
    expect(answer.json<SavedMeasurementsDto>().measurements[0]).toMatchObject({
      value: 25.7,
      unit: '1',
      uncertainty: 0.4,
      instrument: 'Colorimeter 1',
      methodDetail: { illuminant: 'D65' },
      by: shop.operator.printedName,
    });
    const { verdicts } = await calls.read();
    const of = (address: string) => verdicts.find((verdict) => verdict.cellId === cellId(address));
    expect(of('A1')).toMatchObject({ meets: true, rank: 1 });
    expect(of('B1')).toMatchObject({ meets: false, rank: 2, results: [{ criterion: 'Lightness at most 30', value: 44, meets: false }] });
    expect(of('B2')).toMatchObject({ meets: null, rank: null });
    const events = await asSuperuser(
      test,
      (sql) => sql`select after from ledger_event where subject_id = ${coupon.id} and action = 'coupon.cells-measured'`,
    );
    expect(events).toMatchObject([{ after: [{ address: 'A1', value: 25.7 }, { address: 'B1' }] }]);
  });

  it('are superseded with a reason, once, and never overwritten', async () => {
    const [wrong] = (await calls.measure([colour('A1', 52.7)])).json<SavedMeasurementsDto>().measurements;
    const right = colour('A1', 25.7, { supersedesId: wrong?.id });
    expect(pointersOf(expectProblem(await calls.measure([right]), 422, 'invalid-fields'))).toEqual(['#/measurements/0/reason']);
    expect((await calls.measure([{ ...right, reason: 'digits swapped' }])).statusCode).toBe(201);
    const again = await calls.measure([{ ...right, reason: 'once more' }]);
    expect(pointersOf(expectProblem(again, 422, 'invalid-fields'))).toEqual(['#/measurements/0/supersedesId']);
    const other = await calls.measure([colour('B1', 20, { supersedesId: wrong?.id, reason: 'other cell' })]);
    expect(pointersOf(expectProblem(other, 422, 'invalid-fields'))).toEqual(['#/measurements/0/supersedesId']);
    const { measurements, verdicts } = await calls.read();
    expect(measurements.map(({ value, isSuperseded, reason }) => [value, isSuperseded, reason])).toEqual([
      [52.7, true, ''],
      [25.7, false, 'digits swapped'],
    ]);
    expect(verdicts.find((verdict) => verdict.cellId === cellId('A1'))?.meets).toBe(true);
  });

  it('without their conditions, of skipped cells, from foreign photos or the future are refused', async () => {
    const bare = colour('A1', 30, { methodDetail: {} });
    expect(pointersOf(expectProblem(await calls.measure([bare]), 422, 'invalid-fields'))).toEqual([
      '#/measurements/0/methodDetail/geometry',
      '#/measurements/0/methodDetail/illuminant',
      '#/measurements/0/methodDetail/observer',
    ]);
    const ground = await calls.measure([
      colour('A2', 30),
      colour('A1', 30, { measuredAt: '2099-01-01T00:00:00Z' }),
      { cellId: cellId('A1'), quantity: 'contrast', value: 0.5, method: 'photo', photoId: randomUUID() },
    ]);
    expect(pointersOf(expectProblem(ground, 422, 'invalid-fields'))).toEqual([
      '#/measurements/0/cellId',
      '#/measurements/1/measuredAt',
      '#/measurements/2/photoId',
    ]);
  });
});

describe('ratings and measurements', () => {
  it('are closed to the anonymous, to trainees and to other shops', async () => {
    const url = `/api/coupons/${coupon.id}`;
    const bodies = [
      { method: 'PUT', url: `${url}/ratings`, payload: { ratings: [rated('A1', 3)] } },
      { method: 'POST', url: `${url}/measurements`, payload: { measurements: [colour('A1', 3)] } },
    ] as const;
    for (const body of bodies) {
      const send = (headers: Record<string, string>) =>
        test.app.inject({ ...body, headers: { ...headers, 'idempotency-key': randomUUID() } });
      expectProblem(await send({}), 401, 'not-signed-in');
      expectProblem(await send(shop.trainee.headers), 403, 'not-permitted');
      expectProblem(await send(elsewhere.owner.headers), 404, 'not-found');
    }
  });
});
