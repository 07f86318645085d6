import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { SelectField, TextAreaField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { TextLink } from '../../../components/text-link';
import { paths } from '../../../lib/paths';
import { useSession } from '../../../lib/session';
import { dayInZone } from '../../../lib/shop-time';
import { type AskedSetting, askForSetting } from '../requests.api';

const LABELS = { materialId: 'Material', jobReference: 'Job', neededOn: 'Needed by', note: 'Note' };
type Values = { materialId: string; jobReference: string; neededOn: string; note: string };
export type AskFormProps = {
  asked: AskedSetting;
  /** Materials of the shop, for a sentence that names none. */
  materials: readonly { id: string; name: string }[];
  /** What was typed instead of it. */
  words: string;
};

/** The sentence goes along as it stands; only what it doesn't say is asked. */
export function AskForm({ asked, materials, words }: AskFormProps) {
  const { shop } = useSession();
  const today = dayInZone(new Date(), shop.timeZone);
  const [isSent, setIsSent] = useState(false);
  const form = useSummaryForm<Values>({
    defaultValues: {
      materialId: asked.materialId ?? '',
      jobReference: '',
      neededOn: '',
      note: words === '' ? '' : `Looked for “${words}”.`,
    },
  });
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ neededOn, ...rest }: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await askForSetting({ ...asked, ...rest, ...(neededOn === '' ? {} : { neededOn }) }, idempotencyKey);
    setIsSent(true);
  };
  return (
    <chakra.section aria-labelledby="ask-title">
      <chakra.h2 id="ask-title">Ask for this setting</chakra.h2>
      {isSent ? (
        <p role="status">
          The operators and leads see it with your sentence filled in. What becomes of it stands under{' '}
          <TextLink to={paths.requests}>Requests</TextLink>.
        </p>
      ) : (
        <>
          <chakra.p color="fg.muted" mb="3">
            The operators and leads see it with your sentence filled in.
          </chakra.p>
          <Form form={form} labels={LABELS} onSubmit={submit}>
            {asked.materialId === undefined && (
              <SelectField
                label={LABELS.materialId}
                placeholder="Choose what is marked"
                options={materials.map(({ id, name }) => ({ value: id, label: name }))}
                minHeight={{ base: 'glove', lg: 'act' }}
                error={errors.materialId?.message}
                {...form.register('materialId', { required: 'Choose what is marked' })}
              />
            )}
            <chakra.div display="grid" gridTemplateColumns={{ base: '1fr', sm: '1fr 1fr' }} gap="4">
              <TextField label={LABELS.jobReference} isOptional size="glove" autoComplete="off" {...form.register('jobReference')} />
              <TextField
                label={LABELS.neededOn}
                isOptional
                size="glove"
                type="date"
                error={errors.neededOn?.message}
                min={today}
                {...form.register('neededOn', { validate: (day) => day === '' || day >= today || 'Enter today or a later day.' })}
              />
            </chakra.div>
            <TextAreaField label={LABELS.note} isOptional rows={2} {...form.register('note')} />
            <Button type="submit" size="glove" isBusy={isSubmitting} justifySelf="start">
              Ask for this setting
            </Button>
          </Form>
        </>
      )}
    </chakra.section>
  );
}
