import { randomUUID } from 'node:crypto';
import { SHIPPED_CAUTIONS } from '@proofplate/recipe-model';
import { CautionsService, type WorkInHand } from '../src/materials/cautions.service';
import type { CautionDto, CautionsForDto } from '../src/materials/dto/caution.dto';
import { ForbiddenByCautionError } from '../src/materials/materials.errors';
import { createTestApp, type TestApp } from './support/app';
import { allCautions, created, editing, effectByKey, fillStarterContent, makeMachine, makeMaterial } from './support/equipment';
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

const patch = (id: string, version: number, payload: object) =>
  test.app.inject({ method: 'PATCH', url: `/api/cautions/${id}`, headers: editing(shop.lead, version), payload });
const cautionsFor = (query: Record<string, string>, headers: Record<string, string> = shop.trainee.headers) =>
  test.app.inject({ url: `/api/cautions/for?${new URLSearchParams(query)}`, headers });
const about = async (words: string): Promise<CautionDto> => {
  const found = (await allCautions(test, shop.lead)).find(({ subject }) => subject.includes(words));
  if (found === undefined) throw new Error(`no caution says ${words}`);
  return found;
};
const own = (given: object = {}) => ({
  level: 'care',
  subject: 'Clamp thin sheet on all four sides.',
  text: 'It lifts out of focus when it warms.',
  source: 'Our own scrap of March',
  appliesTo: {},
  ...given,
});

describe('the cautions of a new shop', () => {
  it('are the shipped ones, never first, with their sources, and anyone in the shop may read them', async () => {
    const listed = await allCautions(test, shop.trainee);
    expect(listed).toHaveLength(SHIPPED_CAUTIONS.length);
    const levels = listed.map(({ level }) => level);
    expect(levels.lastIndexOf('never')).toBeLessThan(levels.indexOf('care'));
    expect(listed.every(({ source, isShipped, allowedActions }) => source !== '' && isShipped && allowedActions.length === 0)).toBe(true);
  });

  it('are not doubled when the content is put in again', async () => {
    await fillStarterContent(test, shop.owner);
    expect(await allCautions(test, shop.lead)).toHaveLength(SHIPPED_CAUTIONS.length);
  });

  it('come with sign-up', async () => {
    const payload = {
      shopName: 'Quayside Plates',
      name: 'Io Marsh',
      email: `${randomUUID()}@example.com`,
      password: 'violet kettle on the roof',
      timeZone: 'Europe/Lisbon',
      locale: 'en-GB',
      unitSystem: 'metric',
    };
    const headers = { ...newKey(), 'x-requested-by': 'proofplate' };
    const answer = await test.app.inject({ method: 'POST', url: '/api/auth/sign-up', headers, payload });
    const { accessToken } = answer.json<{ accessToken: string }>();
    const listed = await test.app.inject({ url: '/api/cautions', headers: { authorization: `Bearer ${accessToken}` } });
    expect(listed.json<{ items: CautionDto[] }>().items).toHaveLength(SHIPPED_CAUTIONS.length);
  });
});

describe('PATCH /api/cautions/:id', () => {
  it('lets a lead turn care into never and widen what it applies to', async () => {
    const caution = await about('MDF');
    const appliesTo = { families: ['mdf', 'wood'] };
    const answer = await patch(caution.id, caution.version, { level: 'never', appliesTo });
    expect(answer.json<CautionDto>()).toMatchObject({ level: 'never', appliesTo, version: 2, allowedActions: ['tighten'] });
  });

  it('refuses to loosen: never into care, a narrower scope, other words for a shipped caution', async () => {
    const pvc = await about('PVC');
    const zinc = await about('fume of zinc');
    for (const [caution, change] of [
      [pvc, { level: 'care' }],
      [pvc, { appliesTo: { families: ['wood'] } }],
      [pvc, { appliesTo: { families: ['pvc'], sourceKinds: ['co2'] } }],
      [zinc, { appliesTo: { families: ['zinc'] } }],
      [zinc, { subject: 'Breathe in.' }],
    ] as const) {
      expectProblem(await patch(caution.id, caution.version, change), 409, 'caution-loosened');
    }
    expect(await about('PVC')).toEqual(pvc);
  });

  it('has no way to remove a caution', async () => {
    const { id } = await about('PVC');
    const answer = await test.app.inject({ method: 'DELETE', url: `/api/cautions/${id}`, headers: shop.owner.headers });
    expect([404, 405]).toContain(answer.statusCode);
  });

  it('keeps an edit of an older version out, and operators and other shops', async () => {
    const caution = await created<CautionDto>(test, shop.lead, '/api/cautions', own());
    await patch(caution.id, 1, { text: 'It lifts.' });
    expectProblem(await patch(caution.id, 1, { text: 'Late.' }), 412, 'stale-version');
    const edit = { method: 'PATCH', url: `/api/cautions/${caution.id}`, payload: { level: 'never' } } as const;
    expectProblem(await test.app.inject({ ...edit, headers: editing(shop.operator, 2) }), 403, 'not-permitted');
    expectProblem(await test.app.inject({ ...edit, headers: editing(elsewhere.lead, 2) }), 404, 'not-found');
    expectProblem(await test.app.inject({ ...edit, headers: { 'if-match': '"v2"' } }), 401, 'not-signed-in');
  });
});

