import { randomUUID } from 'node:crypto';
import type { CouponDto } from '../src/coupons/dto/coupon.dto';
import type { RecipeDto, RecipePageDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { createTestApp, type TestApp } from './support/app';
import { makeCoupon, smallPlan, typed } from './support/coupons';
import { asSuperuser } from './support/database';
import { created, makeMaterial } from './support/equipment';
import { makeMarkedCoupon } from './support/inspections';
import { expectProblem, pointersOf } from './support/problem';
import {
  acts,
  call,
  draftFromCell,
  makeApproved,
  makeProvedCoupon,
  makeProvedDraft,
  makeRecipeShop,
  makeSubmitted,
  proveAgain,
  type RecipeShop,
  read,
} from './support/recipes';

let test: TestApp;
let shop: RecipeShop;
let elsewhere: RecipeShop;
let coupon: CouponDto;

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeRecipeShop(test), await makeRecipeShop(test)];
  coupon = await makeMarkedCoupon(test, shop);
});
afterAll(() => test.close());

const cellId = (address: string, of = coupon) => of.cells.find((cell) => cell.address === address)?.id ?? '';
const fromCell = (payload: object, member = shop.operator, key?: string) =>
  call(test, member, { method: 'POST', url: '/recipes/from-cell', payload, ...(key === undefined ? {} : { key }) });
const elsewhereSetting = () => ({
  ...shop.keys,
  route: 'earlier-experience',
  reason: 'Used since 2019 on the tag line.',
  steps: [
    {
      purpose: 'anneal',
      values: {
        powerPercent: typed(30, 'percentFromZero'),
        speedMmPerS: typed(0.4, 'm/s'),
        frequencyKhz: typed(400, 'kHz'),
        pulseWidthNs: typed(30, 'ns'),
        lineSpacingUm: typed(0.02, 'mm'),
        passes: typed(1, 'count'),
      },
      fill: 'crossed',
      assist: 'none',
    },
  ],
});
const create = (payload: object, member = shop.operator) => call(test, member, { method: 'POST', url: '/recipes', payload });

