import { chakra } from '@chakra-ui/react';
import { PANEL_UNITS } from '@proofplate/physics';
import { ASSIST_LABELS, FILL_LABELS, type Panel, type ParameterKey } from '@proofplate/recipe-model';
import { type UseFormReturn, useFormState, useWatch } from 'react-hook-form';
import { NumberField, SelectField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import type { PlanValues } from './plan-values';

const options = (labels: Readonly<Record<string, string>>) => Object.entries(labels).map(([value, label]) => ({ value, label }));
const FILL_OPTIONS = options(FILL_LABELS);
const ASSIST_OPTIONS = options(ASSIST_LABELS);

export type SettingFieldsProps = {
  form: UseFormReturn<PlanValues>;
  name: 'base' | 'labelStep';
  panel: Panel;
  /** What the factors set, so that it has no field here. */
  varied?: readonly (ParameterKey | '')[];
};

/** A setting typed as the panel shows it, in the panel's order. */
export function SettingFields({ form, name, panel, varied = [] }: SettingFieldsProps) {
  const { errors } = useFormState({ control: form.control });
  const fill = useWatch({ control: form.control, name: `${name}.fill` });
  const fields = panel.fields.filter(
    ({ parameter }) => !varied.includes(parameter) && !(parameter === 'lineSpacingUm' && fill === 'outline'),
  );
  return (
    <chakra.div display="grid" gridTemplateColumns="repeat(2, minmax(0, 1fr))" gap="2" rowGap="3" alignItems="start">
      {fields.map(({ parameter, label, unit }) => (
        <NumberField
          key={parameter}
          label={label}
          unit={PANEL_UNITS[unit].symbol}
          {...form.register(`${name}.values.${parameter}`)}
          error={messageAt(errors, `${name}.values.${parameter}`)}
        />
      ))}
      <SelectField label="Fill" {...form.register(`${name}.fill`)} options={FILL_OPTIONS} />
      <SelectField label="Assist" {...form.register(`${name}.assist`)} options={ASSIST_OPTIONS} />
    </chakra.div>
  );
}
