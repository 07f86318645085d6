import { chakra } from '@chakra-ui/react';
import { ButtonLink } from '../../../components/button';
import { StopBanner } from '../../../components/stop-banner';
import { formatTime } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { revisionWords } from '../run-words';
import type { Run } from '../runs.api';

/** The revision of a run under way was withdrawn or superseded: what happened, what becomes of the pieces, where to go on. */
export function RunStop({ run }: { run: Run }) {
  const { shop } = useSession();
  const { stop } = run;
  if (stop === null) return null;
  const { because, by, at, reason, approvedNumber } = stop;
  const isReplaced = approvedNumber !== null;
  return (
    <chakra.div role="alert">
      <StopBanner
        title={
          because === 'withdrawn'
            ? `${revisionWords(run)} was withdrawn. Mark no more pieces.`
            : `${revisionWords(run)} was replaced. Mark no more pieces with it.`
        }
        actions={
          <ButtonLink to={isReplaced ? paths.machineWith(run.recipe.id) : paths.machine} size="glove">
            {isReplaced ? `Open revision ${approvedNumber}` : 'Look for another setting'}
          </ButtonLink>
        }
      >
        {reason !== '' && <p>{reason}</p>}
        <p>Keep the pieces already marked apart and tell a lead, who decides about them. {finishWords(run)}</p>
        {because === 'withdrawn' && (
          <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
            Withdrawn{by === null ? '' : ` by ${by}`}
            {at === null ? '' : `, ${formatTime(at, shop.timeZone)}`}
          </chakra.p>
        )}
      </StopBanner>
    </chakra.div>
  );
}

function finishWords({ kind, firstPiece }: Run): string {
  if (kind === 'production' && firstPiece?.ok !== true)
    return 'Then finish this run: without a released first piece every part counts as scrap.';
  return 'Then finish this run with what was counted so far.';
}
