import { chakra } from '@chakra-ui/react';
import { Button } from '../../../components/button';
import { SelectField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import type { UnitSystem } from '../../../lib/session';
import { NUMBER_STYLE_OPTIONS, UNIT_SYSTEM_OPTIONS, zoneOptions } from '../../../lib/shop-options';
import { LONGEST_NAME, textRules } from '../../../lib/text-rules';
import { deviceTimeZone } from '../../../lib/time-zones';
import { signUp } from '../auth.api';
import { emailRules, nameRules, newPasswordRules, PASSWORD_HELP } from './credentials';

const LABELS = {
  shopName: 'Name of the shop',
  name: 'Your name',
  email: 'E-mail',
  password: 'Password',
  unitSystem: 'Units',
  timeZone: 'Time zone',
  locale: 'Numbers are written',
};

export function SignUpForm() {
  const form = useSummaryForm({
    defaultValues: {
      shopName: '',
      name: '',
      email: '',
      password: '',
      unitSystem: 'metric' as UnitSystem,
      timeZone: deviceTimeZone(),
      locale: deviceLocale(),
    },
  });
  const { errors, isSubmitting } = form.formState;
  return (
    <Form form={form} labels={LABELS} onSubmit={(values, { idempotencyKey }) => signUp(values, idempotencyKey)}>
      <TextField
        label={LABELS.shopName}
        autoComplete="organization"
        error={errors.shopName?.message}
        {...form.register('shopName', textRules('Enter the name that stands on set-up sheets', LONGEST_NAME))}
      />
      <TextField
        label={LABELS.name}
        autoComplete="name"
        help="Stands under what you sign."
        error={errors.name?.message}
        {...form.register('name', nameRules)}
      />
      <TextField
        label={LABELS.email}
        type="email"
        autoComplete="username"
        autoCapitalize="none"
        spellCheck={false}
        error={errors.email?.message}
        {...form.register('email', emailRules)}
      />
      <PasswordField
        label={LABELS.password}
        autoComplete="new-password"
        help={PASSWORD_HELP}
        error={errors.password?.message}
        {...form.register('password', newPasswordRules)}
      />
      <chakra.div display="grid" gridTemplateColumns={{ base: '1fr', sm: '1fr 1fr' }} gap="4">
        <SelectField
          label={LABELS.unitSystem}
          options={UNIT_SYSTEM_OPTIONS}
          error={errors.unitSystem?.message}
          {...form.register('unitSystem')}
        />
        <SelectField label={LABELS.locale} options={NUMBER_STYLE_OPTIONS} error={errors.locale?.message} {...form.register('locale')} />
      </chakra.div>
      <SelectField
        label={LABELS.timeZone}
        help="Signatures carry the local time with this zone."
        options={zoneOptions()}
        error={errors.timeZone?.message}
        {...form.register('timeZone')}
      />
      <Button type="submit" kind="primary" size="touch" shape="wide" isBusy={isSubmitting}>
        Open the shop
      </Button>
    </Form>
  );
}

function deviceLocale(): string {
  return new Intl.NumberFormat(navigator.language).format(1.5).includes(',') ? 'de-DE' : 'en-GB';
}
