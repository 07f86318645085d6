import { Button } from '../../../components/button';
import { TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import type { ProblemError } from '../../../lib/api';
import { acceptInvitation, type InvitationPreview } from '../auth.api';
import { nameRules, newPasswordRules, PASSWORD_HELP } from './credentials';

const LABELS = { name: 'Your name', password: 'Password' };

export type AcceptInvitationFormProps = { token: string; invitation: InvitationPreview };

/** Somebody who works in another shop already proves it with their password; somebody new chooses one. */
export function AcceptInvitationForm({ token, invitation }: AcceptInvitationFormProps) {
  const form = useSummaryForm({ defaultValues: { name: '', password: '' } });
  const { errors, isSubmitting } = form.formState;
  const { hasAccount } = invitation;
  const submit = ({ name, password }: { name: string; password: string }) =>
    acceptInvitation(hasAccount ? { token, password } : { token, name, password });
  return (
    <Form form={form} labels={LABELS} onSubmit={submit} explain={explain}>
      {!hasAccount && (
        <TextField
          label={LABELS.name}
          autoComplete="name"
          help="Stands under what you sign."
          error={errors.name?.message}
          {...form.register('name', nameRules)}
        />
      )}
      <PasswordField
        label={LABELS.password}
        autoComplete={hasAccount ? 'current-password' : 'new-password'}
        help={hasAccount ? 'The password you use in your other shop.' : PASSWORD_HELP}
        error={errors.password?.message}
        {...form.register('password', hasAccount ? { required: 'Enter your password' } : newPasswordRules)}
      />
      <Button type="submit" kind="primary" size="touch" shape="wide" isBusy={isSubmitting}>
        Join {invitation.shopName}
      </Button>
    </Form>
  );
}

function explain({ code }: ProblemError) {
  if (code === 'wrong-credentials') return { what: 'The password is not the one you use in your other shop.', todo: 'Try again.' };
  if (code === 'invitation-not-usable')
    return { what: 'This invitation was used, withdrawn or is too old.', todo: 'Ask the owner for a new one.' };
  return undefined;
}
