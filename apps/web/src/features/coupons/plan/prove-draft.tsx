import { Button } from '../../../components/button';
import { NumberField, TextField } from '../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../components/form';
import { ProblemError } from '../../../lib/api';
import { messageOf, type NumberRule, readNumber, readOptionalNumber } from '../../../lib/read-number';
import { type Coupon, planConfirmation } from '../coupons.api';

type ProofValues = { count: string; lot: string; thicknessMm: string; storedAt: string };

const COUNT: NumberRule = { what: 'The number of cells', unit: '', least: 1, most: 60, isWhole: true };
const THICKNESS: NumberRule = { what: 'The thickness', unit: 'mm', least: 0.001, most: 1000, isShopLength: true };
const LABELS = { count: 'Equal cells', lot: 'Lot', thicknessMm: 'Thickness', storedAt: 'Kept at' };
/** What a shop asks for unless it says otherwise, and one to spare. */
const USUAL_COUNT = '5';

export type ProveDraftProps = { revisionId: string; locale: string; onPlanned: (coupon: Coupon) => void };

/** A coupon of equal cells with exactly the setting of a draft. */
export function ProveDraft({ revisionId, locale, onPlanned }: ProveDraftProps) {
  const form = useSummaryForm<ProofValues>({ defaultValues: { count: USUAL_COUNT, lot: '', thicknessMm: '', storedAt: '' } });
  const at = (name: keyof ProofValues) => messageAt(form.formState.errors, name);
  const handleSubmit = async (values: ProofValues, { idempotencyKey }: { idempotencyKey: string }) => {
    const [count, thickness] = [readNumber(values.count, COUNT, locale), readOptionalNumber(values.thicknessMm, THICKNESS, locale)];
    if ('message' in count || 'message' in thickness) return;
    const { lot, storedAt } = values;
    const body = { revisionId, count: count.value, lot, storedAt, thicknessMm: thickness.value ?? null };
    onPlanned(await planConfirmation(body, idempotencyKey));
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={handleSubmit} explain={explain}>
      <NumberField
        label={LABELS.count}
        help="Each carries exactly the draft’s setting. What they differ in is what the process scatters by itself."
        {...form.register('count', { validate: (text) => messageOf(readNumber(text, COUNT, locale)) })}
        error={at('count')}
      />
      <TextField
        label={LABELS.lot}
        isOptional
        help="Another lot, or another day, proves more."
        {...form.register('lot')}
        error={at('lot')}
      />
      <NumberField
        label={LABELS.thicknessMm}
        rule={THICKNESS}
        isOptional
        {...form.register('thicknessMm', { validate: (text) => messageOf(readOptionalNumber(text, THICKNESS, locale)) })}
        error={at('thicknessMm')}
      />
      <TextField label={LABELS.storedAt} isOptional {...form.register('storedAt')} error={at('storedAt')} />
      <div>
        <Button kind="primary" type="submit" isBusy={form.formState.isSubmitting}>
          Plan the proof
        </Button>
      </div>
    </Form>
  );
}

function explain(problem: ProblemError) {
  return problem.status === 404
    ? { what: 'This draft is not in the shop, or no longer.', todo: 'Go back to Recipes and choose again.' }
    : undefined;
}
