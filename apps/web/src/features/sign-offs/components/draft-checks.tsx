import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { CheckList } from '../../../components/check-list';
import { ReadProblem } from '../../../components/read-problem';
import { SkeletonBlock } from '../../../components/skeletons';
import { SubmitDialog } from '../forms/submit-form';
import { type ApprovalCheck, type Revision, useApprovalChecks } from '../sign-offs.api';

export type DraftChecksProps = {
  revision: Revision;
  flush: () => Promise<boolean>;
  isSaved: boolean;
  onSubmitted: (revision: Revision) => void;
};

/** Everything that an approval will need, each failing check in full, and the way to submit. */
export function DraftChecks({ revision, flush, isSaved, onSubmitted }: DraftChecksProps) {
  const { data, error, mutate } = useApprovalChecks(revision.id);
  const [isSubmitting, setIsSubmitting] = useState(false);
  if (error !== undefined && data === undefined) return <ReadProblem problem={error} thing="the checks" onRetry={() => void mutate()} />;
  if (data === undefined) return <SkeletonBlock height="320px" label="Checking" />;
  const maySubmit = revision.allowedActions.includes('submit');
  return (
    <CheckList checks={forAuthor(data.items)}>
      <chakra.div borderTop="hairline" mt="2" pt="3" pb="2">
        {maySubmit ? (
          <>
            <Button kind="primary" shape="wide" size="touch" disabled={!data.maySubmit || !isSaved} onClick={() => setIsSubmitting(true)}>
              Submit for review
            </Button>
            {!data.maySubmit && (
              <chakra.p mt="2" fontSize="sm" color="fg.muted">
                What fails above and is needed to submit comes first.
              </chakra.p>
            )}
          </>
        ) : (
          <chakra.p fontSize="sm" color="fg.muted">
            {revision.author.name} submits it: its author does.
          </chakra.p>
        )}
      </chakra.div>
      {isSubmitting && <SubmitDialog revision={revision} flush={flush} onClose={() => setIsSubmitting(false)} onSubmitted={onSubmitted} />}
    </CheckList>
  );
}

/** Whether this person could sign is no question yet; what keeps the draft from being submitted comes first. */
function forAuthor(checks: readonly ApprovalCheck[]): readonly ApprovalCheck[] {
  const own = checks.filter(({ key }) => !key.startsWith('signer'));
  return own.toSorted((one, other) => Number(one.blocks === 'approve') - Number(other.blocks === 'approve'));
}
