import { randomUUID } from 'node:crypto';
import type { MaterialDto, MaterialFacetsDto } from '../src/materials/dto/material.dto';
import type { MaterialGroupDto } from '../src/materials/dto/material-group.dto';
import { createTestApp, type TestApp } from './support/app';
import { makeRecipe } from './support/approved-recipe';
import { created, editing, fillStarterContent, makeMaterial } from './support/equipment';
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
});
afterAll(() => test.close());

const get = (url: string, headers: Record<string, string> = shop.operator.headers) => test.app.inject({ url, headers });
const post = (url: string, payload: object, headers: Record<string, string> = shop.lead.headers) =>
  test.app.inject({ method: 'POST', url, headers: { ...headers, ...newKey() }, payload });
const patch = (url: string, version: number, payload: object) =>
  test.app.inject({ method: 'PATCH', url, headers: editing(shop.lead, version), payload });

describe('POST /api/materials', () => {
  it.each([
    ['vinyl', 'pvc'],
    ['PMMA', 'acrylic'],
    ['316L', 'stainless-steel'],
    ['leather', 'chrome-tanned-leather'],
    ['Titanium', 'titanium'],
    ['unobtainium', 'unknown'],
  ])('takes %s for the family %s', async (word, family) => {
    expect((await makeMaterial(test, shop.lead, { family: word })).family).toBe(family);
  });

  it('shows the cautions that name the material, never first', async () => {
    const vinyl = await makeMaterial(test, shop.lead, { family: 'vinyl' });
    expect(vinyl.cautions).toMatchObject([{ level: 'never', subject: expect.stringContaining('PVC') }]);
    const unlisted = await makeMaterial(test, shop.lead, { family: 'mystery alloy' });
    expect(unlisted.cautions).toMatchObject([{ level: 'care', subject: expect.stringContaining('safety data sheet') }]);
    expect((await makeMaterial(test, shop.lead, { family: 'stainless steel' })).cautions).toEqual([]);
  });

  it('keeps numbers of the material with their source', async () => {
    const properties = { thermalConductivityWPerMK: { value: 16.3, source: 'mill certificate 4711' } };
    const material = await makeMaterial(test, shop.lead, { grade: '1.4404', thicknessMm: 1.5, properties });
    expect(material).toMatchObject({ grade: '1.4404', thicknessMm: 1.5, properties });
  });

  it('names every wrong field', async () => {
    const payload = { name: '', family: '', thicknessMm: 0, properties: { densityKgPerM3: { value: 'heavy' } }, price: 3 };
    const pointers = [
      '#/family',
      '#/name',
      '#/price',
      '#/properties/densityKgPerM3/source',
      '#/properties/densityKgPerM3/value',
      '#/thicknessMm',
    ];
    expect(pointersOf(expectProblem(await post('/api/materials', payload), 422, 'invalid-fields'))).toEqual(pointers);
  });

  it('refuses a repeated name', async () => {
    const { name } = await makeMaterial(test, shop.lead);
    expectProblem(await post('/api/materials', { name, family: 'brass' }), 409, 'already-exists');
  });
});

describe('PATCH /api/materials/:id', () => {
  it('changes what is given and nothing else', async () => {
    const material = await makeMaterial(test, shop.lead, { grade: 'H', thicknessMm: 2 });
    const url = `/api/materials/${material.id}`;
    const changed = (await patch(url, 1, { family: 'brass', thicknessMm: null })).json<MaterialDto>();
    expect(changed).toMatchObject({ family: 'brass', grade: 'H', thicknessMm: null, version: 2 });
    expect(changed.cautions.map(({ level }) => level)).toContain('care');
    expect(expectProblem(await patch(url, 1, { grade: 'X' }), 412, 'stale-version').current).toMatchObject({ version: 2 });
  });

  it('does not touch an archived material', async () => {
    const { id } = await makeMaterial(test, shop.lead);
    await test.app.inject({ method: 'POST', url: `/api/materials/${id}/archive`, headers: editing(shop.lead, 1) });
    expectProblem(await patch(`/api/materials/${id}`, 2, { grade: 'X' }), 409, 'conflict');
  });
});

describe('GET /api/materials', () => {
  it('finds by family and by words, and takes the signs of a pattern literally', async () => {
    const fresh = await makeStaffedShop(test);
    await makeMaterial(test, fresh.lead, { name: 'Plate 100%', family: 'brass', supplier: 'Northern Metals' });
    await makeMaterial(test, fresh.lead, { name: 'Plate 1000', family: 'brass' });
    await makeMaterial(test, fresh.lead, { name: 'Slate round', family: 'slate' });
    const names = async (query: string) =>
      (await get(`/api/materials?${query}`, fresh.operator.headers)).json<{ items: MaterialDto[] }>().items.map(({ name }) => name);
    expect(await names('family=brass')).toEqual(['Plate 100%', 'Plate 1000']);
    expect(await names('family=stone&family=acrylic')).toEqual(['Slate round']);
    expect(await names('q=100%25')).toEqual(['Plate 100%']);
    expect(await names('q=northern')).toEqual(['Plate 100%']);
    expect(await names('q=slate&family=brass')).toEqual([]);
    const { families } = (await get('/api/materials/facets', fresh.operator.headers)).json<MaterialFacetsDto>();
    expect(families).toEqual([
      { family: 'brass', label: 'Brass', count: 2 },
      { family: 'stone', label: 'Stone', count: 1 },
    ]);
  });

  it('refuses a family that is not on the list', async () => {
    expect(pointersOf(expectProblem(await get('/api/materials?family=cheese'), 422, 'invalid-fields'))).toEqual(['#/family']);
  });
});

