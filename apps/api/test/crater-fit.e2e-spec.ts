import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { CraterFitDto } from '../src/coupons/dto/crater-fit.dto';
import type { LedgerEventDto } from '../src/ledger/dto/ledger-event.dto';
import type { MachineLensDto } from '../src/machines/dto/machine-lens.dto';
import type { SpotMeasurementListDto } from '../src/machines/dto/spot-measurement.dto';
import { createTestApp, type TestApp } from './support/app';
import { makeCoupon, makePlanningShop, type PlanningShop, typed } from './support/coupons';
import { editing } from './support/equipment';
import type { TestMember } from './support/factories';
import { newKey } from './support/idempotency';
import { inspectionOf } from './support/inspections';
import { expectProblem } from './support/problem';

/** A spot of 30 µm radius and a threshold of 30 µJ: what the invented craters are drawn with, and what must come back. */
const [RADIUS_UM, THRESHOLD_UJ] = [30, 30];
const FOREIGN = '01990000-0000-7000-8000-000000000000';

let test: TestApp;
let shop: PlanningShop;
let elsewhere: PlanningShop;
let coupon: CouponDto;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makePlanningShop(test), await makePlanningShop(test)];
});
beforeEach(async () => {
  coupon = await makeCraterCoupon();
});
afterAll(() => test.close());

/** Six powers across, one and two passes down; 1 kHz and 0.4 mJ at most, so that 10 to 60 % are 40 to 240 µJ. Pulses lie 200 µm apart. */
async function makeCraterCoupon(): Promise<CouponDto> {
  const values = {
    ...{ speedMmPerS: typed(200, 'mm/s'), frequencyKhz: typed(1, 'kHz'), pulseWidthNs: typed(30, 'ns'), lineSpacingUm: typed(0.2, 'mm') },
  };
  const planned = await makeCoupon(test, shop, {
    rows: { parameter: 'passes', from: 1, to: 2, count: 2, spacing: 'steps' },
    columns: { parameter: 'powerPercent', from: 10, to: 60, count: 6, spacing: 'steps' },
    base: { values, fill: 'one direction', assist: 'none' },
    labelStep: undefined,
  });
  const post = async (act: string, payload: Readonly<Record<string, unknown>>) => {
    const url = `/api/coupons/${planned.id}/marking/${act}`;
    const answer = await test.app.inject({ method: 'POST', url, headers: { ...shop.operator.headers, ...newKey() }, payload });
    if (answer.statusCode >= 300) throw new Error(`${act} answered ${answer.statusCode}: ${answer.body}`);
    return answer;
  };
  await post('start', {});
  for (const { id: cellId, version: cellVersion } of planned.cells) await post('cells', { cellId, cellVersion, outcome: 'marked' });
  const marked = (await post('finish', {})).json<CouponDto>();
  await inspectionOf(test, marked.id, shop.operator).recordCriteria([]);
  return marked;
}

const diameterUm = (powerPercent: number) => Math.sqrt(2 * RADIUS_UM ** 2 * Math.log((4 * powerPercent) / THRESHOLD_UJ));
const rowA = () => coupon.cells.filter(({ address }) => address.startsWith('A'));

async function logCraters(cells = rowA(), off: (index: number) => number = () => 0): Promise<void> {
  const measurements = cells.map(({ id: cellId, parameters }, index) => ({
    ...{ cellId, quantity: 'crater-diameter', method: 'microscope', instrument: 'Microscope 2' },
    value: diameterUm(parameters.values.powerPercent?.physical ?? 0) + off(index),
  }));
  const answer = await inspectionOf(test, coupon.id, shop.operator).measure(measurements);
  if (answer.statusCode !== 201) throw new Error(`measuring answered ${answer.statusCode}: ${answer.body}`);
}

