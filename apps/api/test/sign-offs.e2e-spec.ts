import type { RecipeDto } from '../src/recipes/dto/recipe.dto';
import type { RecipeRevisionDto } from '../src/recipes/dto/recipe-revision.dto';
import { createTestApp, type TestApp } from './support/app';
import { acts, makeRecipeShop, makeSubmitted, type RecipeShop, read } from './support/recipes';

let test: TestApp;
let shop: RecipeShop;

beforeAll(async () => {
  test = await createTestApp();
  shop = await makeRecipeShop(test);
});
afterAll(() => test.close());

describe('the way of a revision', () => {
  it('goes from a cell over proof, submission and signature to the approved setting', async () => {
    const submitted = await makeSubmitted(test, shop);
    expect(submitted).toMatchObject({ number: 1, state: 'in_review', allowedActions: ['recall', 'copy', 'start-confirmation'] });
    const answer = await acts(test, submitted.id).approve(shop.lead, submitted, { comment: 'Even and dark.' });
    expect(answer.json<RecipeRevisionDto>()).toMatchObject({
      state: 'approved',
      signOffs: [
        { meaning: 'submitted for review' },
        { meaning: 'approved', printedName: shop.lead.printedName, role: 'lead', method: 'password' },
      ],
    });
    const recipe = await read<RecipeDto>(test, shop.operator, `/recipes/${submitted.recipe.id}`);
    expect(recipe).toMatchObject({ state: 'approved', current: { id: submitted.id }, underWay: null });
  });
});
