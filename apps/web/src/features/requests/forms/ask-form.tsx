import { chakra } from '@chakra-ui/react';
import { useState } from 'react';
import { Button } from '../../../components/button';
import { TextAreaField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { TextLink } from '../../../components/text-link';
import { paths } from '../../../lib/paths';
import { type AskedSetting, askForSetting } from '../requests.api';

const LABELS = { jobReference: 'Job', neededOn: 'Needed by', note: 'Note' };
type Values = { jobReference: string; neededOn: string; note: string };

/** The sentence goes along as it stands; only what it doesn't say is asked. */
export function AskForm({ asked }: { asked: AskedSetting }) {
  const [isSent, setIsSent] = useState(false);
  const form = useSummaryForm<Values>({ defaultValues: { jobReference: '', neededOn: '', note: '' } });
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
            <chakra.div display="grid" gridTemplateColumns={{ base: '1fr', sm: '1fr 1fr' }} gap="4">
              <TextField label={LABELS.jobReference} isOptional size="glove" autoComplete="off" {...form.register('jobReference')} />
              <TextField
                label={LABELS.neededOn}
                isOptional
                size="glove"
                type="date"
                error={errors.neededOn?.message}
                {...form.register('neededOn')}
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
