import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { SelectField, TextAreaField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { useStatusLine } from '../../../components/status-line';
import { textRules } from '../../../lib/text-rules';
import { answerRequest, type SettingRequest } from '../requests.api';

const LABELS = { state: 'What became of it', answer: 'Answer' };
type Values = { state: 'answered' | 'closed'; answer: string };

export function AnswerDialog({ request, onClose }: { request: SettingRequest; onClose: () => void }) {
  const announce = useStatusLine();
  const form = useSummaryForm<Values>({ defaultValues: { state: 'answered', answer: '' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async (values: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await answerRequest(request.id, values, idempotencyKey);
    announce(`${request.askedBy} sees the answer under Requests.`);
    onClose();
  };
  return (
    <Dialog title="Answer the request" onClose={onClose}>
      <Form form={form} labels={LABELS} onSubmit={submit}>
        <SelectField
          label={LABELS.state}
          options={[
            { value: 'answered', label: 'There is a setting now' },
            { value: 'closed', label: 'There will be none' },
          ]}
          {...form.register('state')}
        />
        <TextAreaField
          label={LABELS.answer}
          help="The code of the recipe, or why there will be none."
          error={errors.answer?.message}
          {...form.register('answer', textRules('Say what became of it', 1000))}
        />
        <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
          Answer {request.askedBy}
        </Button>
      </Form>
    </Dialog>
  );
}
