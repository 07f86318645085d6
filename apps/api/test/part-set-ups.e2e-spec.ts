import { randomUUID } from 'node:crypto';
import type { LedgerEventDto } from '../src/ledger/dto/ledger-event.dto';
import type { PartGroundDto, PartSetUpDto, RunPartSetUpDto } from '../src/runs/dto/part-set-up.dto';
import type { RunDto } from '../src/runs/dto/run.dto';
import { createTestApp, type TestApp } from './support/app';
import { type ApprovedRecipe, makeRecipe } from './support/approved-recipe';
import { created, fillStarterContent, makeMachine } from './support/equipment';
import { makeStaffedShop, type TestMember } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

type Shop = Awaited<ReturnType<typeof makeStaffedShop>>;
type Given = Readonly<Record<string, unknown>>;
let test: TestApp;
let shop: Shop;
let elsewhere: Shop;
let dial: ApprovedRecipe;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
  for (const one of [shop, elsewhere]) await fillStarterContent(test, one.owner);
  const machine = await makeMachine(test, shop.lead, { physical: BEAM });
  dial = await makeRecipe(test, shop.lead, { machine, values: { focusOffsetMm: { entered: { value: 0.5, unit: 'mm' }, physical: 0.5 } } });
});
afterAll(() => test.close());

const BEAM = { sourceKind: 'fibre-q-switched', wavelengthNm: 1064, ratedPowerW: 20, m2: 1.5, beamDiameterMm: 7 };
const mm = (value: number) => ({ value, unit: 'mm' });
const RING = {
  ...{ shape: 'ring', side: 'inside', diameter: mm(20), wall: mm(2), length: mm(8), artworkHeight: mm(5) },
  ...{ allowance: 'fluence loss', allowancePercent: 10, focusAt: 'mid', shownIn: 'mm' },
};

const post = (url: string, payload: Given, member: TestMember = shop.trainee, key = newKey()) =>
  test.app.inject({ method: 'POST', url, headers: { ...member.headers, ...key }, payload });
const get = (url: string, member: TestMember = shop.trainee) => test.app.inject({ url, headers: member.headers });
const startRun = (member: TestMember = shop.trainee, recipe = dial) =>
  created<RunDto>(test, member, '/api/runs', {
    ...{ clientId: randomUUID(), kind: 'production', revisionId: recipe.revisionId, lensFittedId: recipe.lens.id, ticks: ['set-up.0'] },
  });
const partOf = (run: RunDto) => `/api/runs/${run.id}/part-set-up`;
const numberOf = ({ results }: PartSetUpDto, key: string) => results.numbers.find((number) => number.key === key)?.value;