describe('POST /api/recipes/from-cell', () => {
  it('drafts a new recipe with exactly what the cell was marked with, resting on that cell', async () => {
    const draft = await draftFromCell(test, shop, coupon, { address: 'B1' });
    const cell = coupon.cells.find(({ address }) => address === 'B1');
    expect(draft).toMatchObject({
      number: null,
      state: 'draft',
      route: 'coupons',
      reason: `From B1 of ${coupon.code}.`,
      recipe: {
        code: expect.stringMatching(/^R-\d{4}$/),
        title: `${shop.material.name}, ${shop.finish.name}: ${shop.effect.name}`,
        lens: { name: 'F160' },
      },
      scope: { featureKind: 'filled-area' },
      setUpSteps: [{ text: 'Lens F160 fitted, protective glass clean, extraction on, focus found.', mustTick: true }],
      profile: { id: shop.machine.profile.id, isPresent: true },
      author: { id: shop.operator.id },
    });
    expect(draft.steps).toEqual([{ purpose: 'anneal', parameters: cell?.parameters, pauseAfterS: 0 }]);
    expect(draft.evidence.basis).toMatchObject([{ address: 'B1', couponCode: coupon.code, essentialDifferences: [] }]);
    expect(draft.derived[0]?.numbers.find(({ key }) => key === 'arealDose')?.value).toBeCloseTo(cell?.dose.value ?? 0, 12);
    expect(draft.allowedActions).toEqual(['edit', 'discard', 'submit', 'start-confirmation']);
  });

  it('drafts nothing from a coupon that proves a setting, and does not offer it there', async () => {
    const proof = await proveAgain(test, shop, await draftFromCell(test, shop, coupon), { count: 1 });
    expectProblem(await fromCell({ couponId: proof.id, cellId: proof.cells[0]?.id }), 409, 'conflict');
    expect(proof.allowedActions).toContain('plan-next');
    expect(proof.allowedActions).not.toContain('draft-recipe');
  });

  it('answers a repeat with the same draft and makes no second recipe', async () => {
    const key = randomUUID();
    const payload = { couponId: coupon.id, cellId: cellId('B2'), title: 'Twice' };
    const first = (await fromCell(payload, shop.operator, key)).json<RecipeRevisionDto>();
    const again = await fromCell(payload, shop.operator, key);
    expect(again.headers['idempotency-replayed']).toBe('true');
    expect(again.json<RecipeRevisionDto>().id).toBe(first.id);
    expect((await read<RecipePageDto>(test, shop.operator, '/recipes?q=Twice')).items).toHaveLength(1);
  });

  it('drafts on an existing recipe with the same five keys, once per author', async () => {
    const first = await draftFromCell(test, shop, coupon, { title: 'Shared' });
    const payload = { couponId: coupon.id, cellId: cellId('B2'), recipeId: first.recipe.id };
    expect(expectProblem(await fromCell(payload), 409, 'draft-open')).toMatchObject({ revisionId: first.id });
    const second = (await fromCell(payload, shop.lead)).json<RecipeRevisionDto>();
    expect(second.recipe.code).toBe(first.recipe.code);
    expect((await read<RecipeDto>(test, shop.operator, `/recipes/${first.recipe.id}`)).revisions).toHaveLength(2);
  });

  it('refuses a recipe for other work, a coupon that is not marked and a cell that was skipped', async () => {
    const otherMaterial = await makeMaterial(test, shop.lead, { family: 'titanium' });
    const other = (await create({ ...elsewhereSetting(), materialId: otherMaterial.id })).json<RecipeRevisionDto>();
    const payload = { couponId: coupon.id, cellId: cellId('B1'), recipeId: other.recipe.id };
    expect(pointersOf(expectProblem(await fromCell(payload, shop.lead), 422, 'invalid-fields'))).toEqual(['#/recipeId']);
    const planned = await makeCoupon(test, shop);
    expectProblem(await fromCell({ couponId: planned.id, cellId: cellId('A1', planned) }), 409, 'coupon-state');
    expectProblem(await fromCell({ couponId: coupon.id, cellId: cellId('A2') }), 409, 'coupon-state');
  });

  it('refuses what must never be marked, with the source', async () => {
    const appliesTo = { materialIds: [shop.material.id] };
    const text = {
      subject: 'Do not mark this sheet',
      text: 'It carries a coating nobody can name.',
      source: 'Laser safety officer, 3 May',
    };
    const caution = await created<{ id: string }>(test, shop.lead, '/api/cautions', { level: 'never', ...text, appliesTo });
    const cautions = [{ id: caution.id, subject: text.subject, source: text.source }];
    expect(expectProblem(await fromCell({ couponId: coupon.id, cellId: cellId('B1') }), 409, 'never-mark')).toMatchObject({ cautions });
    expect(expectProblem(await create(elsewhereSetting()), 409, 'never-mark')).toMatchObject({ cautions });
    await asSuperuser(test, (sql) => sql`update caution set is_active = false where id = ${caution.id}`);
  });

  it('refuses anonymous callers, trainees, foreign cells and a bad body', async () => {
    const payload = { couponId: coupon.id, cellId: cellId('B1') };
    expectProblem(await call(test, undefined, { method: 'POST', url: '/recipes/from-cell', payload }), 401, 'not-signed-in');
    expectProblem(await fromCell(payload, shop.trainee), 403, 'not-permitted');
    expectProblem(await fromCell(payload, elsewhere.operator), 404, 'not-found');
    expect(pointersOf(expectProblem(await fromCell({ couponId: 'x' }), 422, 'invalid-fields'))).toEqual(['#/cellId', '#/couponId']);
  });
});