const url = (id = coupon.id) => `/api/coupons/${id}/crater-fit`;
const ask = (as: TestMember = shop.operator, id = coupon.id) => test.app.inject({ url: url(id), headers: as.headers });
const fit = async () => (await ask()).json<CraterFitDto>();
const lensOf = async () => {
  const answer = await test.app.inject({ url: `/api/machines/${shop.machine.id}/lenses`, headers: shop.lead.headers });
  const [pair] = answer.json<{ items: MachineLensDto[] }>().items;
  if (pair === undefined) throw new Error('the machine has no lens');
  return pair;
};
const spots = async () => {
  const answer = await test.app.inject({
    url: `/api/machines/${shop.machine.id}/lenses/${shop.lens.id}/spots`,
    headers: shop.operator.headers,
  });
  return answer.json<SpotMeasurementListDto>().items;
};
const save = (version: number, shownSpotUm: number, as: TestMember = shop.lead) =>
  test.app.inject({
    ...{ method: 'POST' as const, url: `${url()}/measured-spot` },
    ...{ headers: { ...editing(as, version), ...newKey() }, payload: { shownSpotUm } },
  });

describe('GET /api/coupons/:couponId/crater-fit', () => {
  it('has no line before anybody measured a crater, and says why', async () => {
    expect(await fit()).toMatchObject({ points: [], fit: null, spot: null, refusedBecause: '0 craters can be used; the line needs 5.' });
  });

  it('gives spot and threshold of the stored craters, and what to look at', async () => {
    await logCraters();
    const found = await fit();
    expect(found.fit?.spotRadiusUm).toBeCloseTo(RADIUS_UM, 6);
    expect(found.fit?.thresholdEnergyUj).toBeCloseTo(THRESHOLD_UJ, 6);
    // Fth = 2 Eth / (π w²): 60 µJ over 2827.4 µm²
    expect(found.fit?.thresholdPeakFluenceJPerCm2).toBeCloseTo(2.122_07, 4);
    expect(found).toMatchObject({ pointCount: 6, series: { pulses: 1, pulseWidthNs: 30, focusOffsetMm: 0 }, refusedBecause: null });
    expect(found.spot).toMatchObject({ diameterUm: 60, method: `Crater widths of ${coupon.code}, n = 6, ± 0 µm (standard error)` });
    expect(found.remarks).toEqual([expect.stringContaining('rest on no power calibration')]);
    expect(found.place).toMatchObject({ machineName: shop.machine.name, lensName: 'F160' });
  });

  it('follows later measurements: what is superseded leaves the line, and other passes are named', async () => {
    await logCraters();
    const calls = inspectionOf(test, coupon.id, shop.operator);
    const [wrong] = (await calls.read()).measurements;
    await calls.measure([
      {
        ...{ cellId: wrong?.cellId, quantity: 'crater-diameter', method: 'microscope', instrument: 'Microscope 2' },
        ...{ value: 40, supersedesId: wrong?.id, reason: 'rim read instead of the floor' },
      },
    ]);
    await logCraters(coupon.cells.filter(({ address }) => address === 'B3'));
    const { points, fit: line } = await fit();
    expect(points.map(({ address, excludedBecause }) => [address, excludedBecause]).at(-1)).toEqual([
      'B3',
      '2 pulses per place; the line is of 1',
    ]);
    expect(points[0]).toMatchObject({ address: 'A1', diameterUm: 40 });
    expect(line?.spotRadiusUm).toBeLessThan(RADIUS_UM);
  });

  it('is for operators and up, and another shop finds nothing', async () => {
    expectProblem(await test.app.inject({ url: url() }), 401, 'not-signed-in');
    expectProblem(await ask(shop.trainee), 403, 'not-permitted');
    expectProblem(await ask(elsewhere.operator), 404, 'not-found');
    expectProblem(await ask(shop.operator, FOREIGN), 404, 'not-found');
  });
});

