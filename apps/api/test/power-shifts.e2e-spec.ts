import type { FinderDto } from '../src/finder/dto/finder.dto';
import type { RecipePowerShiftDto } from '../src/recipes/dto/power-shift.dto';
import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { createTestApp, type TestApp } from './support/app';
import { created } from './support/equipment';
import { expectProblem, pointersOf } from './support/problem';
import { call, makeApproved, makeRecipeShop, type RecipeShop, read } from './support/recipes';

let test: TestApp;
let shop: RecipeShop;
let approved: RecipeRevisionDto;

beforeAll(async () => {
  test = await createTestApp();
  shop = await makeRecipeShop(test);
  approved = await makeApproved(test, shop);
});
afterAll(() => test.close());

/** A reading of today with watts proportional to percent; the shop proved its settings at 0.19 W per percent. */
const readMeter = (wattsPerPercent: number, conditions: { frequencyKhz?: number; pulseWidthNs?: number } = {}) =>
  created(test, shop.lead, `/api/machines/${shop.machine.id}/calibrations`, {
    ...{
      measuredOn: new Date().toISOString().slice(0, 10),
      meter: 'Bench meter 3',
      wavelengthNm: 1064,
      frequencyKhz: 400,
      pulseWidthNs: 30,
    },
    points: [10, 50, 100].map((percent) => ({ percent, watts: percent * wattsPerPercent })),
    ...conditions,
  });
const listed = async (query = `?machineId=${shop.machine.id}`) =>
  (await read<{ items: RecipePowerShiftDto[] }>(test, shop.operator, `/recipes/power-shifts${query}`)).items;
const recipeNow = () => read<RecipeDto>(test, shop.lead, `/recipes/${approved.recipe.id}`);
const checkDueAtTheMachine = async () =>
  (await read<FinderDto>(test, shop.trainee, `/finder?recipeId=${approved.recipe.id}&materialId=${approved.recipe.material.id}`)).answer
    ?.checkDue;

describe('GET /api/recipes/power-shifts', () => {
  it('follows each later reading that holds for a setting, and says when a check is due', async () => {
    expect(await listed()).toMatchObject([{ code: approved.recipe.code, revisionNumber: 1, shift: null, reason: expect.any(String) }]);

    await readMeter(0.1, { frequencyKhz: 100 });
    expect(await listed()).toMatchObject([{ shift: null }]);

    await readMeter(0.185);
    const [small] = await listed();
    expect(small?.shift).toMatchObject({ stepIndex: 0, isCheckDue: false, limitPercent: 5 });
    // 0.185 / 0.19 - 1
    expect(small?.shift?.shiftPercent).toBeCloseTo(-2.631_578_9, 6);
    expect((await recipeNow()).checkDue).toBeNull();
    expect(await checkDueAtTheMachine()).toBeNull();

    await readMeter(0.17);
    const [large] = await listed();
    expect(large?.shift).toMatchObject({ isCheckDue: true });
    expect(large?.shift?.shiftPercent).toBeCloseTo(-10.526_315_8, 6);
    expect((await recipeNow()).checkDue).toEqual(large?.shift);
    expect(await checkDueAtTheMachine()).toEqual(large?.shift);
  });

  it('leaves the signed setting as it is, whatever the meter says', async () => {
    const now = await recipeNow();
    expect(now.currentRevision?.steps).toEqual(approved.steps);
    expect(now.state).toBe('approved');
  });

  it('lists no other machine’s recipes and refuses what is not an id, trainees and strangers', async () => {
    expect(await listed(`?machineId=${shop.lens.id}`)).toEqual([]);
    const url = '/recipes/power-shifts';
    expect(pointersOf(expectProblem(await call(test, shop.operator, { url: `${url}?machineId=x` }), 422, 'invalid-fields'))).toEqual([
      '#/machineId',
    ]);
    expectProblem(await call(test, shop.trainee, { url }), 403, 'not-permitted');
    expectProblem(await call(test, undefined, { url }), 401, 'not-signed-in');
  });
});