describe('POST /api/recipes', () => {
  it('begins a recipe by another route, keeping the entered values beside the physical ones', async () => {
    const draft = (await create({ ...elsewhereSetting(), scope: { thicknessMm: { from: 1, to: 3 } } })).json<RecipeRevisionDto>();
    expect(draft).toMatchObject({
      route: 'earlier-experience',
      scope: { featureKind: 'filled-area', thicknessMm: { from: 1, to: 3 } },
      calibration: { id: shop.calibration.id },
      steps: [
        {
          pauseAfterS: 0,
          parameters: {
            values: { speedMmPerS: { entered: { value: 0.4, unit: 'm/s' }, physical: 400 }, lineSpacingUm: { physical: 20 } },
            power: { basis: 'calibration' },
          },
        },
      ],
    });
  });

  it('names every wrong field at once, each value with the nearest that the panel can show', async () => {
    const setting = elsewhereSetting();
    const [step] = setting.steps;
    const values = { ...step?.values, speedMmPerS: typed(403, 'mm/s'), pulseWidthNs: typed(45, 'ns') };
    const scope = { thicknessMm: { from: 3, to: 1 }, materialGroupId: randomUUID() };
    const problem = expectProblem(await create({ ...setting, scope, steps: [{ ...step, values }] }), 422, 'invalid-fields');
    expect(pointersOf(problem)).toEqual([
      '#/scope/materialGroupId',
      '#/scope/thicknessMm',
      '#/steps/0/values/pulseWidthNs',
      '#/steps/0/values/speedMmPerS',
    ]);
    const detail = problem.errors?.find(({ pointer }) => pointer.endsWith('speedMmPerS'))?.detail;
    expect(detail).toContain('400 mm/s or 410 mm/s');
  });

  it('refuses things that are not in the shop or in use, and a lens that is not used on the machine', async () => {
    const foreign = expectProblem(await create({ ...elsewhereSetting(), ...elsewhere.keys }), 422, 'invalid-fields');
    expect(pointersOf(foreign)).toEqual(['#/effectId', '#/finishId', '#/lensId', '#/machineId', '#/materialId']);
    const lens = await created<{ id: string }>(test, shop.lead, '/api/lenses', { name: 'F330', focalLengthMm: 330, fieldSizeMm: 220 });
    expect(pointersOf(expectProblem(await create({ ...elsewhereSetting(), lensId: lens.id }), 422, 'invalid-fields'))).toEqual([
      '#/lensId',
    ]);
  });

  it('refuses anonymous callers, trainees and a route that needs a coupon', async () => {
    expectProblem(await call(test, undefined, { method: 'POST', url: '/recipes', payload: elsewhereSetting() }), 401, 'not-signed-in');
    expectProblem(await create(elsewhereSetting(), shop.trainee), 403, 'not-permitted');
    const bad = expectProblem(await create({ ...elsewhereSetting(), route: 'coupons', steps: [] }), 422, 'invalid-fields');
    expect(pointersOf(bad)).toEqual(['#/route', '#/steps']);
  });
});

describe('POST /api/recipes/:id/drafts', () => {
  it('copies the approved revision with its evidence, once per author', async () => {
    const approved = await makeApproved(test, shop);
    const url = `/recipes/${approved.recipe.id}/drafts`;
    const draft = await created<RecipeRevisionDto>(test, shop.operator, `/api${url}`, { reason: ' Too light ' });
    expect(draft).toMatchObject({
      state: 'draft',
      basedOnId: approved.id,
      reason: 'Too light',
      comparedWith: { id: approved.id },
      changes: [],
    });
    expect(draft.steps).toEqual(approved.steps);
    expect(draft.evidence.confirmation.map(({ cellId: id }) => id)).toEqual(approved.evidence.confirmation.map(({ cellId: id }) => id));
    const again = await call(test, shop.operator, { method: 'POST', url, payload: {} });
    expect(expectProblem(again, 409, 'draft-open')).toMatchObject({ revisionId: draft.id });
  });

  it('refuses anonymous callers, trainees, foreign recipes and a revision of another recipe', async () => {
    const draft = await draftFromCell(test, shop, coupon, { title: 'Alone' });
    const url = `/recipes/${draft.recipe.id}/drafts`;
    const ask = (member: typeof shop.lead | undefined, payload: object = {}) => call(test, member, { method: 'POST', url, payload });
    expectProblem(await ask(undefined), 401, 'not-signed-in');
    expectProblem(await ask(shop.trainee), 403, 'not-permitted');
    expectProblem(await ask(elsewhere.operator), 404, 'not-found');
    expectProblem(await ask(shop.lead, { basedOnRevisionId: randomUUID() }), 404, 'not-found');
    expectProblem(await ask(shop.lead, { basedOnRevisionId: 'x' }), 422, 'invalid-fields');
  });
});

