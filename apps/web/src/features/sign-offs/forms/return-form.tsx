import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { TextAreaField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { textRules } from '../../../lib/text-rules';
import { type Revision, returnRevision } from '../sign-offs.api';
import { explainSigning, signedAct, unansweredSigning } from '../signing-problem';

const LABELS = { comment: 'What the author should do' };

export type ReturnDialogProps = { revision: Revision; onClose: () => void; onReturned: () => void };

/** Sending back needs words that the author can act on. */
export function ReturnDialog({ revision, onClose, onReturned }: ReturnDialogProps) {
  const form = useSummaryForm<{ comment: string }>({ defaultValues: { comment: '' } });
  const { errors, isSubmitting } = form.formState;
  const act = `Send back revision ${revision.number}`;
  return (
    <Dialog title={act} onClose={onClose}>
      <Form
        form={form}
        labels={LABELS}
        explain={(problem) => explainSigning(problem, 'sent back')}
        unanswered={unansweredSigning('sent back')}
        onSubmit={async ({ comment }, { idempotencyKey }) => {
          await signedAct(() => returnRevision(revision.id, { comment }, { idempotencyKey }));
          onReturned();
        }}
      >
        <TextAreaField
          label={LABELS.comment}
          help={`${revision.author.name} gets these words by mail and starts a new draft from this revision.`}
          error={errors.comment?.message}
          {...form.register('comment', textRules('Say what the author should do.', 2000))}
        />
        <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
          {act}
        </Button>
      </Form>
    </Dialog>
  );
}
