import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { TextAreaField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { Segmented } from '../../../components/segmented';
import { useStatusLine } from '../../../components/status-line';
import { textRules } from '../../../lib/text-rules';
import { type HoldSubjects, type OpenHold, placeHold, releaseHold, subjectName } from '../holds.api';

const LABELS = { reason: 'Reason' };
type Values = { reason: string };

export function PlaceHoldDialog({ subjects, onClose }: { subjects: HoldSubjects; onClose: () => void }) {
  const announce = useStatusLine();
  const { recipe, machine } = subjects;
  const [kind, setKind] = useState<OpenHold['subject']>(recipe === undefined ? 'machine' : 'recipe');
  const form = useSummaryForm<Values>({ defaultValues: { reason: '' } });
  const { errors, isSubmitting } = form.formState;
  const name = subjectName(subjects, kind);
  const submit = async ({ reason }: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await placeHold(kind === 'recipe' ? { recipeId: recipe?.id ?? '' } : { machineId: machine?.id ?? '' }, reason, idempotencyKey);
    announce(`${name} is on hold. Everybody in the shop gets a mail.`);
    onClose();
  };
  return (
    <Dialog title="Place a hold" onClose={onClose}>
      <Form form={form} labels={LABELS} onSubmit={submit}>
        {recipe !== undefined && machine !== undefined ? (
          <Segmented
            size="glove"
            label="What is held"
            isWide
            choices={[
              { value: 'recipe', label: subjectName(subjects, 'recipe') },
              { value: 'machine', label: machine.name },
            ]}
            value={kind}
            onChange={setKind}
          />
        ) : (
          <p>
            On hold: <b>{name}</b>
          </p>
        )}
        <TextAreaField
          label={LABELS.reason}
          help="Whoever stands at the machine reads it first. No run starts until a lead releases the hold."
          error={errors.reason?.message}
          {...form.register('reason', textRules('Say why: it is the first thing that is read at the machine', 1000))}
        />
        <Button type="submit" kind="danger" size="glove" isBusy={isSubmitting}>
          Put {kind === 'recipe' ? recipe?.code : name} on hold
        </Button>
      </Form>
    </Dialog>
  );
}

export function ReleaseHoldDialog({ hold, onClose }: { hold: OpenHold; onClose: () => void }) {
  const announce = useStatusLine();
  const form = useSummaryForm<Values>({ defaultValues: { reason: '' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ reason }: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await releaseHold(hold.id, reason, idempotencyKey);
    announce('The hold is released. Runs can start again.');
    onClose();
  };
  return (
    <Dialog title="Release the hold" onClose={onClose}>
      <Form form={form} labels={LABELS} onSubmit={submit}>
        <p>
          {hold.placedBy} wrote: {hold.reason}
        </p>
        <TextAreaField
          label={LABELS.reason}
          help="What was found, and why it may be used again. It is kept in the ledger."
          error={errors.reason?.message}
          {...form.register('reason', textRules('Say what was found and why it may be used again', 1000))}
        />
        <Button type="submit" kind="primary" size="glove" isBusy={isSubmitting}>
          Release the hold
        </Button>
      </Form>
    </Dialog>
  );
}
