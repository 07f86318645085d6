import { useState } from 'react';
import { useParams, useSearchParams } from 'react-router';
import { ButtonLink } from '../components/button';
import { EmptyState } from '../components/empty-state';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { useRevision } from '../features/recipes/recipes.api';
import { revisionName } from '../features/recipes/revision-words';
import { useTransferGround } from '../features/recipes/transfer/transfer.api';
import { TransferBody } from '../features/recipes/transfer/transfer-body';
import { paths } from '../lib/paths';

/** The same mark on another machine or lens, or why it cannot be. */
export function Component() {
  const { code = '', revisionId = '' } = useParams();
  const [search, setSearch] = useSearchParams();
  const { data: revision } = useRevision(revisionId);
  const { data: ground, error, mutate } = useTransferGround(revisionId);
  const of = revision === undefined ? code : `${code}, ${revisionName(revision).toLowerCase()}`;
  const [machine, lens] = [search.get('machine'), search.get('lens')];
  const inAddress = machine === null || lens === null ? undefined : `${machine}/${lens}`;
  // the address follows a moment later; the choice must not wait for it
  const [picked, setPicked] = useState<string>();
  const handleChoose = (key: string) => {
    const [machineId = '', lensId = ''] = key.split('/');
    setPicked(key);
    setSearch({ machine: machineId, lens: lensId }, { replace: true });
  };
  return (
    <Page
      title="Transfer"
      name={of}
      crumbs={[{ label: 'Recipes', to: paths.recipes }, { label: code, to: paths.recipe(code) }, { label: 'Transfer' }]}
      meta={
        ground !== undefined && (
          <span>
            From {ground.source.machine.name}, {ground.source.lens.name}
          </span>
        )
      }
    >
      {ground !== undefined ? (
        <TransferBody revisionId={revisionId} ground={ground} chosen={picked ?? inAddress} onChoose={handleChoose} />
      ) : error?.code === 'revision-state' ? (
        <EmptyState
          kind="no-right"
          title="A draft is not transferred"
          actions={<ButtonLink to={paths.recipeRevision(code, revisionId)}>Open the draft</ButtonLink>}
        >
          {error.detail}
        </EmptyState>
      ) : error !== undefined ? (
        <ReadProblem problem={error} thing="this revision" onRetry={() => void mutate()} />
      ) : (
        <SkeletonBlock height="480px" label="Loading the revision" />
      )}
    </Page>
  );
}
