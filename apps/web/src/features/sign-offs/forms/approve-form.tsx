import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { TextAreaField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { SignOffIcon } from '../../../components/icons';
import { Panel } from '../../../components/page';
import { PasswordField } from '../../../components/password-field';
import { roleWord } from '../../../lib/roles';
import { useSession } from '../../../lib/session';
import { type ApprovalChecks, approveRevision, type Revision } from '../sign-offs.api';
import { explainSigning, signedAct, unansweredSigning } from '../signing-problem';
import { CautionTicks } from './caution-ticks';

// Not `comment`: sending back opens on the same page with a field of that name.
const LABELS = { acknowledged: 'Cautions', remark: 'Comment', password: 'Your password' };

type Values = { acknowledged: string[]; remark: string; password: string };

export type ApproveFormProps = {
  revision: Revision;
  /** Number of the revision that this one supersedes. */
  supersedes: number | null;
  checks: ApprovalChecks;
  mayReturn: boolean;
  onSendBack: () => void;
  onApproved: (revision: Revision) => void;
};

/** The signature. Its button names the act, and nothing is called signed before the server has said so. */
export function ApproveForm({ revision, supersedes, checks, mayReturn, onSendBack, onApproved }: ApproveFormProps) {
  const { member } = useSession();
  const form = useSummaryForm<Values>({ defaultValues: { acknowledged: [], remark: '', password: '' } });
  const { errors, isSubmitting } = form.formState;
  const care = revision.cautions.filter(({ level }) => level === 'care');
  const act = `Approve revision ${revision.number}`;
  return (
    <Panel px="5" pt="3.5" pb="4" borderColor="border.emphasized" aria-label={`Sign revision ${revision.number}`}>
      <chakra.h2 mb="1.5">Sign revision {revision.number}</chakra.h2>
      <Form
        form={form}
        labels={LABELS}
        explain={(problem) => explainSigning(problem, 'signed')}
        unanswered={unansweredSigning('signed')}
        onSubmit={async ({ acknowledged, remark, password }, { idempotencyKey }) => {
          const body = { password, contentHash: checks.contentHash, acknowledgedCautionIds: acknowledged, comment: remark.trim() };
          onApproved(await signedAct(() => approveRevision(revision.id, body, { idempotencyKey })));
        }}
      >
        <chakra.p>
          <b>Approval</b>: {meaningWords(supersedes, revision.effectiveFrom !== null)}
        </chakra.p>
        <CautionTicks
          cautions={care}
          error={errors.acknowledged?.message}
          registration={form.register('acknowledged', {
            validate: (ids) => ids.length >= care.length || 'Acknowledge each caution to sign.',
          })}
        />
        <TextAreaField label={LABELS.remark} isOptional rows={2} error={errors.remark?.message} {...form.register('remark')} />
        <PasswordField
          label={LABELS.password}
          autoComplete="current-password"
          error={errors.password?.message}
          {...form.register('password', { required: 'Type your password to sign.' })}
        />
        <Button type="submit" kind="primary" size="touch" shape="wide" icon={<SignOffIcon />} isBusy={isSubmitting}>
          {act}
        </Button>
        <chakra.div display="flex" justifyContent="space-between" alignItems="center" gap="3" flexWrap="wrap" fontSize="sm">
          <chakra.span color="fg.muted">
            Signs as {member.printedName}, {roleWord(member.role)}
          </chakra.span>
          {mayReturn && (
            <Button kind="quiet" onClick={onSendBack} px="0" fontSize="sm" fontWeight="normal" textDecoration="underline">
              Send back with a reason
            </Button>
          )}
        </chakra.div>
      </Form>
    </Panel>
  );
}

function meaningWords(supersedes: number | null, isLater: boolean): string {
  const when = isLater ? 'this becomes the setting on its date' : 'this becomes the setting';
  return supersedes === null ? when : `${when}, revision ${supersedes} is superseded`;
}