describe('POST /api/cautions', () => {
  const post = (payload: object, headers: Record<string, string> = shop.lead.headers) =>
    test.app.inject({ method: 'POST', url: '/api/cautions', headers: { ...headers, ...newKey() }, payload });

  it('adds a caution of the shop’s own whose words the shop may change', async () => {
    const material = await makeMaterial(test, shop.lead);
    const appliesTo = { materialIds: [material.id], effectKeys: ['deep-engrave'] };
    const caution = await created<CautionDto>(test, shop.lead, '/api/cautions', own({ appliesTo }));
    expect(caution).toMatchObject({ isShipped: false, appliesTo, allowedActions: ['tighten', 'reword'] });
  });

  it('refuses what has no reason or source, and a scope outside the shop', async () => {
    const bad = await post({ level: 'maybe', subject: '', text: ' ', appliesTo: { families: ['cheese'] } });
    const pointers = ['#/appliesTo/families', '#/level', '#/source', '#/subject', '#/text'];
    expect(pointersOf(expectProblem(bad, 422, 'invalid-fields'))).toEqual(pointers);
    const foreign = await makeMaterial(test, elsewhere.lead);
    const scoped = await post(own({ appliesTo: { materialIds: [foreign.id], effectKeys: ['no-such-effect'] } }));
    expect(pointersOf(expectProblem(scoped, 422, 'invalid-fields'))).toEqual(['#/appliesTo/effectKeys', '#/appliesTo/materialIds']);
  });

  it('is for leads and owners', async () => {
    expectProblem(await post(own(), shop.operator.headers), 403, 'not-permitted');
  });
});

describe('GET /api/cautions/for', () => {
  it('puts what names the material before what holds for all work', async () => {
    const titanium = await makeMaterial(test, shop.lead, { family: 'titanium' });
    const [engrave, anneal] = [await effectByKey(test, shop.lead, 'deep-engrave'), await effectByKey(test, shop.lead, 'dark-anneal')];
    const { id: machineId } = await makeMachine(test, shop.lead);
    const work = { materialId: titanium.id, machineId };
    const engraving = (await cautionsFor({ ...work, effectId: engrave.id })).json<CautionsForDto>();
    expect(engraving.isForbidden).toBe(false);
    expect(engraving.items[0]?.subject).toContain('titanium');
    expect(engraving.items.at(-1)?.appliesTo).toEqual({});
    const annealing = (await cautionsFor({ ...work, effectId: anneal.id })).json<CautionsForDto>();
    expect(annealing.items.map(({ subject }) => subject).join()).not.toContain('titanium');
  });

  it('adds what turning parts need only for round parts', async () => {
    const { id: materialId } = await makeMaterial(test, shop.lead);
    const subjects = async (roundPart: string) =>
      (await cautionsFor({ materialId, roundPart }))
        .json<CautionsForDto>()
        .items.map(({ subject }) => subject)
        .join();
    expect(await subjects('true')).toContain('turning part');
    expect(await subjects('false')).not.toContain('turning part');
  });

  it('says when the work is forbidden, and by what', async () => {
    const { id: materialId } = await makeMaterial(test, shop.lead, { family: 'PTFE' });
    const answer = (await cautionsFor({ materialId })).json<CautionsForDto>();
    expect(answer.isForbidden).toBe(true);
    expect(answer.items[0]).toMatchObject({ level: 'never', source: expect.stringContaining('NIOSH') });
  });

  it('wants a material, and knows no other shop’s things', async () => {
    expect(pointersOf(expectProblem(await cautionsFor({}), 422, 'invalid-fields'))).toEqual(['#/materialId']);
    const mine = await makeMaterial(test, shop.lead);
    const foreign = { materialId: (await makeMaterial(test, elsewhere.lead)).id, machineId: (await makeMachine(test, elsewhere.lead)).id };
    expectProblem(await cautionsFor({ materialId: foreign.materialId }), 404, 'not-found');
    expectProblem(await cautionsFor({ materialId: mine.id, machineId: foreign.machineId }), 404, 'not-found');
    expectProblem(await cautionsFor({ materialId: mine.id, effectId: randomUUID() }), 404, 'not-found');
    expectProblem(await cautionsFor({ materialId: mine.id }, {}), 401, 'not-signed-in');
  });
});

describe('assertMayBeMarked', () => {
  const assertMayBeMarked = (work: WorkInHand) =>
    test.unitOfWork.read({ shopId: shop.shop.id }, (tx) =>
      test.app.get(CautionsService, { strict: false }).assertMayBeMarked(tx, shop.shop.id, work),
    );

  it('passes what no never applies to', async () => {
    const { id: materialId } = await makeMaterial(test, shop.lead);
    await expect(assertMayBeMarked({ materialId })).resolves.toBeUndefined();
  });

  it('refuses with the caution, its reason and its source', async () => {
    const { id: materialId } = await makeMaterial(test, shop.lead, { family: 'vinyl' });
    const refusal = await assertMayBeMarked({ materialId }).catch((error: unknown) => error);
    expect(refusal).toBeInstanceOf(ForbiddenByCautionError);
    expect(refusal).toMatchObject({
      code: 'never-mark',
      status: 409,
      extensions: { cautions: [{ subject: expect.stringContaining('PVC'), text: expect.any(String), source: expect.any(String) }] },
    });
  });

  it('refuses a single sheet that the shop itself forbade for one kind of source', async () => {
    const { id: materialId } = await makeMaterial(test, shop.lead);
    const appliesTo = { materialIds: [materialId], sourceKinds: ['co2'] };
    await created(test, shop.lead, '/api/cautions', own({ level: 'never', appliesTo }));
    await expect(assertMayBeMarked({ materialId, sourceKind: 'fibre-mopa' })).resolves.toBeUndefined();
    await expect(assertMayBeMarked({ materialId, sourceKind: 'co2' })).rejects.toBeInstanceOf(ForbiddenByCautionError);
  });
});
