import type { CalibrationDto, CalibrationWattsDto } from '../src/machines/dto/calibration.dto';
import type { MachineDto } from '../src/machines/dto/machine.dto';
import { createTestApp, type TestApp } from './support/app';
import { created, makeMachine } from './support/equipment';
import { makeStaffedShop } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: Awaited<ReturnType<typeof makeStaffedShop>>;
let elsewhere: Awaited<ReturnType<typeof makeStaffedShop>>;
let machine: MachineDto;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
  machine = await makeMachine(test, shop.lead);
});
afterAll(() => test.close());

/** The readings and the watts in between that SciPy's PchipInterpolator gives (packages/physics/test/reference). */
const READINGS = { percent: [5, 10, 20, 40, 60, 80, 100], watts: [0.1, 0.9, 3.1, 8.4, 13, 16.8, 19.2] };
const BETWEEN = {
  percent: [7.5, 15, 33, 50, 72.5, 95],
  watts: [0.473706896552, 1.9301372273, 6.55735328283, 10.7954184704, 15.5325010801, 18.7238407258],
};
const points = READINGS.percent.map((percent, index) => ({ percent, watts: READINGS.watts[index] }));
const reading = (given: object = {}) => ({
  measuredOn: '2026-05-04',
  meter: 'Thermal head 3',
  wavelengthNm: 1064,
  frequencyKhz: 30,
  points,
  ...given,
});
const url = () => `/api/machines/${machine.id}/calibrations`;
const post = (payload: object, headers: Record<string, string> = shop.lead.headers) =>
  test.app.inject({ method: 'POST', url: url(), headers: { ...headers, ...newKey() }, payload });

describe('POST /api/machines/:id/calibrations', () => {
  it('keeps the readings with meter, day and conditions, and dates the machine', async () => {
    const calibration = await created<CalibrationDto>(test, shop.lead, url(), reading({ meterDueOn: '2027-01-31', pulseWidthNs: 100 }));
    expect(calibration).toMatchObject({
      machineId: machine.id,
      meterDueOn: '2027-01-31',
      frequencyKhz: 30,
      pulseWidthNs: 100,
      points,
      createdByName: shop.lead.printedName,
    });
    const seen = await test.app.inject({ url: `/api/machines/${machine.id}`, headers: shop.operator.headers });
    expect(seen.json<MachineDto>().latestCalibrationOn).toBe('2026-05-04');
  });

  it('refuses fewer than three readings', async () => {
    const answer = await post(reading({ points: points.slice(0, 2) }));
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/points']);
  });

  it('names the pair that no monotone curve can pass', async () => {
    const falling = [...points.slice(0, 3), { percent: 30, watts: 2 }, { percent: 30, watts: 5 }];
    const problem = expectProblem(await post(reading({ points: falling })), 422, 'invalid-fields');
    expect(problem.errors).toEqual([
      { pointer: '#/points/3/watts', detail: expect.stringContaining('Readings 3 and 4 (20 % 3.1 W; 30 % 2 W)') },
      { pointer: '#/points/4/percent', detail: expect.stringContaining('Readings 4 and 5') },
    ]);
  });

  it('names each wrong field', async () => {
    const answer = await post({
      measuredOn: 'yesterday',
      meter: ' ',
      wavelengthNm: 5,
      points: [{ percent: 120, watts: -1 }, ...points.slice(4)],
    });
    const pointers = ['#/measuredOn', '#/meter', '#/points/0/percent', '#/points/0/watts', '#/wavelengthNm'];
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(pointers);
  });

  it('refuses days that no calendar has', async () => {
    const answer = await post(reading({ measuredOn: '2026-02-30', meterDueOn: '2027-02-29' }));
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/measuredOn', '#/meterDueOn']);
  });

  it('refuses a reading of a day that is still to come, which would be the newest until then', async () => {
    const problem = expectProblem(await post(reading({ measuredOn: '2999-01-01' })), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual(['#/measuredOn']);
  });

  it('is for leads; another shop’s machine is not there', async () => {
    expectProblem(await post(reading(), shop.operator.headers), 403, 'not-permitted');
    expectProblem(await post(reading(), elsewhere.lead.headers), 404, 'not-found');
    expectProblem(await post(reading(), {}), 401, 'not-signed-in');
  });

  it('has no route that changes or removes one afterwards', async () => {
    const { id } = await created<CalibrationDto>(test, shop.lead, url(), reading());
    for (const method of ['PATCH', 'PUT', 'DELETE'] as const) {
      const answer = await test.app.inject({ method, url: `${url()}/${id}`, headers: shop.owner.headers });
      expect([404, 405]).toContain(answer.statusCode);
    }
  });
});

describe('GET /api/machines/:id/calibrations', () => {
  it('lists the newest reading first, page by page', async () => {
    const other = await makeMachine(test, shop.lead);
    const path = `/api/machines/${other.id}/calibrations`;
    for (const measuredOn of ['2026-01-10', '2026-03-10', '2026-02-10']) await created(test, shop.lead, path, reading({ measuredOn }));
    type Listed = { items: CalibrationDto[]; nextCursor: string | null };
    const first = (await test.app.inject({ url: `${path}?limit=2`, headers: shop.operator.headers })).json<Listed>();
    const rest = (
      await test.app.inject({ url: `${path}?limit=2&cursor=${first.nextCursor}`, headers: shop.operator.headers })
    ).json<Listed>();
    expect([...first.items, ...rest.items].map(({ measuredOn }) => measuredOn)).toEqual(['2026-03-10', '2026-02-10', '2026-01-10']);
  });
});

describe('GET /api/machines/:id/calibrations/:calibrationId/watts', () => {
  const watts = async (calibrationId: string, percent: number | string, headers: Record<string, string> = shop.operator.headers) =>
    test.app.inject({ url: `${url()}/${calibrationId}/watts?percent=${percent}`, headers });

  it('follows the monotone curve through the readings', async () => {
    const { id } = await created<CalibrationDto>(test, shop.lead, url(), reading());
    for (const [index, percent] of BETWEEN.percent.entries()) {
      const answer = (await watts(id, percent)).json<CalibrationWattsDto>();
      // the reference has twelve digits
      expect((answer.watts ?? 0) / (BETWEEN.watts[index] ?? 1)).toBeCloseTo(1, 10);
      expect(answer).toMatchObject({ reason: null, method: expect.stringContaining('Fritsch') });
    }
  });

  it('says why there is no number beyond the readings', async () => {
    const { id } = await created<CalibrationDto>(test, shop.lead, url(), reading());
    expect((await watts(id, 4.9)).json()).toMatchObject({ percent: 4.9, watts: null, reason: expect.stringContaining('5 to 100 %') });
  });

  it('refuses no percentage, another machine’s calibration and another shop', async () => {
    const { id } = await created<CalibrationDto>(test, shop.lead, url(), reading());
    expect(pointersOf(expectProblem(await watts(id, 'much'), 422, 'invalid-fields'))).toEqual(['#/percent']);
    expectProblem(await watts(id, 50, elsewhere.owner.headers), 404, 'not-found');
    const other = await makeMachine(test, shop.lead);
    const headers = shop.operator.headers;
    expectProblem(
      await test.app.inject({ url: `/api/machines/${other.id}/calibrations/${id}/watts?percent=50`, headers }),
      404,
      'not-found',
    );
  });
});
