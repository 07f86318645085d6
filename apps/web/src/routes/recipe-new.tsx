import { useNavigate } from 'react-router';
import { Page } from '../components/page';
import type { Revision } from '../features/recipes/recipes.api';
import { StartRecipe } from '../features/recipes/start/start-recipe';
import { paths } from '../lib/paths';

const CRUMBS = [{ label: 'Recipes', to: paths.recipes }, { label: 'By another route' }];

export function Component() {
  const navigate = useNavigate();
  const handleStarted = ({ id, recipe }: Revision) => void navigate(paths.recipeRevision(recipe.code, id));
  return (
    <Page
      title="Add a recipe without a coupon"
      crumbs={CRUMBS}
      meta={<span>For a setting that was not found on a coupon of the shop.</span>}
    >
      <StartRecipe onStarted={handleStarted} />
    </Page>
  );
}
