import { useParams } from 'react-router';
import { EmptyState } from '../components/empty-state';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { TextLink } from '../components/text-link';
import { useRecipe } from '../features/recipes/recipes.api';
import { TransferPage, transferCrumbs } from '../features/recipes/transfer/transfer-page';
import { paths } from '../lib/paths';

/** Where only the recipe is known, its approved revision is the one to carry over. */
export function Component() {
  const { code = '' } = useParams();
  const { data: recipe, error, mutate } = useRecipe(code);
  if (recipe?.currentRevision != null) return <TransferPage code={code} revisionId={recipe.currentRevision.id} />;
  return (
    <Page title="Transfer" name={code} crumbs={transferCrumbs(code)}>
      {recipe !== undefined ? (
        <EmptyState kind="none-yet" title="There is no approved revision to carry over">
          Open <TextLink to={paths.recipe(code)}>{code}</TextLink> and choose a revision that was submitted.
        </EmptyState>
      ) : error === undefined ? (
        <SkeletonBlock height="480px" label="Loading the recipe" />
      ) : (
        <ReadProblem problem={error} thing="this recipe" onRetry={() => void mutate()} />
      )}
    </Page>
  );
}
