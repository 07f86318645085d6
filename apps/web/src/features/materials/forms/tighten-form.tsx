import { chakra } from '@chakra-ui/react';
import type { CautionScope } from '@proofplate/recipe-model';
import { Controller } from 'react-hook-form';
import { Button } from '../../../components/button';
import { Form, useSummaryForm } from '../../../components/form';
import { Switch } from '../../../components/switch';
import { type ShopCaution, tightenCaution } from '../cautions.api';
import { CAUTION_LABELS, CautionScopeFields, type CautionValues, CautionWords, scopeBody, typedScope } from './caution-fields';

/** Makes a caution stricter: care becomes never, and it may apply to more. The words of a shipped one stay. */
export function TightenForm({ caution, onDone }: { caution: ShopCaution; onDone: () => void }) {
  const { level, subject, text, source, appliesTo, allowedActions } = caution;
  const mayReword = allowedActions.includes('reword');
  const form = useSummaryForm<CautionValues>({ defaultValues: { level, subject, text, source, appliesTo: typedScope(appliesTo) } });
  const submit = async (values: CautionValues) => {
    const words = mayReword ? { subject: values.subject.trim(), text: values.text.trim(), source: values.source.trim() } : {};
    await tightenCaution(caution, {
      level: values.level,
      appliesTo: { ...keptFinishes(appliesTo), ...scopeBody(values.appliesTo) },
      ...words,
    });
    onDone();
  };
  return (
    <Form form={form} labels={CAUTION_LABELS} onSubmit={submit}>
      {mayReword ? (
        <CautionWords form={form} />
      ) : (
        <chakra.div>
          <b>{subject}</b>
          <chakra.p fontSize="sm" lineHeight="sm">
            {text}
          </chakra.p>
          <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
            The words of this caution stay. Add one of the shop’s own beside it to say more.
          </chakra.p>
        </chakra.div>
      )}
      {level === 'care' && (
        <Controller
          control={form.control}
          name="level"
          render={({ field }) => (
            <Switch
              label="Never mark what it applies to"
              help="Refuses planning, drafting and running. Nobody can turn it back."
              isOn={field.value === 'never'}
              onChange={(isOn) => field.onChange(isOn ? 'never' : 'care')}
            />
          )}
        />
      )}
      <CautionScopeFields form={form} kept={appliesTo} />
      <Button type="submit" kind="primary" size="touch" isBusy={form.formState.isSubmitting}>
        Tighten the caution
      </Button>
    </Form>
  );
}

/** The form has no list of finishes; a condition on them goes on holding. */
const keptFinishes = ({ finishIds }: CautionScope) => (finishIds === undefined ? {} : { finishIds });
