import { chakra } from '@chakra-ui/react';
import { type UseFormReturn, useFormState } from 'react-hook-form';
import { NumberField, SelectField, TextField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { shopLengthUnit } from '../../../lib/format';
import type { Choice, Machine, MachineLens, ShopCaution } from '../coupons.api';
import { NeverMarked } from './never-marked';
import type { PlanValues } from './plan-values';

export type GroundChoices = {
  machines: readonly Machine[];
  lenses: readonly MachineLens[];
  materials: readonly Choice[];
  finishes: readonly Choice[];
  effects: readonly Choice[];
};

const optionsOf = (choices: readonly Choice[]) => choices.map(({ id, name }) => ({ value: id, label: name }));

export type GroundFieldsProps = {
  form: UseFormReturn<PlanValues>;
  choices: GroundChoices;
  /** Cautions that say never; each stands under the material that it is about. */
  never: readonly ShopCaution[];
};

/** Which coupon it is: machine, lens, material, finish and the effect that is wanted. */
export function GroundFields({ form, choices, never }: GroundFieldsProps) {
  const { errors } = useFormState({ control: form.control });
  const at = (name: string) => messageAt(errors, name);
  return (
    <chakra.div display="grid" gridTemplateColumns="repeat(2, minmax(0, 1fr))" gap="2" rowGap="3" alignItems="start">
      <SelectField
        label="Machine"
        placeholder="Choose"
        {...form.register('machineId')}
        error={at('machineId')}
        options={optionsOf(choices.machines)}
      />
      <SelectField
        label="Lens"
        placeholder="Choose"
        {...form.register('lensId')}
        error={at('lensId')}
        options={choices.lenses.map(({ lensId, lensName }) => ({ value: lensId, label: lensName }))}
      />
      <SelectField
        label="Material"
        placeholder="Choose"
        {...form.register('materialId')}
        error={at('materialId')}
        options={optionsOf(choices.materials)}
      />
      <SelectField
        label="Finish"
        placeholder="Choose"
        {...form.register('finishId')}
        error={at('finishId')}
        options={optionsOf(choices.finishes)}
      />
      {never.map((caution) => (
        <chakra.div key={caution.id} gridColumn="1 / -1">
          <NeverMarked caution={caution} />
        </chakra.div>
      ))}
      {/* The names of effects say what is kept and what goes: cut off they would be mistaken. */}
      <chakra.div gridColumn="1 / -1">
        <SelectField
          label="Effect wanted"
          placeholder="Choose"
          {...form.register('effectId')}
          error={at('effectId')}
          options={optionsOf(choices.effects)}
        />
      </chakra.div>
      <NumberField label="Thickness" unit={shopLengthUnit()} isOptional {...form.register('thicknessMm')} error={at('thicknessMm')} />
      <TextField label="Lot" isOptional {...form.register('lot')} error={at('lot')} />
      <chakra.div gridColumn="1 / -1">
        <TextField label="What it is for" isOptional {...form.register('title')} error={at('title')} />
      </chakra.div>
    </chakra.div>
  );
}
