import { useState } from 'react';
import { useSearchParams } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { DownloadIcon, PlusIcon } from '../components/icons';
import { Page } from '../components/page';
import { useStatusLine } from '../components/status-line';
import { RecipeList } from '../features/recipes/components/recipe-list';
import { filtersFromAddress } from '../features/recipes/recipe-filters';
import { listAllRecipes } from '../features/recipes/recipes.api';
import { recipesCsv } from '../features/recipes/recipes-csv';
import { ProblemError } from '../lib/api';
import { paths } from '../lib/paths';
import { saveTextFile } from '../lib/save-file';
import { useSession } from '../lib/session';

export function Component() {
  const { member } = useSession();
  const mayPlan = member.role !== 'trainee';
  return (
    <Page
      title="Recipes"
      actions={
        <>
          <CsvButton />
          {mayPlan && <ButtonLink to={paths.newRecipe}>Add a recipe without a coupon</ButtonLink>}
          {mayPlan && (
            <ButtonLink kind="primary" to={paths.planCoupon} icon={<PlusIcon />}>
              Plan a coupon
            </ButtonLink>
          )}
        </>
      }
    >
      <RecipeList mayPlan={mayPlan} />
    </Page>
  );
}

function CsvButton() {
  const [search] = useSearchParams();
  const [isBusy, setIsBusy] = useState(false);
  const announce = useStatusLine();
  const handleSave = async () => {
    setIsBusy(true);
    try {
      saveTextFile('recipes.csv', recipesCsv(await listAllRecipes(filtersFromAddress(search))));
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      announce(`The file was not made. ${error.detail}`);
    } finally {
      setIsBusy(false);
    }
  };
  return (
    <Button icon={<DownloadIcon />} isBusy={isBusy} onClick={() => void handleSave()}>
      CSV
    </Button>
  );
}
