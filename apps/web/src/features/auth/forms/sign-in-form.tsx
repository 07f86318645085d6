import { Button } from '../../../components/button';
import { TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import type { ProblemError } from '../../../lib/api';
import { signIn } from '../auth.api';
import { emailRules } from './credentials';

const LABELS = { email: 'E-mail', password: 'Password' };

const UNANSWERED = {
  what: 'No answer came from the server.',
  safe: 'You are not signed in. What you typed is still here.',
  todo: 'Check the network, then try again.',
};

export function SignInForm() {
  const form = useSummaryForm({ defaultValues: { email: '', password: '' } });
  const { errors, isSubmitting } = form.formState;
  return (
    <Form form={form} labels={LABELS} onSubmit={signIn} explain={explain} unanswered={UNANSWERED}>
      <TextField
        label={LABELS.email}
        type="email"
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        error={errors.email?.message}
        {...form.register('email', { required: emailRules.required })}
      />
      <PasswordField
        label={LABELS.password}
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register('password', { required: 'Enter your password' })}
      />
      <Button type="submit" kind="primary" size="touch" shape="wide" isBusy={isSubmitting}>
        Sign in
      </Button>
    </Form>
  );
}

function explain({ status }: ProblemError) {
  if (status === 401) return { what: 'E-mail and password do not go together.', todo: 'Check both, or ask for a new password below.' };
  if (status === 429) return { what: 'Too many tries for now.', todo: 'Wait a few minutes, then try again.' };
  return undefined;
}
