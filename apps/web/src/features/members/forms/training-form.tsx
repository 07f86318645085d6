import { Button } from '../../../components/button';
import { TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { textRules } from '../../../lib/text-rules';
import { addTraining, type Member } from '../members.api';

const LABELS = { subject: 'What was taught', taughtBy: 'Who taught it', taughtOn: 'When', expiresOn: 'Counts until' };
type Values = { subject: string; taughtBy: string; taughtOn: string; expiresOn: string };

export function TrainingForm({ member, onAdded }: { member: Member; onAdded: (subject: string) => void }) {
  const form = useSummaryForm<Values>({ defaultValues: { subject: '', taughtBy: '', taughtOn: '', expiresOn: '' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ expiresOn, ...values }: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await addTraining(member, { ...values, ...(expiresOn === '' ? {} : { expiresOn }) }, idempotencyKey);
    onAdded(values.subject);
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <TextField
        label={LABELS.subject}
        help="Laser safety, the rotary device, fire watch: as your shop calls it."
        error={errors.subject?.message}
        {...form.register('subject', textRules('Say what was taught', 200))}
      />
      <TextField
        label={LABELS.taughtBy}
        error={errors.taughtBy?.message}
        {...form.register('taughtBy', textRules('Say who taught it', 120))}
      />
      <TextField
        label={LABELS.taughtOn}
        type="date"
        error={errors.taughtOn?.message}
        {...form.register('taughtOn', { required: 'Give the day of the training' })}
      />
      <TextField
        label={LABELS.expiresOn}
        type="date"
        isOptional
        help="Leave it empty when it does not run out."
        error={errors.expiresOn?.message}
        {...form.register('expiresOn')}
      />
      <p>A record stays as it is. If something in it is wrong, add another one that is right.</p>
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        Write it down
      </Button>
    </Form>
  );
}
