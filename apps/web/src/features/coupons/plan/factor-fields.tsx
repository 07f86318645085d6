import { chakra } from '@chakra-ui/react';
import { PANEL_UNITS } from '@proofplate/physics';
import { LEVEL_SPACING_LABELS, type LevelSpacing, type Panel } from '@proofplate/recipe-model';
import { type UseFormReturn, useFormState, useWatch } from 'react-hook-form';
import { NumberField, SelectField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { Panel as Card } from '../../../components/page';
import { Segmented } from '../../../components/segmented';
import { formatEntered } from '../../../lib/format';
import type { CouponPreview } from '../coupons.api';
import { type PlanValues, varying } from './plan-values';

const SPACINGS = (Object.entries(LEVEL_SPACING_LABELS) as [LevelSpacing, string][]).map(([value, label]) => ({ value, label }));

export type FactorFieldsProps = {
  form: UseFormReturn<PlanValues>;
  name: 'rows' | 'columns';
  panel: Panel;
  /** Levels as they will be marked; absent until the preview is there. */
  stored: CouponPreview['rowFactor'] | undefined;
};

/** What varies, from where to where, in how many levels. */
export function FactorFields({ form, name, panel, stored }: FactorFieldsProps) {
  const { parameter, spacing } = useWatch({ control: form.control, name });
  const field = panel.fields.find((own) => own.parameter === parameter);
  const unit = field === undefined ? '' : PANEL_UNITS[field.unit].symbol;
  const title = name === 'rows' ? 'Rows' : 'Columns';
  const { errors } = useFormState({ control: form.control });
  const at = (key: string) => messageAt(errors, `${name}.${key}`);
  const options = varying(panel);
  return (
    <Card p="4" display="grid" gap="3" aria-label={title}>
      <SelectField
        label={`${title}: what varies`}
        {...form.register(`${name}.parameter`)}
        error={at('parameter')}
        options={name === 'rows' ? [...options, { value: '', label: 'Nothing: one row' }] : options}
      />
      {field !== undefined && (
        <>
          <chakra.div display="grid" gridTemplateColumns="repeat(2, minmax(0, 1fr)) 88px" gap="2" alignItems="start">
            <NumberField label="From" unit={unit} {...form.register(`${name}.from`)} error={at('from')} />
            <NumberField label="To" unit={unit} {...form.register(`${name}.to`)} error={at('to')} />
            <NumberField label="Levels" {...form.register(`${name}.count`)} error={at('count')} />
          </chakra.div>
          <Segmented
            label={`${title}: spacing of the levels`}
            choices={SPACINGS}
            value={spacing}
            onChange={(next) => form.setValue(`${name}.spacing`, next, { shouldDirty: true })}
            isWide
          />
          {stored != null && stored.parameter === parameter && (
            <chakra.p fontSize="sm" lineHeight="sm" color="fg.muted">
              {stored.levels.map(({ entered }) => formatEntered(entered.value)).join(', ')} {unit}
            </chakra.p>
          )}
        </>
      )}
    </Card>
  );
}
