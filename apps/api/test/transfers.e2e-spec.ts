import type { LensDto } from '../src/lenses/dto/lens.dto';
import type { MachineDto } from '../src/machines/dto/machine.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import type { TransferGroundDto, TransferPreviewDto } from '../src/recipes/dto/transfer.dto';
import { createTestApp, type TestApp } from './support/app';
import { PLANNING_MACHINE } from './support/coupons';
import { created, makeLens, makeMachine } from './support/equipment';
import { expectProblem, pointersOf } from './support/problem';
import { acts, call, changeDraft, cite, makeApproved, makeRecipeShop, proveAgain, type RecipeShop, read } from './support/recipes';

let test: TestApp;
let shop: RecipeShop;
let elsewhere: RecipeShop;
let source: RecipeRevisionDto;
let placeCount = 0;
let target: { machine: MachineDto; lens: LensDto };

const today = () => new Date().toISOString().slice(0, 10);
/** 0.3 W a percent: the target asks for 1.25² of the source's power. */
const tableOf = (machineId: string, given: object = {}) =>
  created(test, shop.lead, `/api/machines/${machineId}/calibrations`, {
    ...{ measuredOn: today(), meter: 'Bench meter 3', wavelengthNm: 1064, frequencyKhz: 400, pulseWidthNs: 30 },
    points: [1, 50, 100].map((percent) => ({ percent, watts: percent * 0.3 })),
    ...given,
  });

async function makePlace(physical: object = {}): Promise<{ machine: MachineDto; lens: LensDto }> {
  const { lead } = shop;
  const machine = await makeMachine(test, lead, {
    ...PLANNING_MACHINE,
    name: `Bench ${++placeCount}`,
    physical: { ...PLANNING_MACHINE.physical, ratedPowerW: 30, ...physical },
  });
  const lens = await makeLens(test, lead, { focalLengthMm: 200 });
  await created(test, lead, `/api/machines/${machine.id}/lenses`, { lensId: lens.id });
  return { machine, lens };
}

beforeAll(async () => {
  test = await createTestApp();
  [shop, elsewhere] = [await makeRecipeShop(test), await makeRecipeShop(test)];
  source = await makeApproved(test, shop);
  target = await makePlace();
  await tableOf(target.machine.id);
});
afterAll(() => test.close());

const bodyFor = (place = target, given: object = {}) => ({ machineId: place.machine.id, lensId: place.lens.id, ...given });
const preview = (payload: object, { as = shop.operator, id = source.id } = {}) =>
  call(test, as, { method: 'POST', url: `/revisions/${id}/transfers/preview`, payload });
const transfer = (
  payload: object,
  { as = shop.operator, id = source.id, ...keyed }: { as?: typeof shop.operator; id?: string; key?: string } = {},
) => call(test, as, { method: 'POST', url: `/revisions/${id}/transfers`, payload, ...keyed });

describe('GET /api/revisions/:id/transfers/targets', () => {
  it('gives the source as it was signed, and every other machine and lens with its tables', async () => {
    const ground = await read<TransferGroundDto>(test, shop.operator, `/revisions/${source.id}/transfers/targets`);
    expect(ground.source).toMatchObject({ machine: { id: shop.machine.id }, calibrations: [{ id: shop.calibration.id }] });
    expect(ground.steps).toEqual(source.steps);
    const place = ground.targets.find(({ machine }) => machine.id === target.machine.id);
    expect(place).toMatchObject({ lens: { id: target.lens.id }, focalLengthMm: 200, measuredSpotUm: null, recipes: [] });
    expect(place?.calibrations).toHaveLength(1);
    expect(ground.targets.some(({ machine, lens }) => machine.id === shop.machine.id && lens.id === shop.lens.id)).toBe(false);
  });
});

