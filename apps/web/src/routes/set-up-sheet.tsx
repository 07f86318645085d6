import { chakra, Flex } from '@chakra-ui/react';
import { Global } from '@emotion/react';
import { useSearchParams } from 'react-router';
import { Button, ButtonLink } from '../components/button';
import { EmptyState } from '../components/empty-state';
import { PrintIcon } from '../components/icons';
import { Page } from '../components/page';
import { ReadProblem } from '../components/read-problem';
import { SkeletonBlock } from '../components/skeletons';
import { Sheet } from '../features/finder/components/sheet';
import { useFinder } from '../features/finder/finder.api';
import { paths } from '../lib/paths';

/** The page of paper alone: no margins of the browser's own, nothing of the frame around it. */
const PRINT_STYLES = {
  '@page': { size: 'A4 portrait', margin: '0' },
  '@media print': { 'html, body': { background: '#ffffff' }, main: { padding: '0 !important' } },
};

export function Component() {
  const [params] = useSearchParams();
  const recipeId = params.get('recipe') ?? '';
  const { data, error, isLoading, mutate } = useFinder({ recipe: recipeId });
  const back = paths.machineWith(recipeId);
  return (
    <Page title="Set-up sheet" isTitleHidden>
      <Global styles={PRINT_STYLES} />
      {data === undefined || isLoading ? (
        error === undefined ? (
          <SkeletonBlock height="480px" label="Loading the set-up sheet" />
        ) : (
          <ReadProblem problem={error} thing="the set-up sheet" onRetry={() => void mutate()} />
        )
      ) : data.answer === null || data.answer.blockedBecause.length > 0 ? (
        <NoSheet reasons={data.answer?.blockedBecause ?? []} back={back} />
      ) : (
        <>
          <Flex gap="3" mb="4" css={{ '@media print': { display: 'none' } }}>
            <Button kind="primary" size="primaryAct" icon={<PrintIcon />} onClick={() => window.print()}>
              Print
            </Button>
            <ButtonLink to={back} size="glove">
              Back to the machine
            </ButtonLink>
          </Flex>
          <chakra.div
            // The paper is wider than a phone: it scrolls sideways, by keys too.
            role="region"
            aria-label="The sheet as it prints"
            tabIndex={0}
            overflowX="auto"
            css={{ '@media print': { overflow: 'visible' } }}
          >
            <Sheet answer={data.answer} cautions={data.cautions} />
          </chakra.div>
        </>
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
