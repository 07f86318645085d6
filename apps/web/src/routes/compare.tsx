import { chakra } from '@chakra-ui/react';
import { useParams, useSearchParams } from 'react-router';
import { Button } from '../components/button';
import { EmptyState } from '../components/empty-state';
import { DownloadIcon } from '../components/icons';
import { NumbersColumns } from '../components/numbers-panel/numbers-columns';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { revisionNumbers } from '../components/setting-numbers';
import { SkeletonBlock } from '../components/skeletons';
import { Switch } from '../components/switch';
import { AddRevision } from '../features/recipes/compare/add-revision';
import {
  addressOf,
  type CompareChoice,
  choiceFromAddress,
  FEWEST_COMPARED,
  MOST_COMPARED,
} from '../features/recipes/compare/compare-address';
import { CompareCards } from '../features/recipes/compare/compare-cards';
import { CompareTable } from '../features/recipes/compare/compare-table';
import { comparisonCsv } from '../features/recipes/compare/comparison-csv';
import { comparisonView } from '../features/recipes/compare/comparison-view';
import { type Comparison, type Recipe, useComparison, useRecipe } from '../features/recipes/recipes.api';
import { paths } from '../lib/paths';
import { saveTextFile } from '../lib/save-file';

export function Component() {
  const { code = '' } = useParams();
  const { data: recipe, error, mutate } = useRecipe(code);
  if (recipe !== undefined) return <ComparePage recipe={recipe} />;
  return (
    <Page title={code} name="revisions" crumbs={crumbs(code)}>
      {error === undefined ? (
        <SkeletonBlock height="480px" label="Loading the recipe" />
      ) : (
        <ReadProblem problem={error} thing="this recipe" onRetry={() => void mutate()} />
      )}
    </Page>
  );
}

const crumbs = (code: string) => [{ label: 'Recipes', to: paths.recipes }, { label: code, to: paths.recipe(code) }, { label: 'Compare' }];

function ComparePage({ recipe }: { recipe: Recipe }) {
  const [search, setSearch] = useSearchParams();
  const choice = choiceFromAddress(search, recipe);
  const { data, error, mutate } = useComparison(choice.ids, choice.referenceId);
  const change = (next: Partial<CompareChoice>) => setSearch(addressOf({ ...choice, ...next }));
  const { code, revisions } = recipe;
  const addable = revisions.filter(({ id }) => !choice.ids.includes(id));
  return (
    <Page
      title={code}
      name={data === undefined ? 'revisions' : columnWords(data)}
      crumbs={crumbs(code)}
      actions={
        <>
          <Switch label="Only what differs" isOn={!choice.showsAll} onChange={(isOn) => change({ showsAll: !isOn })} />
          {choice.ids.length < MOST_COMPARED && addable.length > 0 && (
            <AddRevision revisions={addable} onAdd={(id) => change({ ids: [...choice.ids, id] })} />
          )}
          <Button
            icon={<DownloadIcon />}
            disabled={data === undefined}
            onClick={() => data !== undefined && saveTextFile(`${code}-compare.csv`, comparisonCsv(data))}
          >
            CSV
          </Button>
        </>
      }
    >
      {choice.ids.length < FEWEST_COMPARED && (
        <EmptyState kind="none-match" title="There is nothing to compare yet">
          This recipe has one revision. As soon as a change is proposed, both stand here side by side.
        </EmptyState>
      )}
      {error !== undefined && data === undefined && <ReadProblem problem={error} thing="the comparison" onRetry={() => void mutate()} />}
      {data === undefined && error === undefined && choice.ids.length >= FEWEST_COMPARED && (
        <SkeletonBlock height="560px" label="Comparing" />
      )}
      {data !== undefined && <Compared comparison={data} choice={choice} onChange={change} />}
    </Page>
  );
}

type ComparedProps = { comparison: Comparison; choice: CompareChoice; onChange: (next: Partial<CompareChoice>) => void };

function Compared({ comparison, choice, onChange }: ComparedProps) {
  const reference = comparison.revisions.find(({ id }) => id === comparison.referenceId);
  const view = comparisonView(comparison, {
    machineName: reference?.recipe.machine.name ?? 'the machine',
    onlyDiffering: !choice.showsAll,
  });
  const handleRemove = (id: string) =>
    onChange({ ids: choice.ids.filter((own) => own !== id), ...(choice.referenceId === id ? { referenceId: undefined } : {}) });
  const props = {
    comparison,
    view,
    onReference: (referenceId: string) => onChange({ referenceId }),
    onRemove: choice.ids.length > FEWEST_COMPARED ? handleRemove : undefined,
  };
  return (
    <>
      <CompareTable {...props} />
      <CompareCards {...props} />
      <chakra.div mt="4">
        <NumbersColumns
          columns={comparison.revisions.map((revision) => ({
            key: revision.id,
            label: revision.number === null ? 'Draft' : `Revision ${revision.number}`,
            groups: revisionNumbers(revision),
          }))}
        />
      </chakra.div>
    </>
  );
}

/** "revisions 2, 3 and 4". */
function columnWords({ revisions }: Comparison): string {
  const names = revisions.map(({ number }) => (number === null ? 'draft' : String(number)));
  return `revisions ${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}
