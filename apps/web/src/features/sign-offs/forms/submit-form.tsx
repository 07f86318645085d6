import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { TextAreaField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { type Revision, submitRevision } from '../sign-offs.api';
import { explainSigning, signedAct, unansweredSigning } from '../signing-problem';

const LABELS = { comment: 'A word to the lead' };

export type SubmitDialogProps = {
  revision: Revision;
  flush: () => Promise<boolean>;
  onClose: () => void;
  onSubmitted: (revision: Revision) => void;
};

/** Submitting gives the number; from then on the revision never changes again. */
export function SubmitDialog({ revision, flush, onClose, onSubmitted }: SubmitDialogProps) {
  const form = useSummaryForm({ defaultValues: { comment: '' } });
  const { errors, isSubmitting } = form.formState;
  const acknowledged = revision.cautions.filter(({ isAcknowledged }) => isAcknowledged).map(({ id }) => id);
  return (
    <Dialog title="Submit for review" onClose={onClose}>
      <Form
        form={form}
        labels={LABELS}
        explain={(problem) => explainSigning(problem, 'submitted')}
        unanswered={unansweredSigning('submitted')}
        onSubmit={async ({ comment }, { idempotencyKey }) => {
          if (!(await flush())) {
            form.setError('comment', { message: 'The draft is not saved yet. Close this and mend what it says.' });
            return;
          }
          const body = { acknowledgedCautionIds: acknowledged, ...(comment.trim() === '' ? {} : { comment: comment.trim() }) };
          onSubmitted(await signedAct(() => submitRevision(revision.id, body, { idempotencyKey, version: revision.version })));
        }}
      >
        <chakra.p>
          It gets its number and never changes again. A lead signs it, or sends it back with a reason; you may recall it until then.
        </chakra.p>
        <TextAreaField label={LABELS.comment} isOptional error={errors.comment?.message} {...form.register('comment')} />
        <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
          Submit for review
        </Button>
      </Form>
    </Dialog>
  );
}
