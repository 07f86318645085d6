import { useState } from 'react';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { NumberField, TextAreaField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { useStatusLine } from '../../../components/status-line';
import { useSession } from '../../../lib/session';
import { instantInZone } from '../../../lib/shop-time';
import { textRules } from '../../../lib/text-rules';
import { grantDeviation } from '../deviations.api';

const LABELS = { description: 'What may differ', reason: 'Why', endsAt: 'Ends at', maximumQuantity: 'Ends after' };
type Values = Record<keyof typeof LABELS, string>;
const EMPTY: Values = { description: '', reason: '', endsAt: '', maximumQuantity: '' };
const NO_END = 'Give an end, a number of parts, or both: a deviation ends by itself';

/** Settings that a deviation may depart from are approved ones. */
export type DeviationFrom = { revisionId: string; name: string };

/** A lead permits a departure from where it is asked for. */
export function GrantDeviationButton({ from, size = 'control' }: { from: DeviationFrom; size?: 'control' | 'glove' }) {
  const [isOpen, setIsOpen] = useState(false);
  return (
    <>
      <Button size={size} justifySelf="start" onClick={() => setIsOpen(true)}>
        Grant a deviation
      </Button>
      {isOpen && <GrantDeviationDialog from={from} onClose={() => setIsOpen(false)} />}
    </>
  );
}

function GrantDeviationDialog({ from: { revisionId, name }, onClose }: { from: DeviationFrom; onClose: () => void }) {
  const { shop } = useSession();
  const announce = useStatusLine();
  const form = useSummaryForm<Values>({ defaultValues: EMPTY });
  const { errors, isSubmitting } = form.formState;
  const submit = async (values: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    const { description, reason } = values;
    const endsAt = instantInZone(values.endsAt, shop.timeZone);
    const parts = values.maximumQuantity.trim();
    const limits = { ...(endsAt === undefined ? {} : { endsAt }), ...(parts === '' ? {} : { maximumQuantity: Number(parts) }) };
    await grantDeviation({ revisionId, description, reason, ...limits }, idempotencyKey);
    announce(`The deviation from ${name} is granted. Whoever starts a run can choose it.`);
    onClose();
  };
  return (
    <Dialog title={`Grant a deviation from ${name}`} onClose={onClose}>
      <Form form={form} labels={LABELS} onSubmit={submit}>
        <p>The approved setting stays as it is. A run that cites the deviation may depart from it as far as is said here.</p>
        <TextAreaField
          label={LABELS.description}
          help="The field of the panel or the step, and from where to where."
          error={errors.description?.message}
          {...form.register('description', textRules('Say what may differ and by how much', 1000))}
        />
        <TextAreaField
          label={LABELS.reason}
          rows={2}
          error={errors.reason?.message}
          {...form.register('reason', textRules('Say why', 1000))}
        />
        <TextField
          label={LABELS.endsAt}
          type="datetime-local"
          isOptional
          help={`By the shop’s clock, ${shop.timeZone}.`}
          error={errors.endsAt?.message}
          {...form.register('endsAt', {
            validate: (endsAt, { maximumQuantity }) => endsAt !== '' || maximumQuantity.trim() !== '' || NO_END,
          })}
        />
        <NumberField
          label={LABELS.maximumQuantity}
          unit="parts"
          isOptional
          help="Good and scrapped parts together."
          error={errors.maximumQuantity?.message}
          {...form.register('maximumQuantity', {
            validate: (parts) => /^\s*(\d{1,6})?\s*$/.test(parts) || 'Give a whole number of parts',
          })}
        />
        <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
          Grant the deviation
        </Button>
      </Form>
    </Dialog>
  );
}