describe('POST /api/coupons/:couponId/crater-fit/measured-spot', () => {
  it('makes it the measured spot, keeps the line in the history, and tells the ledger', async () => {
    await logCraters(rowA(), (index) => (index % 2 === 0 ? 0.5 : -0.5));
    const before = await lensOf();
    const { spot, fit: line } = await fit();
    const answer = await save(before.version, spot?.diameterUm ?? 0);
    expect(answer.statusCode).toBe(200);
    expect(answer.json<CraterFitDto>()).toMatchObject({
      place: { measuredSpotUm: spot?.diameterUm, version: before.version + 1 },
      notSavableBecause: 'It is the measured spot already.',
    });
    expect(await lensOf()).toMatchObject({
      measuredSpotUm: spot?.diameterUm,
      spotMethod: spot?.method,
      workingDistanceMm: before.workingDistanceMm,
    });
    const [kept] = await spots();
    expect(kept).toMatchObject({
      ...{ spotUm: spot?.diameterUm, standardErrorUm: spot?.standardErrorUm, isInUse: true, coupon: { id: coupon.id, code: coupon.code } },
      fit: { pointCount: 6, pulses: 1, cells: ['A1', 'A2', 'A3', 'A4', 'A5', 'A6'], thresholdEnergyUj: line?.thresholdEnergyUj },
      createdByName: shop.lead.printedName,
    });
    const ledger = await test.app.inject({ url: '/api/ledger?action=machine-lens.spot-measured', headers: shop.lead.headers });
    const [event] = ledger.json<{ items: LedgerEventDto[] }>().items;
    expect(event).toMatchObject({ actorName: shop.lead.printedName, after: { coupon: coupon.code, measuredSpotUm: spot?.diameterUm } });
  });

  it('refuses a number that the stored craters do not give, and an older version of the lens', async () => {
    await logCraters();
    const { version } = await lensOf();
    expectProblem(await save(version, 55), 409, 'conflict');
    expectProblem(await save(version + 7, 60), 412, 'stale-version');
    expect((await lensOf()).version).toBe(version);
  });

  it('refuses craters without a line', async () => {
    await logCraters(rowA().slice(0, 4));
    const { version } = await lensOf();
    const few = expectProblem(await save(version, 60), 409, 'conflict');
    expect(few).toMatchObject({ detail: '4 craters can be used; the line needs 5.' });
  });

  it('is for leads and up, needs the version and a number, and another shop finds nothing', async () => {
    await logCraters();
    const { version } = await lensOf();
    expectProblem(await save(version, 60, shop.operator), 403, 'not-permitted');
    expectProblem(await save(version, 60, elsewhere.lead), 404, 'not-found');
    expectProblem(await save(version, 0), 422, 'invalid-fields');
    const without = { ...shop.lead.headers, ...newKey() };
    const post = { method: 'POST' as const, url: `${url()}/measured-spot`, payload: { shownSpotUm: 60 } };
    expectProblem(await test.app.inject({ ...post, headers: without }), 428, 'version-required');
  });
});

describe('GET /api/machines/:machineId/lenses/:lensId/spots', () => {
  it('holds typed spots too, newest first, and says which one is in use', async () => {
    const lens = await lensOf();
    const patch = (version: number, payload: Readonly<Record<string, unknown>>) =>
      test.app.inject({
        ...{ method: 'PATCH' as const, url: `/api/machines/${shop.machine.id}/lenses/${shop.lens.id}` },
        ...{ headers: editing(shop.lead, version), payload },
      });
    const count = (await spots()).length;
    const first = { measuredSpotUm: 41, spotMethod: 'Knife edge', spotMeasuredOn: '2026-01-12' };
    expect((await patch(lens.version, first)).statusCode).toBe(200);
    expect((await patch(lens.version + 1, { workingDistanceMm: 181 })).statusCode).toBe(200);
    expect((await patch(lens.version + 2, { measuredSpotUm: 43 })).statusCode).toBe(200);
    const found = await spots();
    expect(found.slice(0, 2).map(({ spotUm, method, isInUse, coupon: from }) => [spotUm, method, isInUse, from])).toEqual([
      [43, 'Knife edge', true, null],
      [41, 'Knife edge', false, null],
    ]);
    expect(found).toHaveLength(count + 2);
  });
});
