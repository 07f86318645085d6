import { Button } from '../../../components/button';
import { Form, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import type { ProblemError } from '../../../lib/api';
import { resetPassword } from '../auth.api';
import { newPasswordRules, PASSWORD_HELP } from './credentials';

const LABELS = { password: 'New password' };

export type ResetPasswordFormProps = { token: string; onDone: () => void };

export function ResetPasswordForm({ token, onDone }: ResetPasswordFormProps) {
  const form = useSummaryForm({ defaultValues: { password: '' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ password }: { password: string }) => {
    await resetPassword({ token, password });
    onDone();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit} explain={explainToken}>
      <PasswordField
        label={LABELS.password}
        autoComplete="new-password"
        help={PASSWORD_HELP}
        error={errors.password?.message}
        {...form.register('password', newPasswordRules)}
      />
      <Button type="submit" kind="primary" size="touch" shape="wide" isBusy={isSubmitting}>
        Set the password
      </Button>
    </Form>
  );
}

function explainToken({ code }: ProblemError) {
  if (code === 'reset-not-usable') return { what: 'This link was used or is too old.', todo: 'Ask for a new one.' };
  return undefined;
}
