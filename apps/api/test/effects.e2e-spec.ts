import { EFFECT_KEYS } from '@proofplate/recipe-model';
import type { EffectDto } from '../src/materials/dto/effect.dto';
import { createTestApp, type TestApp } from './support/app';
import { created, editing, effectByKey, fillStarterContent } from './support/equipment';
import { makeStaffedShop } from './support/factories';
import { newKey } from './support/idempotency';
import { expectProblem, pointersOf } from './support/problem';

let test: TestApp;
let shop: Awaited<ReturnType<typeof makeStaffedShop>>;
let elsewhere: Awaited<ReturnType<typeof makeStaffedShop>>;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeStaffedShop(test), await makeStaffedShop(test)];
  await fillStarterContent(test, shop.owner);
  await fillStarterContent(test, elsewhere.owner);
});
afterAll(() => test.close());

const patch = (id: string, version: number, payload: object) =>
  test.app.inject({ method: 'PATCH', url: `/api/effects/${id}`, headers: editing(shop.lead, version), payload });

describe('effects', () => {
  it('start with the closed list, whose criteria a shop may set', async () => {
    const answer = await test.app.inject({ url: '/api/effects?limit=100', headers: shop.operator.headers });
    const { items } = answer.json<{ items: EffectDto[] }>();
    expect(items.map(({ key }) => key).sort()).toEqual([...EFFECT_KEYS].sort());
    const anneal = await effectByKey(test, shop.lead, 'dark-anneal');
    const criteria = [{ quantity: 'lightness', comparison: 'at most', value: 30 }];
    const changed = (await patch(anneal.id, 1, { criteria })).json<EffectDto>();
    expect(changed).toMatchObject({ isShipped: true, criteria: [{ ...criteria[0], unit: '1' }], notes: anneal.notes, version: 2 });
    expectProblem(await patch(anneal.id, 1, { notes: 'x' }), 412, 'stale-version');
  });

  it('are added by the shop under a key of their own', async () => {
    const effect = await created<EffectDto>(test, shop.lead, '/api/effects', { name: 'Verdigris', criteria: [] });
    expect(effect).toMatchObject({ key: 'own-verdigris', isShipped: false, criteria: [] });
  });

  it('refuse unsound criteria at their fields', async () => {
    const { id } = await effectByKey(test, shop.lead, 'frost');
    const unsound = [
      { quantity: 'depth', comparison: 'between', value: 50, upper: 5 },
      { quantity: 'depth', comparison: 'at least', value: 1, unit: 'mm' },
    ];
    const answer = await patch(id, 1, { criteria: unsound });
    expect(pointersOf(expectProblem(answer, 422, 'invalid-fields'))).toEqual(['#/criteria/0/upper', '#/criteria/1/unit']);
    const unknown = await patch(id, 1, { criteria: [{ quantity: 'beauty', comparison: 'exactly', value: 'high' }] });
    expect(pointersOf(expectProblem(unknown, 422, 'invalid-fields'))).toEqual([
      '#/criteria/0/comparison',
      '#/criteria/0/quantity',
      '#/criteria/0/value',
    ]);
  });

  it('refuse the anonymous, the wrong role, a repeated name and another shop', async () => {
    const { id, name } = await effectByKey(test, shop.lead, 'polish');
    const read = (headers: Record<string, string>) => test.app.inject({ url: `/api/effects/${id}`, headers });
    expectProblem(await read({}), 401, 'not-signed-in');
    expectProblem(await read(shop.trainee.headers), 403, 'not-permitted');
    expectProblem(await read(elsewhere.owner.headers), 404, 'not-found');
    const post = (headers: Record<string, string>) =>
      test.app.inject({ method: 'POST', url: '/api/effects', headers: { ...headers, ...newKey() }, payload: { name } });
    expectProblem(await post(shop.operator.headers), 403, 'not-permitted');
    expectProblem(await post(shop.lead.headers), 409, 'already-exists');
  });
});
