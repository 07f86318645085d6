import { useState } from 'react';
import { useSearchParams } from 'react-router';
import { ButtonLink } from '../../../components/button';
import { EmptyState } from '../../../components/empty-state';
import { Page } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { paths } from '../../../lib/paths';
import { useRevision } from '../recipes.api';
import { revisionName } from '../revision-words';
import { useTransferGround } from './transfer.api';
import { TransferBody } from './transfer-body';

export const transferCrumbs = (code: string) => [
  { label: 'Recipes', to: paths.recipes },
  { label: code, to: paths.recipe(code) },
  { label: 'Transfer' },
];

/** The same mark on another machine or lens, or why it cannot be. */
export function TransferPage({ code, revisionId }: { code: string; revisionId: string }) {
  const { data: revision } = useRevision(revisionId);
  const { data: ground, error, mutate } = useTransferGround(revisionId);
  const [chosen, choose] = useTarget();
  return (
    <Page
      title="Transfer"
      name={revision === undefined ? code : `${code}, ${revisionName(revision).toLowerCase()}`}
      crumbs={transferCrumbs(code)}
      meta={
        ground !== undefined && (
          <span>
            From {ground.source.machine.name}, {ground.source.lens.name}
          </span>
        )
      }
    >
      {ground !== undefined ? (
        <TransferBody revisionId={revisionId} ground={ground} chosen={chosen} onChoose={choose} />
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

/** Machine and lens stand in the address; it follows a moment later, and the choice must not wait for it. */
function useTarget(): [chosen: string | undefined, choose: (key: string) => void] {
  const [search, setSearch] = useSearchParams();
  const [picked, setPicked] = useState<string>();
  const [machine, lens] = [search.get('machine'), search.get('lens')];
  const inAddress = machine === null || lens === null ? undefined : `${machine}/${lens}`;
  const choose = (key: string) => {
    const [machineId = '', lensId = ''] = key.split('/');
    setPicked(key);
    setSearch({ machine: machineId, lens: lensId }, { replace: true });
  };
  return [picked ?? inAddress, choose];
}
