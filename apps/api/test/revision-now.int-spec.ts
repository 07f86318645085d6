import type { FinderDto } from '../src/finder/dto/finder.dto';
import type { ComparisonDto } from '../src/recipes/dto/comparison.dto';
import type { RecipeDto, RecipePageDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { createTestApp, type TestApp } from './support/app';
import { asSuperuser } from './support/database';
import { created } from './support/equipment';
import { expectProblem } from './support/problem';
import { acts, call, changeDraft, makeApproved, makeRecipeShop, type RecipeShop, read } from './support/recipes';

jest.setTimeout(60_000);

let test: TestApp;
let shop: RecipeShop;
let first: RecipeRevisionDto;
let change: RecipeRevisionDto;

/** A second revision with a day of its own, and the day has come; no worker runs in this test. */
beforeAll(async () => {
  test = await createTestApp();
  shop = await makeRecipeShop(test);
  first = await makeApproved(test, shop);
  const copy = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${first.recipe.id}/drafts`, {});
  const draft = await changeDraft(test, shop.operator, copy, { reason: 'Checked again.', effectiveFrom: '2999-01-01T00:00:00Z' });
  change = (await acts(test, draft.id).submit(shop.operator, draft)).json<RecipeRevisionDto>();
  expect((await acts(test, change.id).approve(shop.lead, change)).json()).toMatchObject({ state: 'scheduled' });
  await letTheDayCome(change.id);
});
afterAll(() => test.close());

/** What no use case does: moves the day of a signed revision. */
const letTheDayCome = (id: string) =>
  asSuperuser(test, async (sql) => {
    await sql`alter table revision disable trigger guarded_rows`;
    await sql`update revision set effective_from = now() - interval '1 minute' where id = ${id}`;
    await sql`alter table revision enable trigger guarded_rows`;
  });
const storedStates = () =>
  asSuperuser(test, async (sql) => [
    ...(await sql<{ number: number; state: string }[]>`select number, state from revision
        where recipe_id = ${first.recipe.id} and number is not null order by number`),
  ]);
const isTheChange = { id: '', state: 'approved', number: 2 };

describe('a scheduled revision whose day has come, before the worker came to it', () => {
  it('is the approved one in the list, which finds it by that state only', async () => {
    const { items, facets } = await read<RecipePageDto>(test, shop.operator, '/recipes?state=approved');
    expect(items).toMatchObject([{ id: first.recipe.id, state: 'approved', current: { ...isTheChange, id: change.id }, underWay: null }]);
    expect(facets.states).toContainEqual({ value: 'approved', label: 'approved', count: 1 });
    expect(facets.states.map(({ value }) => value)).not.toContain('scheduled');
    expect((await read<RecipePageDto>(test, shop.operator, '/recipes?state=scheduled')).items).toEqual([]);
  });

  it('is approved on its own page and may be withdrawn; the one before it is superseded since that day and may not', async () => {
    const now = await read<RecipeRevisionDto>(test, shop.lead, `/revisions/${change.id}`);
    expect(now).toMatchObject({ ...isTheChange, id: change.id, allowedActions: expect.arrayContaining(['withdraw']) });
    const before = await read<RecipeRevisionDto>(test, shop.lead, `/revisions/${first.id}`);
    expect(before).toMatchObject({ state: 'superseded', supersededAt: now.effectiveFrom });
    expect(before.allowedActions).not.toContain('withdraw');
  });

  it('stands as approved in the ladder, in a comparison, in what reviewers weigh and at the machine alike', async () => {
    const { revisions, currentRevision } = await read<RecipeDto>(test, shop.operator, `/recipes/${first.recipe.id}`);
    expect(revisions.map(({ number, state }) => [number, state])).toEqual([
      [2, 'approved'],
      [1, 'superseded'],
    ]);
    expect(currentRevision?.id).toBe(change.id);
    const compared = await read<ComparisonDto>(test, shop.operator, `/revisions/compare?ids=${first.id},${change.id}`);
    expect(compared).toMatchObject({ referenceId: change.id, revisions: [{ state: 'superseded' }, { state: 'approved' }] });
    const found = await read<FinderDto>(test, shop.trainee, `/finder?recipeId=${first.recipe.id}`);
    expect(found.answer).toMatchObject({ revisionId: change.id });
    const copy = await created<RecipeRevisionDto>(test, shop.operator, `/api/recipes/${first.recipe.id}/drafts`, {});
    expect(copy).toMatchObject({ basedOnId: change.id, comparedWith: { id: change.id } });
    await call(test, shop.operator, { method: 'DELETE', url: `/revisions/${copy.id}`, version: copy.version });
  });

  it('is not written down by reading, and an act on the one before it finds it superseded and then writes it down', async () => {
    expect(await storedStates()).toEqual([
      { number: 1, state: 'approved' },
      { number: 2, state: 'scheduled' },
    ]);
    expectProblem(await acts(test, first.id).withdraw(shop.lead), 409, 'revision-state');
    expect((await acts(test, change.id).withdraw(shop.lead)).json()).toMatchObject({ state: 'withdrawn' });
    expect(await storedStates()).toEqual([
      { number: 1, state: 'superseded' },
      { number: 2, state: 'withdrawn' },
    ]);
    const list = await read<RecipePageDto>(test, shop.operator, '/recipes');
    expect(list.items.find(({ id }) => id === first.recipe.id)).toMatchObject({ state: 'withdrawn', current: null });
  });
});
