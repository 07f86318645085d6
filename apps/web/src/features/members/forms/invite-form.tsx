import { Button } from '../../../components/button';
import { SelectField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { ROLE_OPTIONS } from '../../../lib/roles';
import type { Role } from '../../../lib/session';
import { invite } from '../members.api';

const LABELS = { email: 'E-mail', role: 'Role' };
type Values = { email: string; role: Role };

export function InviteForm({ onInvited }: { onInvited: (email: string) => void }) {
  const form = useSummaryForm<Values>({ defaultValues: { email: '', role: 'operator' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async (values: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await invite(values, idempotencyKey);
    onInvited(values.email);
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <TextField
        label={LABELS.email}
        type="email"
        autoComplete="off"
        autoCapitalize="none"
        spellCheck={false}
        help="A link to join goes there. It works once, for three days."
        error={errors.email?.message}
        {...form.register('email', {
          required: 'Enter the address of the person',
          pattern: { value: /^[^\s@]+@[^\s@]+\.[^\s@]+$/, message: 'Enter an address like name@shop.example' },
        })}
      />
      <SelectField label={LABELS.role} options={ROLE_OPTIONS} error={errors.role?.message} {...form.register('role')} />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        Send the invitation
      </Button>
    </Form>
  );
}
