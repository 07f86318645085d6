import { Button } from '../../../components/button';
import { NumberField, TextAreaField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { messageOf, type NumberRule, readNumber, typedLength } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { changeLens, createLens, type Lens, type LensBody } from '../lenses.api';

type Values = { name: string; focalLengthMm: string; fieldSizeMm: string; notes: string };

const LABELS: Readonly<Record<keyof Values, string>> = {
  name: 'Name',
  focalLengthMm: 'Focal length',
  fieldSizeMm: 'Side of the marking field',
  notes: 'Notes',
};
const FOCAL: NumberRule = { what: 'The focal length', unit: 'mm', least: 10, most: 2000, isShopLength: true };
const FIELD: NumberRule = { what: 'The field size', unit: 'mm', least: 1, most: 3000, isShopLength: true };

/** A lens; without one, a new lens. */
export function LensForm({ lens, onDone }: { lens?: Lens | undefined; onDone: () => void }) {
  const { locale } = useSession().shop;
  const form = useSummaryForm<Values>({
    defaultValues: {
      name: lens?.name ?? '',
      focalLengthMm: typedLength(lens?.focalLengthMm, locale),
      fieldSizeMm: typedLength(lens?.fieldSizeMm, locale),
      notes: lens?.notes ?? '',
    },
  });
  const { errors, isSubmitting } = form.formState;
  const submit = async (values: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    const body = bodyOf(values, locale);
    await (lens === undefined ? createLens(body, idempotencyKey) : changeLens(lens, body));
    onDone();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <TextField
        label={LABELS.name}
        help="As people on the floor call it, such as F163."
        autoComplete="off"
        error={errors.name?.message}
        {...form.register('name', {
          validate: (text) => text.trim() !== '' || 'Give the lens a name, such as the one written on its rim.',
        })}
      />
      <NumberField
        label={LABELS.focalLengthMm}
        rule={FOCAL}
        error={errors.focalLengthMm?.message}
        {...form.register('focalLengthMm', { validate: (text) => messageOf(readNumber(text, FOCAL, locale)) })}
      />
      <NumberField
        label={LABELS.fieldSizeMm}
        rule={FIELD}
        help="Of the square that the lens can mark."
        error={errors.fieldSizeMm?.message}
        {...form.register('fieldSizeMm', { validate: (text) => messageOf(readNumber(text, FIELD, locale)) })}
      />
      <TextAreaField label={LABELS.notes} isOptional error={errors.notes?.message} {...form.register('notes')} />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        {lens === undefined ? 'Add the lens' : 'Save the lens'}
      </Button>
    </Form>
  );
}

function bodyOf(values: Values, locale: string): LensBody {
  const number = (text: string, rule: NumberRule) => {
    const read = readNumber(text, rule, locale);
    // checked before; were it not, the server would refuse null at the field
    return 'value' in read ? read.value : Number.NaN;
  };
  return {
    name: values.name.trim(),
    focalLengthMm: number(values.focalLengthMm, FOCAL),
    fieldSizeMm: number(values.fieldSizeMm, FIELD),
    notes: values.notes.trim(),
  };
}