describe('GET /api/recipes', () => {
  it('lists what needs this person first and counts every choice with the others held', async () => {
    const own = await makeRecipeShop(test);
    const approved = await makeApproved(test, own, { title: 'Rim mark' });
    const waiting = await makeSubmitted(test, own, { title: 'Dial mark' });
    await makeProvedDraft(test, own, { title: 'Tag mark' });
    const forLead = await read<RecipePageDto>(test, own.lead, '/recipes');
    expect(forLead.items.map(({ title, state, needsYou }) => [title, state, needsYou])).toEqual([
      ['Dial mark', 'in_review', 'sign'],
      ['Tag mark', 'draft', null],
      ['Rim mark', 'approved', null],
      [forLead.items.at(-1)?.title, 'draft', null],
    ]);
    expect(forLead.facets).toMatchObject({
      states: [
        { value: 'approved', count: 1 },
        { value: 'in_review', count: 1 },
        { value: 'draft', count: 2 },
      ],
      materials: [{ value: own.material.id, label: own.material.name, count: 4 }],
      matchCount: 4,
      totalCount: 4,
    });
    const forOperator = await read<RecipePageDto>(test, own.operator, '/recipes?state=approved');
    expect(forOperator.items).toMatchObject([{ id: approved.recipe.id, needsYou: null, face: { address: 'B1', rows: 2, columns: 2 } }]);
    expect(forOperator.facets).toMatchObject({
      matchCount: 1,
      states: [{ count: 1 }, { count: 1 }, { count: 2 }],
      machines: [{ count: 1 }],
    });
    expect((await read<RecipePageDto>(test, own.operator, '/recipes?q=dial%20titan')).items).toEqual([]);
    expect((await read<RecipePageDto>(test, own.operator, `/recipes?q=dial%20${waiting.recipe.code}`)).items).toMatchObject([
      { title: 'Dial mark' },
    ]);
    expect((await read<RecipePageDto>(test, own.operator, '/recipes?q=%25')).items).toEqual([]);
  });

  it('goes on from the cursor until every recipe was seen once', async () => {
    const seen: string[] = [];
    let cursor: string | null = '';
    while (cursor !== null) {
      const after: string = cursor === '' ? '' : `&cursor=${encodeURIComponent(cursor)}`;
      const page: RecipePageDto = await read<RecipePageDto>(test, shop.operator, `/recipes?limit=2${after}`);
      seen.push(...page.items.map(({ id }) => id));
      cursor = page.nextCursor;
    }
    const { facets } = await read<RecipePageDto>(test, shop.operator, '/recipes?limit=1');
    expect(new Set(seen).size).toBe(seen.length);
    expect(seen).toHaveLength(facets.totalCount);
  });

  it('says what is overdue, and returned to whom', async () => {
    const own = await makeRecipeShop(test);
    const approved = await makeApproved(test, own);
    await asSuperuser(test, async (sql) => {
      await sql`alter table revision disable trigger guarded_rows`;
      await sql`update revision set review_due = now() - interval '1 day' where id = ${approved.id}`;
      await sql`alter table revision enable trigger guarded_rows`;
    });
    const submitted = await makeSubmitted(test, own);
    await acts(test, submitted.id).giveBack(own.lead);
    const [due] = (await read<RecipePageDto>(test, own.lead, '/recipes?state=due')).items;
    expect(due).toMatchObject({ state: 'due', needsYou: 'review-due', current: { isReviewOverdue: true } });
    const [returned] = (await read<RecipePageDto>(test, own.operator, '/recipes?state=returned')).items;
    expect(returned).toMatchObject({ needsYou: 'returned', current: null, underWay: { id: submitted.id, state: 'returned' } });
  });

  it('refuses anonymous callers, trainees and bad queries, and shows nothing of another shop', async () => {
    expectProblem(await call(test, undefined, { url: '/recipes' }), 401, 'not-signed-in');
    expectProblem(await call(test, shop.trainee, { url: '/recipes' }), 403, 'not-permitted');
    expectProblem(await call(test, shop.operator, { url: '/recipes?state=lost' }), 422, 'invalid-fields');
    expectProblem(await call(test, shop.operator, { url: '/recipes?cursor=zz' }), 422, 'invalid-fields');
    expect((await read<RecipePageDto>(test, elsewhere.owner, '/recipes')).facets.totalCount).toBe(0);
  });
});