describe('POST /api/runs/:runId/part-set-up', () => {
  it('works the part out on the server and keeps it with the run, what was typed as it was typed', async () => {
    const run = await startRun();
    expect(run.allowedActions).toContain('set-up-part');
    const inches = { ...RING, diameter: { value: 0.75, unit: 'in' }, shownIn: 'in' };
    const answer = await post(partOf(run), inches);
    expect(answer.statusCode).toBe(201);
    const saved = answer.json<PartSetUpDto>();
    expect(saved).toMatchObject({
      ...{ number: 1, savedBy: shop.trainee.printedName, results: { isMirrored: true, stripLimit: 'focus' } },
      entered: { diameter: { value: 0.75, unit: 'in' }, wall: { value: 2, unit: 'mm' }, shownIn: 'in' },
      ground: { machine: { id: dial.machine.id }, lens: { id: dial.lens.id }, m2: 1.5, focusOffsetsMm: [0.5] },
    });
    // 0.75 in is 19.05 mm; less two walls of 2 mm.
    expect(numberOf(saved, 'rotaryDiameter')).toBeCloseTo(15.05, 9);
    expect(numberOf(saved, 'wrapLength')).toBeCloseTo(Math.PI * 15.05, 9);
    expect(numberOf(saved, 'leastIndexSteps')).toBeGreaterThan(1);
    expect((await get(partOf(run))).json<RunPartSetUpDto>().setUp).toEqual(saved);
  });

  it('adds the next number at another save, and both are in the ledger', async () => {
    const run = await startRun();
    await post(partOf(run), RING);
    const second = (await post(partOf(run), { ...RING, artworkWidth: mm(30) })).json<PartSetUpDto>();
    expect(second.number).toBe(2);
    expect((await get(partOf(run))).json<RunPartSetUpDto>().setUp).toEqual(second);
    const events = (await get(`/api/ledger?subjectId=${run.id}`, shop.operator)).json<{ items: LedgerEventDto[] }>().items;
    expect(events.map(({ action }) => action)).toEqual(['run.part-set-up-saved', 'run.part-set-up-saved', 'run.started']);
    expect(events[0]).toMatchObject({
      subjectCode: run.code,
      before: { entered: { shape: 'ring' } },
      after: { entered: { artworkWidth: { value: 30, unit: 'mm' } }, isMirrored: true },
    });
  });

  it('is carried out once for one key', async () => {
    const [run, key] = [await startRun(), newKey()];
    const [first, again] = [await post(partOf(run), RING, shop.trainee, key), await post(partOf(run), RING, shop.trainee, key)];
    expect(again.json()).toEqual(first.json());
    expect(again.headers['idempotency-replayed']).toBe('true');
    expect(first.json<PartSetUpDto>().number).toBe(1);
  });

  it('refuses each thing that cannot be at its field', async () => {
    const run = await startRun();
    const fewSteps = expectProblem(await post(partOf(run), { ...RING, indexSteps: 1 }), 422, 'invalid-fields');
    expect(fewSteps.errors).toEqual([{ pointer: '#/indexSteps', detail: expect.stringMatching(/too small for 1 index step/) }]);
    const wire = { ...RING, shape: 'cylinder', side: 'outside', diameter: mm(0.02) };
    expect(pointersOf(expectProblem(await post(partOf(run), wire), 422, 'invalid-fields'))).toEqual(['#/diameter']);
    const cone = { ...RING, shape: 'cone', smallDiameter: mm(30), largeDiameter: mm(20) };
    expect(pointersOf(expectProblem(await post(partOf(run), cone), 422, 'invalid-fields'))).toEqual(['#/smallDiameter']);
    expect((await get(partOf(run))).json<RunPartSetUpDto>().setUp).toBeNull();
  });

  it('refuses a body with every field wrong, and numbers of the device', async () => {
    const run = await startRun();
    const wrong = {
      ...RING,
      shape: 'cube',
      side: 'top',
      diameter: { value: 'wide', unit: 'km' },
      allowance: '',
      focusAt: 0,
      shownIn: 'ft',
    };
    expect(pointersOf(expectProblem(await post(partOf(run), { ...wrong, results: {} }), 422, 'invalid-fields'))).toEqual(
      ['#/allowance', '#/diameter/unit', '#/diameter/value', '#/focusAt', '#/results', '#/shape', '#/shownIn', '#/side'].sort(),
    );
  });

  it('keeps the reason in the place of a strip where the machine lacks its beam, and the wrap all the same', async () => {
    const machine = await makeMachine(test, shop.lead, {
      physical: { sourceKind: 'fibre-q-switched', wavelengthNm: 1064, ratedPowerW: 20 },
    });
    const run = await startRun(shop.trainee, await makeRecipe(test, shop.lead, { machine }));
    const saved = (await post(partOf(run), RING)).json<PartSetUpDto>();
    expect(saved.results.numbers.find(({ key }) => key === 'stripWidth')).toMatchObject({
      value: null,
      missingBecause: expect.stringMatching(/not recorded; add it to the machine/),
    });
    expect(numberOf(saved, 'rotaryDiameter')).toBe(16);
  });

  it('refuses a finished run, and leaves its part as it was', async () => {
    const run = await startRun();
    const saved = (await post(partOf(run), RING)).json<PartSetUpDto>();
    const finished = (await post(`/api/runs/${run.id}/finish`, { good: 0, scrap: 1 })).json<RunDto>();
    expect(finished.allowedActions).not.toContain('set-up-part');
    expectProblem(await post(partOf(run), RING), 409, 'run-finished');
    expect((await get(partOf(run))).json<RunPartSetUpDto>().setUp).toEqual(saved);
  });

  it('refuses a stranger, another shop, a trainee who did not start the run, and a call without a key', async () => {
    const run = await startRun(shop.operator);
    expectProblem(await test.app.inject({ method: 'POST', url: partOf(run), headers: newKey(), payload: RING }), 401, 'not-signed-in');
    for (const member of [shop.trainee, elsewhere.owner]) {
      expectProblem(await post(partOf(run), RING, member), 404, 'not-found');
      expectProblem(await get(partOf(run), member), 404, 'not-found');
    }
    const bare = await test.app.inject({ method: 'POST', url: partOf(run), headers: shop.operator.headers, payload: RING });
    expectProblem(bare, 400, 'idempotency-key-required');
  });
});

describe('GET /api/runs/part-ground/:revisionId', () => {
  it('tells a trainee what a part is worked out with before the run exists', async () => {
    const ground = (await get(`/api/runs/part-ground/${dial.revisionId}`)).json<PartGroundDto>();
    expect(ground).toMatchObject({
      ...{ machine: { id: dial.machine.id }, lens: { id: dial.lens.id }, wavelengthNm: 1064, beamDiameterMm: 7 },
      ...{ focalLengthMm: dial.lens.focalLengthMm, fieldSizeMm: dial.lens.fieldSizeMm, measuredSpotUm: null, focusOffsetsMm: [0.5] },
    });
  });

  it('takes the spot that was measured on the machine with the lens', async () => {
    const machine = await makeMachine(test, shop.lead, { physical: BEAM });
    const recipe = await makeRecipe(test, shop.lead, { machine });
    await created(test, shop.lead, `/api/machines/${machine.id}/lenses`, {
      lensId: recipe.lens.id,
      measuredSpotUm: 48,
      spotMethod: 'Knife edge',
      spotMeasuredOn: '2026-02-02',
    });
    expect((await get(`/api/runs/part-ground/${recipe.revisionId}`)).json<PartGroundDto>().measuredSpotUm).toBe(48);
  });

  it('hides a draft from a trainee and everything from another shop', async () => {
    const draft = await makeRecipe(test, shop.lead, { state: 'draft' });
    expectProblem(await get(`/api/runs/part-ground/${draft.revisionId}`), 404, 'not-found');
    expect((await get(`/api/runs/part-ground/${draft.revisionId}`, shop.operator)).statusCode).toBe(200);
    expectProblem(await get(`/api/runs/part-ground/${dial.revisionId}`, elsewhere.owner), 404, 'not-found');
  });
});
