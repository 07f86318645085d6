import { useSearchParams } from 'react-router';
import { ButtonLink } from '../components/button';
import { EmptyState } from '../components/empty-state';
import { Page } from '../components/page';
import { PrintedPage } from '../components/printed-page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { Sheet } from '../features/finder/components/sheet';
import { useFinder } from '../features/finder/finder.api';
import { SheetTime } from '../features/marking-time/components/sheet-time';
import { paths } from '../lib/paths';

export function Component() {
  const [params] = useSearchParams();
  const recipeId = params.get('recipe') ?? '';
  const { data, error, isLoading, mutate } = useFinder({ recipe: recipeId });
  const back = paths.machineWith(recipeId);
  return (
    <Page title="Set-up sheet" isTitleHidden>
      {data === undefined || isLoading ? (
        error === undefined ? (
          <SkeletonBlock height="480px" label="Loading the set-up sheet" />
        ) : (
          <ReadProblem problem={error} thing="the set-up sheet" onRetry={() => void mutate()} />
        )
      ) : data.answer === null || data.answer.blockedBecause.length > 0 ? (
        <NoSheet reasons={data.answer?.blockedBecause ?? []} back={back} />
      ) : (
        <PrintedPage back={{ to: back, label: 'Back to the machine' }}>
          <Sheet answer={data.answer} cautions={data.cautions} time={<SheetTime revisionId={data.answer.revisionId} />} />
        </PrintedPage>
      )}
    </Page>
  );
}

function NoSheet({ reasons, back }: { reasons: readonly string[]; back: string }) {
  return (
    <EmptyState kind="no-right" title="No valid sheet can be printed now" actions={<ButtonLink to={back}>Back to the machine</ButtonLink>}>
      {reasons.length === 0 ? 'There is no approved revision of this recipe.' : reasons.join(' ')}
    </EmptyState>
  );
}
