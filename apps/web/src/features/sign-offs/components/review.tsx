import { chakra } from '@chakra-ui/react';
import { type ReactNode, useState } from 'react';
import { ButtonLink } from '../../../components/button';
import { CautionList } from '../../../components/caution-list';
import { CheckList } from '../../../components/check-list';
import { Digest } from '../../../components/digest';
import { NumbersColumns } from '../../../components/numbers-panel/numbers-columns';
import { Panel } from '../../../components/page';
import { ReadProblem } from '../../../components/read-problem';
import { revisionNumbers } from '../../../components/setting-numbers';
import { SignatureLine } from '../../../components/signature-line';
import { SkeletonBlock } from '../../../components/skeletons';
import { formatTime } from '../../../lib/format';
import { paths } from '../../../lib/paths';
import { roleWord } from '../../../lib/roles';
import { useSession } from '../../../lib/session';
import { ApproveForm } from '../forms/approve-form';
import { ReturnDialog } from '../forms/return-form';
import { type ApprovalChecks, type Revision, useApprovalChecks, useProposedChange, useRevision } from '../sign-offs.api';
import { ChangeTable } from './change-table';
import { EvidenceBeside } from './evidence-beside';

export type ReviewProps = {
  revision: Revision;
  onReturned: () => void;
  /** The revision itself, with every number: nobody signs what the page does not show. */
  children: ReactNode;
};

/** Everything that a signer needs on one page: evidence, what changes, the setting itself, checks, and the signature. */
export function Review({ revision, onReturned, children }: ReviewProps) {
  const comparedId = revision.comparedWith?.id;
  const current = useRevision(comparedId);
  const change = useProposedChange(comparedId, revision.id);
  const checks = useApprovalChecks(revision.id);
  const isFirst = comparedId === undefined;
  const never = revision.cautions.filter(({ level }) => level === 'never');
  return (
    <>
      {never.length > 0 && (
        <chakra.div mb="4">
          <CautionList cautions={never.map(({ id, subject, text, source }) => ({ key: id, act: subject, reason: text, source }))} />
        </chakra.div>
      )}
      <chakra.div
        display="grid"
        gridTemplateColumns={{ base: 'minmax(0, 1fr)', xl: 'minmax(0, 1fr) 392px' }}
        gap={{ base: '4', xl: '6' }}
        alignItems="start"
      >
        <chakra.div display="grid" gap="4" gridTemplateColumns="minmax(0, 1fr)">
          {isFirst && (
            <chakra.p>
              <b>The first setting of {revision.recipe.code}.</b> There is no approved revision to compare it with.
            </chakra.p>
          )}
          {isFirst && children}
          <EvidenceBeside current={comparedId === undefined ? undefined : current.data} proposed={revision} />
          {change.error !== undefined && <ReadProblem problem={change.error} thing="what changes" onRetry={() => void change.mutate()} />}
          {change.data !== undefined && (
            <ChangeTable
              comparison={change.data}
              before={`Revision ${revision.comparedWith?.number ?? ''}`}
              after={`Revision ${revision.number ?? ''}`}
            />
          )}
          {!isFirst && children}
          <NumbersColumns columns={numberColumns(comparedId === undefined ? undefined : current.data, revision)} />
        </chakra.div>
        <chakra.div display="grid" gap="4">
          {checks.error !== undefined && <ReadProblem problem={checks.error} thing="the checks" onRetry={() => void checks.mutate()} />}
          {checks.data === undefined && checks.error === undefined && <SkeletonBlock height="320px" label="Checking" />}
          {checks.data !== undefined && (
            <>
              <CheckList checks={checks.data.items} inFull={WEIGHED}>
                <ConfirmationNumbers confirmation={checks.data.confirmation} />
              </CheckList>
              <Signing revision={revision} checks={checks.data} onReturned={onReturned} />
            </>
          )}
        </chakra.div>
      </chakra.div>
    </>
  );
}

/** The setting that holds today beside the proposed one. */
function numberColumns(current: Revision | undefined, proposed: Revision) {
  const shown = current === undefined ? [proposed] : [current, proposed];
  return shown.map((revision) => ({
    key: revision.id,
    label: revision.number === null ? 'Draft' : `Revision ${revision.number}`,
    groups: revisionNumbers(revision),
  }));
}

/** Passing checks whose findings a signer weighs. */
const WEIGHED = new Set(['basis', 'confirmation', 'new-confirmation', 'criteria', 'photo', 'calibration', 'power-shift']);