describe('POST /api/revisions/:id/transfers/preview', () => {
  it('shows what is kept and what the panel would show, and stores nothing', async () => {
    const before = await read<{ items: unknown[] }>(test, shop.operator, '/recipes');
    const answer = await preview(bodyFor());
    expect(answer.statusCode).toBe(200);
    const { outcome, isDraftable, steps } = answer.json<TransferPreviewDto>();
    expect({ outcome, isDraftable }).toEqual({ outcome: 'equivalent', isDraftable: true });
    const [step] = steps;
    expect(step?.kept.map(({ key }) => key)).toEqual(['peakFluence', 'pitchPerSpot', 'spacingPerSpot', 'arealDose']);
    expect(step?.proposal?.parameters.values.lineSpacingUm?.physical).toBe(15);
    const wattsBefore = source.steps[0]?.parameters.power.watts ?? 0;
    const wattsAfter = step?.proposal?.parameters.power.watts ?? 0;
    expect(wattsAfter / wattsBefore).toBeGreaterThan(1.25 ** 2 * 0.95);
    expect(wattsAfter / wattsBefore).toBeLessThan(1.25 ** 2 * 1.05);
    expect((await read<{ items: unknown[] }>(test, shop.operator, '/recipes')).items).toHaveLength(before.items.length);
  });

  it('says what comes nearest where pulses are too strong, and refuses another wavelength outright', async () => {
    const weak = await makePlace({ maxPulseEnergyMj: [{ pulseWidthNs: 30, energyMj: 0.002 }] });
    await tableOf(weak.machine.id);
    const nearest = (await preview(bodyFor(weak))).json<TransferPreviewDto>();
    expect(nearest).toMatchObject({ outcome: 'not equivalent', steps: [{ reasons: [{ code: 'pulse energy above limit' }] }] });
    const green = await makePlace({ wavelengthNm: 532 });
    const refused = (await preview(bodyFor(green))).json<TransferPreviewDto>();
    expect(refused).toMatchObject({ outcome: 'not equivalent', isDraftable: false, steps: [], reasons: [{ code: 'wavelength' }] });
  });

  it('names the field of a target that is not there', async () => {
    const pointers = async (given: object) => pointersOf(expectProblem(await preview(bodyFor(target, given)), 422, 'invalid-fields'));
    expect(await pointers({ machineId: elsewhere.machine.id })).toEqual(['#/machineId']);
    expect(await pointers({ lensId: elsewhere.lens.id })).toEqual(['#/lensId']);
    expect(await pointers({ machineId: shop.machine.id, lensId: shop.lens.id })).toEqual(['#/lensId']);
    expect(await pointers({ choices: [{ frequencyKhz: -1 }] })).toEqual(['#/choices/0/frequencyKhz']);
  });

  it('starts from what was submitted only, and never from another shop’s revision', async () => {
    const draft = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${source.recipe.id}/drafts`, {});
    expectProblem(await preview(bodyFor(), { id: draft.id }), 409, 'revision-state');
    expectProblem(await preview(bodyFor(), { as: elsewhere.operator }), 404, 'not-found');
    expectProblem(await preview(bodyFor(), { as: shop.trainee }), 403, 'not-permitted');
  });
});

describe('POST /api/revisions/:id/transfers', () => {
  it('drafts what the records give, citing its source, once for one key', async () => {
    const key = 'one-transfer-1';
    const answer = await transfer(bodyFor(target, { steps: [] }), { key: 'refused-key-1' });
    expectProblem(answer, 422, 'invalid-fields');
    const made = await transfer(bodyFor(), { key });
    expect(made.statusCode).toBe(201);
    const draft = made.json<RecipeRevisionDto>();
    expect(draft).toMatchObject({ state: 'draft', route: 'transferred', basedOnId: source.id, number: null });
    expect(draft.recipe).toMatchObject({
      machine: { id: target.machine.id },
      lens: { id: target.lens.id },
      material: { id: shop.material.id },
    });
    expect(draft.reason).toContain(`Transferred from revision 1 of ${source.recipe.code}`);
    expect(draft.steps[0]?.parameters.power).toMatchObject({ basis: 'calibration' });
    expect(draft.setUpSteps[0]?.text).toContain(target.lens.name);
    const shown = (await preview(bodyFor())).json<TransferPreviewDto>();
    expect(draft.steps[0]).toEqual(shown.steps[0]?.proposal);
    const again = await transfer(bodyFor(), { key });
    expect(again.headers['idempotency-replayed']).toBe('true');
    expect(again.json<RecipeRevisionDto>().id).toBe(draft.id);
    const events = await read<{ items: { action: string; subjectId: string }[] }>(
      test,
      shop.operator,
      `/ledger?subjectCode=${draft.recipe.code}`,
    );
    expect(events.items.map(({ action }) => action).sort()).toEqual(['recipe.created', 'revision.drafted']);
  });

  it('puts the draft into a recipe of the same five keys, and one open draft of an author at most', async () => {
    const place = await makePlace();
    await tableOf(place.machine.id);
    const first = (await transfer(bodyFor(place))).json<RecipeRevisionDto>();
    const into = bodyFor(place, { recipeId: first.recipe.id });
    expectProblem(await transfer(into), 409, 'draft-open');
    const second = await transfer(into, { as: shop.lead });
    expect(second.json<RecipeRevisionDto>().recipe.id).toBe(first.recipe.id);
    expect(pointersOf(expectProblem(await transfer(bodyFor(place, { recipeId: source.recipe.id })), 422, 'invalid-fields'))).toEqual([
      '#/recipeId',
    ]);
  });

  it('drafts what is not equivalent only when that is said, and then says so in the draft', async () => {
    const other = await makePlace({ pulseWidthsNs: [100] });
    await tableOf(other.machine.id, { pulseWidthNs: 100 });
    await tableOf(other.machine.id, { pulseWidthNs: 100, frequencyKhz: 100 });
    const strong = bodyFor(other);
    const refused = expectProblem(await transfer(strong), 422, 'transfer-not-possible');
    expect(refused.errors?.map(({ detail }) => detail).join(' ')).toContain('The largest pulse energy of');
    const wide = await makePlace({ pulseWidthsNs: [100], maxPulseEnergyMj: [{ pulseWidthNs: 100, energyMj: 0.5 }] });
    await tableOf(wide.machine.id, { pulseWidthNs: 100 });
    expectProblem(await transfer(bodyFor(wide)), 409, 'transfer-not-equivalent');
    const draft = (await transfer(bodyFor(wide, { acceptNotEquivalent: true }))).json<RecipeRevisionDto>();
    expect(draft.reason).toContain('Not equivalent');
    expect(draft.steps[0]?.parameters.values.pulseWidthNs?.physical).toBe(100);
  });

  it('drafts nothing where a number is missing, and says where to enter it', async () => {
    const bare = await makePlace({ m2: undefined });
    const problem = expectProblem(await transfer(bodyFor(bare, { acceptNotEquivalent: true })), 422, 'transfer-not-possible');
    expect(problem.errors?.[0]).toMatchObject({ pointer: '#/machineId', detail: expect.stringContaining('M²') });
  });

  it('is approved with marks on the target and a lead’s grounds, and with neither alone', async () => {
    const place = await makePlace();
    await tableOf(place.machine.id);
    let draft = (await transfer(bodyFor(place))).json<RecipeRevisionDto>();
    const failing = async () => {
      const answer = await acts(test, draft.id).submit(shop.operator, draft);
      return expectProblem(answer, 409, 'checks-fail') as unknown as { checks: { key: string }[] };
    };
    expect((await failing()).checks.map(({ key }) => key).sort()).toEqual(['confirmation', 'grounds']);
    expectProblem(
      await call(test, shop.operator, {
        method: 'PATCH',
        url: `/revisions/${draft.id}`,
        version: draft.version,
        payload: { route: 'customer-given' },
      }),
      422,
      'invalid-fields',
    );
    draft = await changeDraft(test, shop.lead, draft, { grounds: 'Same pulses on a wider spot.' });
    const proof = await proveAgain(test, shop, draft);
    draft = await read<RecipeRevisionDto>(test, shop.operator, `/revisions/${draft.id}`);
    draft = await cite(test, shop.operator, draft, { basis: [], confirmation: proof.cells.map(({ id }) => id) });
    const submitted = await acts(test, draft.id).submit(shop.operator, draft);
    expect(submitted.statusCode).toBe(200);
    const approved = await acts(test, draft.id).approve(shop.owner, submitted.json<RecipeRevisionDto>());
    expect(approved.json<RecipeRevisionDto>()).toMatchObject({ state: 'approved', route: 'transferred' });
  });
});
