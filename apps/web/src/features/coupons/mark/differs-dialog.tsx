import { chakra } from '@chakra-ui/react';
import { PANEL_UNITS } from '@proofplate/physics';
import { enterValue, PARAMETER_KEYS, type Panel, type ParameterKey, sameValue, showValue } from '@proofplate/recipe-model';
import { useForm } from 'react-hook-form';
import { Button } from '../../../components/button';
import { Dialog } from '../../../components/dialog';
import { NumberField, TextField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { ProblemError } from '../../../lib/api';
import { fieldNameFromPointer } from '../../../lib/form-problem';
import { decimalSignOf, typedNumber } from '../../../lib/read-number';
import type { CouponCell, MarkBody } from '../coupons.api';

type Actual = NonNullable<MarkBody['actual']>;
type Values = { actual: Partial<Record<ParameterKey, string>>; note: string };
export type Differs = { actual: Actual; note: string };

export type DiffersDialogProps = {
  cell: CouponCell;
  panel: Panel;
  locale: string;
  onClose: () => void;
  /** Throws the refusal, so that it stands at its field. */
  onDiffers: (differs: Differs) => Promise<void>;
};

/** What was really dialled in, where it is not what the plan says. */
export function DiffersDialog({ cell, panel, locale, onClose, onDiffers }: DiffersDialogProps) {
  const fields = panel.fields.filter(({ parameter }) => cell.parameters.values[parameter] !== undefined);
  const planned = (parameter: ParameterKey) => {
    const field = panel.fields.find((own) => own.parameter === parameter);
    const value = cell.parameters.values[parameter];
    return field === undefined || value === undefined ? '' : typedNumber(showValue(field, value)?.value, locale);
  };
  const form = useForm<Values>({
    defaultValues: { actual: Object.fromEntries(fields.map(({ parameter }) => [parameter, planned(parameter)])), note: '' },
  });
  const read = (parameter: ParameterKey, text: string) => {
    const field = panel.fields.find((own) => own.parameter === parameter);
    return field === undefined ? undefined : enterValue(field, text, { decimalSign: decimalSignOf(locale) });
  };
  const submit = async ({ actual, note }: Values) => {
    const changed: Actual = {};
    for (const key of PARAMETER_KEYS) {
      const entry = actual[key] === undefined ? undefined : read(key, actual[key]);
      const value = cell.parameters.values[key];
      if (entry?.kind === 'accepted' && (value === undefined || !sameValue(value, entry.value))) changed[key] = entry.value.entered;
    }
    if (Object.keys(changed).length === 0) {
      form.setError('root', { message: 'Nothing differs from the plan. Change a value, or close this and choose Marked.' });
      return;
    }
    try {
      await onDiffers({ actual: changed, note });
    } catch (error) {
      if (!(error instanceof ProblemError)) throw error;
      for (const { pointer, detail } of error.errors) form.setError(fieldNameFromPointer(pointer) as 'note', { message: detail });
      if (error.errors.length === 0) form.setError('root', { message: `Not saved. ${error.detail}` });
    }
  };
  return (
    <Dialog title={`${cell.address}: what was really used`} onClose={onClose}>
      <chakra.form noValidate onSubmit={(event) => void form.handleSubmit(submit)(event)} display="grid" gap="3">
        {fields.map(({ parameter, label, unit }) => (
          <NumberField
            key={parameter}
            size="glove"
            label={label}
            unit={PANEL_UNITS[unit].symbol}
            help={`planned ${planned(parameter)}`}
            error={messageAt(form.formState.errors, `actual.${parameter}`)}
            {...form.register(`actual.${parameter}`, {
              validate: (text = '') => {
                const entry = read(parameter, text);
                return entry?.kind === 'refused' ? entry.message : true;
              },
            })}
          />
        ))}
        <TextField size="glove" label="Why" isOptional {...form.register('note')} error={messageAt(form.formState.errors, 'note')} />
        {form.formState.errors.root !== undefined && (
          <chakra.p role="alert" color="oxide.fg">
            {form.formState.errors.root.message}
          </chakra.p>
        )}
        <Button kind="primary" size="primaryAct" type="submit" shape="wide" isBusy={form.formState.isSubmitting}>
          Marked like this
        </Button>
      </chakra.form>
    </Dialog>
  );
}
