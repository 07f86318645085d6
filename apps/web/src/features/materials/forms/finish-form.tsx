import { Button } from '../../../components/button';
import { TextAreaField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { changeFinish, createFinish, type Finish, type FinishBody } from '../materials.api';

const LABELS: Readonly<Record<keyof FinishBody, string>> = {
  name: 'Name',
  preparation: 'Before marking',
  treatment: 'After marking',
};

/** A finish; without one, a new finish. */
export function FinishForm({ finish, onDone }: { finish?: Finish | undefined; onDone: () => void }) {
  const form = useSummaryForm<FinishBody>({
    defaultValues: { name: finish?.name ?? '', preparation: finish?.preparation ?? '', treatment: finish?.treatment ?? '' },
  });
  const { errors, isSubmitting } = form.formState;
  const submit = async (typed: FinishBody, { idempotencyKey }: { idempotencyKey: string }) => {
    const body = { name: typed.name.trim(), preparation: typed.preparation.trim(), treatment: typed.treatment.trim() };
    await (finish === undefined ? createFinish(body, idempotencyKey) : changeFinish(finish, body));
    onDone();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <TextField
        label={LABELS.name}
        autoComplete="off"
        help="Such as brushed, bead-blasted or black anodised."
        error={errors.name?.message}
        {...form.register('name', { validate: (text) => text.trim() !== '' || 'Name the finish, such as brushed or black anodised.' })}
      />
      <TextAreaField
        label={LABELS.preparation}
        isOptional
        rows={2}
        help="Cleaned, degreased, passivated, oiled; direction of the grain."
        error={errors.preparation?.message}
        {...form.register('preparation')}
      />
      <TextAreaField
        label={LABELS.treatment}
        isOptional
        rows={2}
        help="Wipe, brush, passivate, seal."
        error={errors.treatment?.message}
        {...form.register('treatment')}
      />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        {finish === undefined ? 'Add the finish' : 'Save the finish'}
      </Button>
    </Form>
  );
}
