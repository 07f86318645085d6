import { Button } from '../../../components/button';
import { Form, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import { useSession } from '../../../lib/session';
import { signIn } from '../auth.api';

const LABELS = { password: 'Password' };

export type ChangeShopFormProps = { shop: { id: string; name: string }; onChanged: () => void };

export function ChangeShopForm({ shop, onChanged }: ChangeShopFormProps) {
  const { person } = useSession();
  const form = useSummaryForm({ defaultValues: { password: '' } });
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ password }: { password: string }) => {
    await signIn({ email: person.email, password, shopId: shop.id });
    onChanged();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <PasswordField
        label={LABELS.password}
        autoComplete="current-password"
        error={errors.password?.message}
        {...form.register('password', { required: 'Enter your password' })}
      />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        Work in {shop.name}
      </Button>
    </Form>
  );
}
