import { chakra } from '@chakra-ui/react';
import { Controller } from 'react-hook-form';
import { Button } from '../../../components/button';
import { Form, useSummaryForm } from '../../../components/form';
import { Segmented } from '../../../components/segmented';
import { addCaution } from '../cautions.api';
import { CAUTION_LABELS, CautionScopeFields, type CautionValues, CautionWords, scopeBody, typedScope } from './caution-fields';

const LEVELS = [
  { value: 'care', label: 'Take care' },
  { value: 'never', label: 'Never' },
] as const;
const NEW: CautionValues = { level: 'care', subject: '', text: '', source: '', appliesTo: typedScope({}) };

/** A caution of the shop's own. */
export function CautionForm({ onDone }: { onDone: () => void }) {
  const form = useSummaryForm<CautionValues>({ defaultValues: NEW });
  const level = form.watch('level');
  const submit = async ({ subject, text, source, appliesTo, ...values }: CautionValues, { idempotencyKey }: { idempotencyKey: string }) => {
    const words = { subject: subject.trim(), text: text.trim(), source: source.trim() };
    await addCaution({ ...values, ...words, appliesTo: scopeBody(appliesTo) }, idempotencyKey);
    onDone();
  };
  return (
    <Form form={form} labels={CAUTION_LABELS} onSubmit={submit}>
      <div>
        <Controller
          control={form.control}
          name="level"
          render={({ field }) => <Segmented label="How strong" choices={LEVELS} value={field.value} onChange={field.onChange} isWide />}
        />
        <chakra.p mt="1" fontSize="sm" lineHeight="sm" color="fg.muted">
          {level === 'never'
            ? 'Refuses planning, drafting and running. Nobody can turn it back into “take care”.'
            : 'Stands before the setting. It can be made stricter later, never looser.'}
        </chakra.p>
      </div>
      <CautionWords form={form} />
      <chakra.fieldset minW="0" display="grid" gap="4" borderTop="hairline" pt="4">
        <chakra.legend srOnly>What it applies to</chakra.legend>
        <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
          Choose nothing and it applies to all work. Every list that you choose from must hold at once.
        </chakra.p>
        <CautionScopeFields form={form} />
      </chakra.fieldset>
      <Button type="submit" kind="primary" size="touch" isBusy={form.formState.isSubmitting}>
        Add the caution
      </Button>
    </Form>
  );
}
