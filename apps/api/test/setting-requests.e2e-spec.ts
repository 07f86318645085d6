import { randomUUID } from 'node:crypto';
import type { SettingRequestDto, SettingRequestPageDto } from '../src/runs/dto/setting-request.dto';
import { createTestApp, type TestApp } from './support/app';
import { type Ground, makeGround } from './support/approved-recipe';
import { fillStarterContent, makeMaterial } from './support/equipment';
import { makeStaffedShop, type TestMember } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

type Shop = Awaited<ReturnType<typeof makeStaffedShop>>;
let test: TestApp;
let shop: Shop;
let elsewhere: Shop;
let ground: Ground;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
  for (const one of [shop, elsewhere]) await fillStarterContent(test, one.owner);
  ground = await makeGround(test, shop.lead);
});
afterAll(() => test.close());

type Given = Readonly<Record<string, unknown>>;
const post = (url: string, payload: Given, member: TestMember) =>
  test.app.inject({ method: 'POST', url, headers: { ...member.headers, ...newKey() }, payload });
const ask = (given: Given = {}, member: TestMember = shop.trainee) =>
  post('/api/setting-requests', { materialId: ground.material.id, ...given }, member);
const list = async (query: string, member: TestMember) =>
  (await test.app.inject({ url: `/api/setting-requests${query}`, headers: member.headers })).json<SettingRequestPageDto>().items;

describe('POST /api/setting-requests', () => {
  it('keeps the sentence, the job and the day', async () => {
    const { machine, lens, finish, effect } = ground;
    const answer = await ask({
      machineId: machine.id,
      lensId: lens.id,
      finishId: finish.id,
      effectId: effect.id,
      jobReference: 'J-26-0418',
      neededOn: '2999-05-19',
      note: 'Twenty dials',
    });
    expect(answer.statusCode).toBe(201);
    expect(answer.json<SettingRequestDto>()).toMatchObject({
      state: 'open',
      machine: { name: machine.name },
      lens: { name: lens.name },
      material: { name: ground.material.name },
      finish: { name: finish.name },
      effect: { name: effect.name },
      jobReference: 'J-26-0418',
      neededOn: '2999-05-19',
      askedBy: shop.trainee.printedName,
      answer: null,
      allowedActions: [],
    });
  });

  it('asks nobody for a setting of what must never be marked', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { family: 'pvc' });
    expectProblem(await ask({ materialId: vinyl.id }), 409, 'never-mark');
  });

  it('refuses a day that is past, at its field', async () => {
    const problem = expectProblem(await ask({ neededOn: '2020-01-01' }), 422, 'invalid-fields');
    expect(problem.errors).toEqual([{ pointer: '#/neededOn', detail: 'Enter today or a later day.' }]);
  });

  it('names what is not in the shop, and every wrong field', async () => {
    const foreign = await makeMaterial(test, elsewhere.lead);
    expect(pointersOf(expectProblem(await ask({ materialId: foreign.id, lensId: randomUUID() }), 422, 'invalid-fields'))).toEqual([
      '#/lensId',
      '#/materialId',
    ]);
    const wrong = await ask({ materialId: 'sheet', neededOn: '2026-02-31', jobReference: 7 });
    expect(pointersOf(expectProblem(wrong, 422, 'invalid-fields'))).toEqual(['#/jobReference', '#/materialId', '#/neededOn']);
    const anonymous = await test.app.inject({ method: 'POST', url: '/api/setting-requests', headers: newKey(), payload: {} });
    expectProblem(anonymous, 401, 'not-signed-in');
  });
});

describe('GET /api/setting-requests', () => {
  it('shows a trainee the own ones, operators all, by state', async () => {
    const own = (await ask()).json<SettingRequestDto>();
    const other = (await ask({}, shop.operator)).json<SettingRequestDto>();
    const idsOf = (items: readonly SettingRequestDto[]) => items.map(({ id }) => id);
    expect(idsOf(await list('', shop.trainee))).toContain(own.id);
    expect(idsOf(await list('', shop.trainee))).not.toContain(other.id);
    expect(idsOf(await list('?state=open', shop.operator)).slice(0, 2)).toEqual([other.id, own.id]);
    expect(await list('?state=closed', shop.operator)).toEqual([]);
    expect(await list('', elsewhere.owner)).toEqual([]);
    expectProblem(await test.app.inject({ url: '/api/setting-requests' }), 401, 'not-signed-in');
  });
});

describe('POST /api/setting-requests/:id/answer', () => {
  it('says what became of it, once', async () => {
    const { id } = (await ask()).json<SettingRequestDto>();
    const answer = await post(`/api/setting-requests/${id}/answer`, { answer: 'R-0042 is signed', state: 'answered' }, shop.operator);
    expect(answer.json<SettingRequestDto>()).toMatchObject({
      state: 'answered',
      answer: 'R-0042 is signed',
      answeredBy: shop.operator.printedName,
    });
    const again = await post(`/api/setting-requests/${id}/answer`, { answer: 'No', state: 'closed' }, shop.lead);
    expectProblem(again, 409, 'request-answered');
  });

  it('refuses trainees, strangers, other shops and empty answers', async () => {
    const { id } = (await ask()).json<SettingRequestDto>();
    const url = `/api/setting-requests/${id}/answer`;
    const body = { answer: 'There will be none', state: 'closed' };
    expectProblem(await post(url, body, shop.trainee), 403, 'not-permitted');
    expectProblem(await post(url, body, elsewhere.owner), 404, 'not-found');
    expectProblem(await test.app.inject({ method: 'POST', url, headers: newKey(), payload: body }), 401, 'not-signed-in');
    const wrong = await post(url, { answer: '', state: 'open' }, shop.operator);
    expect(pointersOf(expectProblem(wrong, 422, 'invalid-fields'))).toEqual(['#/answer', '#/state']);
  });
});
