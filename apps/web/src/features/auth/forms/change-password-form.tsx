import { Button } from '../../../components/button';
import { Form, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import { changePassword } from '../auth.api';
import { newPasswordRules, PASSWORD_HELP } from './credentials';

const LABELS = { password: 'Present password', newPassword: 'New password' };

export function ChangePasswordForm({ onChanged }: { onChanged: () => void }) {
  const form = useSummaryForm({ defaultValues: { password: '', newPassword: '' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async (values: { password: string; newPassword: string }) => {
    await changePassword(values);
    form.reset();
    onChanged();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <PasswordField
        label={LABELS.password}
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register('password', { required: 'Enter the password you use now' })}
      />
      <PasswordField
        label={LABELS.newPassword}
        autoComplete="new-password"
        help={PASSWORD_HELP}
        error={errors.newPassword?.message}
        {...form.register('newPassword', newPasswordRules)}
      />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        Change the password
      </Button>
    </Form>
  );
}
