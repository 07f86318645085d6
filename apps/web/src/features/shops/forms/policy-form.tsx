import { chakra } from '@chakra-ui/react';
import { Controller, type FieldPath } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField } from '../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../components/form';
import { PasswordField } from '../../../components/password-field';
import { useStatusLine } from '../../../components/status-line';
import { Switch } from '../../../components/switch';
import { formatEntered } from '../../../lib/format';
import { changeShop, type Shop, type ShopPolicy } from '../shops.api';

type PolicyNumber = 'minimumConfirmationMarks' | 'reviewEveryDays' | 'calibrationAgeDays' | 'powerShiftPercent';
/** Accounts have no second factor yet, so the rules cannot ask for one. */
type PolicySwitch = Exclude<keyof ShopPolicy, PolicyNumber | 'secondFactorForSigning'>;
type Values = { policy: Record<PolicyNumber, string> & Record<PolicySwitch, boolean>; password: string };

type NumberRule = { name: PolicyNumber; label: string; unit: string; least: number; most: number; isWhole: boolean; help?: string };
const NUMBER_RULES: readonly NumberRule[] = [
  { name: 'minimumConfirmationMarks', label: 'A confirmation needs at least', unit: 'marks', least: 1, most: 100, isWhole: true },
  { name: 'reviewEveryDays', label: 'An approved setting is re-proved after', unit: 'days', least: 1, most: 3650, isWhole: true },
  { name: 'calibrationAgeDays', label: 'A power table counts as fresh for', unit: 'days', least: 1, most: 3650, isWhole: true },
  {
    name: 'powerShiftPercent',
    label: 'Power may shift by',
    unit: '%',
    least: 0,
    most: 50,
    isWhole: false,
    help: 'Beyond it the recipes of the machine are due for a check.',
  },
];
const SWITCHES: readonly { name: PolicySwitch; label: string; help: string }[] = [
  { name: 'authorMaySign', label: 'Authors may sign their own revisions', help: 'Every print of such a revision says so.' },
  { name: 'photoRequired', label: 'Approval needs a photo', help: 'Of the coupon or the confirmation it rests on.' },
  { name: 'overdueBlocks', label: 'An overdue setting blocks runs', help: 'Off: it is shown as due and may be run.' },
];

const LABELS: Readonly<Record<string, string>> = {
  ...Object.fromEntries(NUMBER_RULES.map(({ name, label }) => [`policy.${name}`, label])),
  ...Object.fromEntries(SWITCHES.map(({ name, label }) => [`policy.${name}`, label])),
  password: 'Your password',
};

/** Rules of signing; a change of them is itself a signed act. */
export function PolicyForm({ shop }: { shop: Shop }) {
  const form = useSummaryForm<Values>({ defaultValues: { policy: typed(shop.policy), password: '' } });
  const announce = useStatusLine();
  const { errors, isSubmitting } = form.formState;
  const submit = async ({ policy, password }: Values) => {
    await changeShop(shop, { policy: read(policy), password });
    form.resetField('password');
    announce('The rules are signed and in force.');
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      {NUMBER_RULES.map((rule) => {
        const name: FieldPath<Values> = `policy.${rule.name}`;
        return (
          <NumberField
            key={name}
            label={rule.label}
            unit={rule.unit}
            help={rule.help}
            error={messageAt(errors, name)}
            {...form.register(name, { validate: (text) => numberMessage(String(text), rule) })}
          />
        );
      })}
      {SWITCHES.map(({ name, label, help }) => (
        <Controller
          key={name}
          control={form.control}
          name={`policy.${name}`}
          render={({ field }) => <Switch label={label} help={help} isOn={field.value === true} onChange={field.onChange} />}
        />
      ))}
      <chakra.div borderTop="hairline" pt="4">
        <PasswordField
          label={LABELS.password ?? ''}
          autoComplete="current-password"
          help="You sign the rules: your name and the time go into the ledger."
          error={errors.password?.message}
          {...form.register('password', { required: 'Enter your password to sign the rules' })}
        />
      </chakra.div>
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        Sign the rules
      </Button>
    </Form>
  );
}

function numberMessage(text: string, { label, unit, least, most, isWhole }: NumberRule): string | true {
  const value = readNumber(text);
  const isRight = value >= least && value <= most && (!isWhole || Number.isInteger(value));
  return isRight || `${label} ${formatEntered(least)} to ${formatEntered(most)} ${unit}${isWhole ? ', a whole number' : ''}`;
}

function readNumber(text: string): number {
  return text.trim() === '' ? Number.NaN : Number(text.trim().replace(',', '.'));
}

function typed({ secondFactorForSigning: _, ...policy }: ShopPolicy): Values['policy'] {
  return {
    ...policy,
    minimumConfirmationMarks: String(policy.minimumConfirmationMarks),
    reviewEveryDays: String(policy.reviewEveryDays),
    calibrationAgeDays: String(policy.calibrationAgeDays),
    powerShiftPercent: formatEntered(policy.powerShiftPercent),
  };
}

function read(policy: Values['policy']): ShopPolicy {
  return {
    ...policy,
    secondFactorForSigning: false,
    minimumConfirmationMarks: readNumber(policy.minimumConfirmationMarks),
    reviewEveryDays: readNumber(policy.reviewEveryDays),
    calibrationAgeDays: readNumber(policy.calibrationAgeDays),
    powerShiftPercent: readNumber(policy.powerShiftPercent),
  };
}
