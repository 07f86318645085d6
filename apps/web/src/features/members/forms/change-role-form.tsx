import { Button } from '../../../components/button';
import { SelectField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { ROLE_OPTIONS } from '../../../lib/roles';
import type { Role } from '../../../lib/session';
import { changeRole, type Member } from '../members.api';

const LABELS = { newRole: 'Role' };

export type ChangeRoleFormProps = { member: Member; onChanged: (role: Role) => void };

export function ChangeRoleForm({ member, onChanged }: ChangeRoleFormProps) {
  const form = useSummaryForm<{ newRole: Role }>({ defaultValues: { newRole: member.role } });
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ newRole }: { newRole: Role }) => {
    await changeRole(member, newRole);
    onChanged(newRole);
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <SelectField
        label={LABELS.newRole}
        help="Works from the next request on. What was signed before keeps the role it was signed with."
        options={ROLE_OPTIONS}
        error={errors.newRole?.message}
        {...form.register('newRole')}
      />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        Change the role
      </Button>
    </Form>
  );
}
