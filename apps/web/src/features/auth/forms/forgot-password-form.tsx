import { Button } from '../../../components/button';
import { TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { requestPasswordReset } from '../auth.api';
import { emailRules } from './credentials';

const LABELS = { email: 'E-mail' };

export function ForgotPasswordForm({ onSent }: { onSent: (email: string) => void }) {
  const form = useSummaryForm({ defaultValues: { email: '' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ email }: { email: string }) => {
    await requestPasswordReset(email);
    onSent(email);
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <TextField
        label={LABELS.email}
        type="email"
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        error={errors.email?.message}
        {...form.register('email', emailRules)}
      />
      <Button type="submit" kind="primary" size="touch" shape="wide" isBusy={isSubmitting}>
        Send a link
      </Button>
    </Form>
  );
}
