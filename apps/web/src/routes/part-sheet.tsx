import { useParams } from 'react-router';
import { ButtonLink } from '../components/button';
import { EmptyState } from '../components/empty-state';
import { Page } from '../components/page';
import { PrintedPage } from '../components/printed-page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { PartSheetTime } from '../features/marking-time/components/sheet-time';
import { useCautions } from '../features/materials/cautions.api';
import { PartSheet } from '../features/part-set-up/components/part-sheet';
import { useRunPart } from '../features/part-set-up/part-set-up.api';
import { useRun } from '../features/runs/runs.api';
import { paths } from '../lib/paths';

export function Component() {
  const { code = '' } = useParams();
  const { data: run, error: runError, mutate: readRun } = useRun(code);
  const { data: known, error: partError, mutate: readPart } = useRunPart(run?.id ?? '');
  const { data: cautions } = useCautions();
  const error = runError ?? partError;
  const back = { to: paths.run(code), label: `Back to ${code}` };
  return (
    <Page title={`Part set-up of ${code}`} isTitleHidden>
      {run === undefined || known === undefined || cautions === undefined ? (
        error === undefined ? (
          <SkeletonBlock height="480px" label="Loading the part sheet" />
        ) : (
          <ReadProblem problem={error} thing="the part sheet" onRetry={() => void (run === undefined ? readRun() : readPart())} />
        )
      ) : known.setUp === null ? (
        <EmptyState
          kind="none-match"
          title="No round part is kept with this run"
          actions={<ButtonLink to={back.to}>{back.label}</ButtonLink>}
        >
          Set one up on the page of the run first.
        </EmptyState>
      ) : (
        <PrintedPage back={back}>
          <PartSheet
            saved={known.setUp}
            run={run}
            time={<PartSheetTime runId={run.id} />}
            cautions={cautions.items.filter(({ appliesTo }) => appliesTo.roundPart === true)}
          />
        </PrintedPage>
      )}
    </Page>
  );
}