/** How many marks count, over how many lots and days, with lowest, highest and mean. */
function ConfirmationNumbers({ confirmation }: { confirmation: ApprovalChecks['confirmation'] }) {
  const { markCount, neededCount, lots, dayCount, spreads } = confirmation;
  if (markCount === 0) return null;
  const named = lots.filter((lot) => lot !== '').length;
  return (
    <chakra.div borderTop="hairline" mt="2" pt="2" pb="1" fontSize="sm" lineHeight="sm" color="fg.muted">
      {markCount} marks count, {neededCount} needed; {named === 0 ? 'lots not recorded' : `${named} ${named === 1 ? 'lot' : 'lots'}`},{' '}
      {dayCount} {dayCount === 1 ? 'day' : 'days'}
      {spreads.map(({ quantity, label, n, lowest, highest, mean, unit }) => (
        <chakra.p key={quantity}>
          {label}: n {n}, {round(lowest)} to {round(highest)}, mean {round(mean)}
          {unit === '1' ? '' : ` ${unit}`}
        </chakra.p>
      ))}
    </chakra.div>
  );
}

const round = (value: number) => String(Number(value.toPrecision(4))).replace('-', '−');

type SigningProps = { revision: Revision; checks: ApprovalChecks; onReturned: () => void };

function Signing({ revision, checks, onReturned }: SigningProps) {
  const [isReturning, setIsReturning] = useState(false);
  const { allowedActions, state, number } = revision;
  const mayReturn = allowedActions.includes('return');
  const openReturn = () => setIsReturning(true);
  return (
    <>
      {state !== 'in_review' && <Given revision={revision} />}
      {state === 'in_review' && allowedActions.includes('approve') && checks.mayApprove && (
        <ApproveForm
          revision={revision}
          supersedes={revision.comparedWith?.number ?? null}
          checks={checks}
          mayReturn={mayReturn}
          onSendBack={openReturn}
          onApproved={() => undefined}
        />
      )}
      {state === 'in_review' && !(allowedActions.includes('approve') && checks.mayApprove) && (
        <NotYours
          mayApprove={checks.mayApprove}
          isAllowed={allowedActions.includes('approve')}
          number={number}
          onSendBack={mayReturn ? openReturn : undefined}
        />
      )}
      {isReturning && <ReturnDialog revision={revision} onClose={() => setIsReturning(false)} onReturned={onReturned} />}
    </>
  );
}

type NotYoursProps = { mayApprove: boolean; isAllowed: boolean; number: number | null; onSendBack: (() => void) | undefined };

/** Why the form is not here. A failing check is never signed over. */
function NotYours({ isAllowed, number, onSendBack }: NotYoursProps): ReactNode {
  return (
    <Panel px="5" py="4" aria-label={`Sign revision ${number}`}>
      <chakra.h2 mb="1.5">{isAllowed ? `Revision ${number} cannot be signed yet` : `Revision ${number} is not yours to sign`}</chakra.h2>
      <p>
        {isAllowed
          ? 'A check fails. A failing check cannot be signed over: send it back, or wait until it passes.'
          : 'A lead or owner signs who did not write it.'}
      </p>
      {onSendBack !== undefined && (
        <chakra.button
          type="button"
          onClick={onSendBack}
          mt="3"
          minHeight="touch"
          color="brand.fg"
          textDecoration="underline"
          cursor="pointer"
        >
          Send back with a reason
        </chakra.button>
      )}
    </Panel>
  );
}

const GIVEN_WORDS: Partial<Record<Revision['state'], string>> = {
  approved: 'Approved for use',
  scheduled: 'Approved, not yet in effect',
  returned: 'Sent back',
  superseded: 'Approved, superseded since',
  withdrawn: 'Withdrawn',
};

/** The signature as the server keeps it. */
function Given({ revision }: { revision: Revision }) {
  const { shop } = useSession();
  const { signOffs, number, recipe, state } = revision;
  const last = signOffs.at(-1);
  return (
    <Panel px="5" py="4" role="status">
      <chakra.h2 mb="2">
        {GIVEN_WORDS[state] ?? state}: {recipe.code} revision {number}
      </chakra.h2>
      {last !== undefined && (
        <SignatureLine
          name={last.printedName}
          state={
            state === 'approved' || state === 'scheduled' || state === 'superseded'
              ? 'approved'
              : state === 'withdrawn'
                ? 'withdrawn'
                : 'returned'
          }
          caption={`${last.meaning} as ${roleWord(last.role)}, ${formatTime(last.signedAt, shop.timeZone)}`}
        />
      )}
      {last !== undefined && (
        <chakra.div px="1" fontSize="sm" color="fg.muted">
          <Digest value={last.contentHash} />
        </chakra.div>
      )}
      <chakra.div mt="4">
        <ButtonLink to={paths.recipe(recipe.code)}>Open {recipe.code}</ButtonLink>
      </chakra.div>
    </Panel>
  );
}
