import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { TextAreaField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import { textRules } from '../../../lib/text-rules';
import { withdrawRevision } from '../sign-offs.api';
import { explainSigning, signedAct, unansweredSigning } from '../signing-problem';

const LABELS = { reason: 'Why it must not be used any more', password: 'Your password' };

export type WithdrawDialogProps = {
  revision: { id: string; number: number | null; state: string };
  recipeCode: string;
  onClose: () => void;
  onWithdrawn: () => void;
};

/** Withdrawing acts at every machine at once, so it asks for the reason and the password. */
export function WithdrawDialog({ revision, recipeCode, onClose, onWithdrawn }: WithdrawDialogProps) {
  const form = useSummaryForm<{ reason: string; password: string }>({ defaultValues: { reason: '', password: '' } });
  const { errors, isSubmitting } = form.formState;
  const act = `Withdraw revision ${revision.number ?? ''}`;
  return (
    <Dialog title={act} onClose={onClose}>
      <Form
        form={form}
        labels={LABELS}
        explain={(problem) => explainSigning(problem, 'withdrawn')}
        unanswered={unansweredSigning('withdrawn')}
        onSubmit={async ({ reason, password }, { idempotencyKey }) => {
          await signedAct(() => withdrawRevision(revision.id, { reason, password }, { idempotencyKey }));
          onWithdrawn();
        }}
      >
        <chakra.p>
          {revision.state === 'scheduled'
            ? 'It then never takes effect. '
            : `${recipeCode} then has no approved setting, and every machine says so at once. `}
          This cannot be taken back; a new revision can be proved.
        </chakra.p>
        <TextAreaField
          label={LABELS.reason}
          error={errors.reason?.message}
          {...form.register('reason', textRules('Say why it must not be used any more.', 2000))}
        />
        <PasswordField
          label={LABELS.password}
          autoComplete="current-password"
          error={errors.password?.message}
          {...form.register('password', { required: 'Type your password to sign.' })}
        />
        <Button type="submit" kind="danger" size="touch" isBusy={isSubmitting}>
          {act}
        </Button>
      </Form>
    </Dialog>
  );
}
