import { Button } from '../../../../components/button';
import { SelectField, TextAreaField, TextField } from '../../../../components/field';
import { Form, useSummaryForm } from '../../../../components/form';
import type { Coupon } from '../../coupons.api';
import { correctCoupon } from '../log.api';

type CorrectionFields = { cellId: string; text: string; reason: string };
const LABELS = { cellId: 'About', text: 'What is right instead', reason: 'Why it is corrected' };

/** Says beside a sealed coupon what is right instead. */
export function CorrectionForm({ coupon, onDone }: { coupon: Coupon; onDone: () => void }) {
  const form = useSummaryForm<CorrectionFields>({ defaultValues: { cellId: '', text: '', reason: '' } });
  const { errors, isSubmitting } = form.formState;
  const handleSubmit = async ({ cellId, text, reason }: CorrectionFields, { idempotencyKey }: { idempotencyKey: string }) => {
    await correctCoupon(coupon.id, { ...(cellId === '' ? {} : { cellId }), text, reason }, idempotencyKey);
    onDone();
  };
  const required = (message: string) => ({ validate: (value: string) => value.trim() !== '' || message });
  return (
    <Form form={form} labels={LABELS} onSubmit={handleSubmit}>
      <SelectField
        label={LABELS.cellId}
        options={[
          { value: '', label: 'the whole coupon' },
          ...coupon.cells.map(({ id, address }) => ({ value: id, label: `cell ${address}` })),
        ]}
        error={errors.cellId?.message}
        {...form.register('cellId')}
      />
      <TextAreaField
        label={LABELS.text}
        error={errors.text?.message}
        maxLength={2000}
        {...form.register('text', required('Write what is right instead.'))}
      />
      <TextField
        label={LABELS.reason}
        error={errors.reason?.message}
        maxLength={500}
        {...form.register('reason', required('Write why it is corrected.'))}
      />
      <Button kind="primary" type="submit" isBusy={isSubmitting}>
        Add the correction
      </Button>
    </Form>
  );
}