describe('GET and PATCH /api/recipes/:id', () => {
  it('shows the ladder, drafts first, and open holds of the recipe and its machine', async () => {
    const own = await makeRecipeShop(test);
    const approved = await makeApproved(test, own);
    await created(test, own.operator, `/api/recipes/${approved.recipe.id}/drafts`, {});
    await asSuperuser(
      test,
      (sql) => sql`insert into hold (shop_id, id, machine_id, reason, placed_by_name, created_by)
        values (${own.shop.id}, ${randomUUID()}, ${own.machine.id}, 'Lens scratched', 'H. Voss', ${own.lead.id})`,
    );
    const recipe = await read<RecipeDto>(test, own.operator, `/recipes/${approved.recipe.id}`);
    expect(recipe).toMatchObject({
      isHeld: true,
      holds: [{ subject: 'machine', reason: 'Lens scratched', placedBy: 'H. Voss' }],
      currentRevision: { id: approved.id, number: 1 },
      allowedActions: ['propose-change', 'edit'],
    });
    expect(recipe.revisions.map(({ number, state }) => [number, state])).toEqual([
      [null, 'draft'],
      [1, 'approved'],
    ]);
    expect(recipe.currentRevision?.signOffs).toHaveLength(2);
  });

  it('changes title and scope of what nobody submitted, and the drafts with it', async () => {
    const draft = await draftFromCell(test, shop, coupon);
    const url = `/recipes/${draft.recipe.id}`;
    const before = await read<RecipeDto>(test, shop.operator, url);
    const scope = { partDiameterMm: { from: 20, to: 40 }, featureKind: 'stroke-text' };
    const payload = { title: 'Bezel ring', scope };
    const answer = await call(test, shop.operator, { method: 'PATCH', url, version: before.version, payload });
    expect(answer.json<RecipeDto>()).toMatchObject({ title: 'Bezel ring', scope, version: before.version + 1 });
    expect(await read<RecipeRevisionDto>(test, shop.operator, `/revisions/${draft.id}`)).toMatchObject({ scope });
    expectProblem(await call(test, shop.operator, { method: 'PATCH', url, version: before.version, payload }), 412, 'stale-version');
    expectProblem(await call(test, shop.operator, { method: 'PATCH', url, payload }), 428, 'version-required');
    expectProblem(await call(test, elsewhere.lead, { method: 'PATCH', url, version: 1, payload }), 404, 'not-found');
  });

  it('keeps the earlier scope in the ledger, and lets nobody change it in somebody else’s draft', async () => {
    const draft = await draftFromCell(test, shop, coupon);
    const url = `/recipes/${draft.recipe.id}`;
    const { version } = await read<RecipeDto>(test, shop.operator, url);
    const payload = { scope: { featureKind: 'code' } };
    expect((await call(test, shop.operator, { method: 'PATCH', url, version, payload })).statusCode).toBe(200);
    const [event] = (await read<{ items: object[] }>(test, shop.lead, `/ledger?subjectId=${draft.recipe.id}`)).items;
    expect(event).toMatchObject({ action: 'recipe.changed', before: { scope: { featureKind: 'filled-area' } }, after: payload });
    await created(test, shop.lead, `/api${url}/drafts`, {});
    const change = { method: 'PATCH', url, version: version + 1, payload: { scope: { featureKind: 'single-line' } } } as const;
    expectProblem(await call(test, shop.operator, change), 403, 'not-permitted');
    expect((await call(test, shop.lead, change)).statusCode).toBe(200);
  });

  it('refuses another scope once anything was submitted', async () => {
    const submitted = await makeSubmitted(test, shop);
    const url = `/recipes/${submitted.recipe.id}`;
    const { version } = await read<RecipeDto>(test, shop.operator, url);
    const scope = { featureKind: 'code' };
    expectProblem(await call(test, shop.lead, { method: 'PATCH', url, version, payload: { scope } }), 409, 'scope-signed');
  });

  it('answers 404 for another shop’s recipe and 403 to whoever did not begin it', async () => {
    const proved = await makeProvedCoupon(test, shop, { plan: smallPlan(shop) });
    const draft = await draftFromCell(test, shop, proved, { as: shop.lead });
    const url = `/recipes/${draft.recipe.id}`;
    expectProblem(await call(test, elsewhere.owner, { url }), 404, 'not-found');
    expectProblem(await call(test, shop.operator, { method: 'PATCH', url, version: 1, payload: { title: 'Mine' } }), 403, 'not-permitted');
  });
});