describe('groups of materials', () => {
  it('name their materials one by one and replace the list as a whole', async () => {
    const [a, b] = [await makeMaterial(test, shop.lead), await makeMaterial(test, shop.lead)];
    const group = await created<MaterialGroupDto>(test, shop.lead, '/api/material-groups', {
      name: '300 series',
      materialIds: [a.id, b.id],
    });
    expect(group.materials.map(({ id }) => id).sort()).toEqual([a.id, b.id].sort());
    const changed = (await patch(`/api/material-groups/${group.id}`, 1, { materialIds: [b.id] })).json<MaterialGroupDto>();
    expect(changed).toMatchObject({ name: '300 series', materials: [{ id: b.id, name: b.name }], version: 2 });
  });

  it.each(['in_review', 'scheduled', 'approved'] as const)(
    'take no further material while a revision that is %s covers them',
    async (state) => {
      const [a, b] = [await makeMaterial(test, shop.lead), await makeMaterial(test, shop.lead)];
      const group = await created<MaterialGroupDto>(test, shop.lead, '/api/material-groups', { name: randomUUID(), materialIds: [a.id] });
      const { recipeId, code } = await makeRecipe(test, shop.lead, { material: a, materialGroupId: group.id, state });
      const url = `/api/material-groups/${group.id}`;
      const problem = expectProblem(await patch(url, 1, { materialIds: [a.id, b.id] }), 409, 'group-signed');
      expect(problem).toMatchObject({ recipes: [{ id: recipeId, code }], detail: expect.stringContaining('Make another group') });
      expect((await get(url)).json<MaterialGroupDto>()).toMatchObject({ version: 1, materials: [{ id: a.id }] });
      const left = (await patch(url, 1, { name: `${group.name} b`, materialIds: [] })).json<MaterialGroupDto>();
      expect(left).toMatchObject({ name: `${group.name} b`, materials: [] });
      expectProblem(await patch(url, 2, { materialIds: [b.id] }), 409, 'group-signed');
    },
  );

  it.each(['draft', 'returned', 'withdrawn', 'superseded'] as const)('take further ones where a revision is only %s', async (state) => {
    const [a, b] = [await makeMaterial(test, shop.lead), await makeMaterial(test, shop.lead)];
    const group = await created<MaterialGroupDto>(test, shop.lead, '/api/material-groups', { name: randomUUID(), materialIds: [a.id] });
    await makeRecipe(test, shop.lead, { material: a, materialGroupId: group.id, state });
    const wider = (await patch(`/api/material-groups/${group.id}`, 1, { materialIds: [a.id, b.id] })).json<MaterialGroupDto>();
    expect(wider.materials).toHaveLength(2);
  });

  it('refuse a material of another shop, a double and a repeated name', async () => {
    const foreign = await makeMaterial(test, elsewhere.lead);
    const mine = await makeMaterial(test, shop.lead);
    const send = (payload: object) => post('/api/material-groups', payload);
    expect(pointersOf(expectProblem(await send({ name: 'x', materialIds: [foreign.id] }), 422, 'invalid-fields'))).toEqual([
      '#/materialIds',
    ]);
    expect(pointersOf(expectProblem(await send({ name: 'x', materialIds: [mine.id, mine.id] }), 422, 'invalid-fields'))).toEqual([
      '#/materialIds',
    ]);
    await send({ name: 'once', materialIds: [] });
    expectProblem(await send({ name: 'once', materialIds: [] }), 409, 'already-exists');
  });
});

describe('every route of materials and groups', () => {
  it('refuses the anonymous, the wrong role and another shop', async () => {
    const material = await makeMaterial(test, shop.lead);
    const group = await created<MaterialGroupDto>(test, shop.lead, '/api/material-groups', { name: randomUUID(), materialIds: [] });
    for (const url of [`/api/materials/${material.id}`, `/api/material-groups/${group.id}`]) {
      expectProblem(await get(url, {}), 401, 'not-signed-in');
      expectProblem(await get(url, shop.trainee.headers), 403, 'not-permitted');
      expectProblem(await get(url, elsewhere.owner.headers), 404, 'not-found');
      const edit = { method: 'PATCH', url, payload: { name: 'x' } } as const;
      expectProblem(await test.app.inject({ ...edit, headers: editing(shop.operator, 1) }), 403, 'not-permitted');
      expectProblem(await test.app.inject({ ...edit, headers: editing(elsewhere.lead, 1) }), 404, 'not-found');
    }
    expectProblem(await post('/api/materials', { name: 'x', family: 'brass' }, shop.operator.headers), 403, 'not-permitted');
  });
});
