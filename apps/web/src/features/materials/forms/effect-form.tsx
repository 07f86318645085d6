import { chakra } from '@chakra-ui/react';
import {
  COMPARISON_LABELS,
  COMPARISONS,
  type Comparison,
  type Criterion,
  MEASUREMENT_QUANTITIES,
  type MeasurementQuantity,
  QUANTITIES,
} from '@proofplate/recipe-model';
import { type UseFormReturn, useFieldArray, useWatch } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField, SelectField, TextAreaField, TextField } from '../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../components/form';
import { CrossIcon, PlusIcon } from '../../../components/icons';
import { messageOf, type NumberRule, readNumber, typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { changeEffect, createEffect, type Effect } from '../effects.api';

type CriterionValues = { quantity: MeasurementQuantity; comparison: Comparison; value: string; upper: string };
type Values = { name: string; criteria: CriterionValues[]; notes: string };

const FIRST: CriterionValues = { quantity: 'contrast', comparison: 'at least', value: '', upper: '' };
const LARGEST = 1e6;

/** An effect with what a mark must meet; without one, a new effect. */
export function EffectForm({ effect, onDone }: { effect?: Effect | undefined; onDone: () => void }) {
  const { locale } = useSession().shop;
  const form = useSummaryForm<Values>({ defaultValues: valuesOf(effect, locale) });
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'criteria' });
  const { errors, isSubmitting } = form.formState;
  const submit = async (values: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    const criteria = values.criteria.map((criterion) => criterionOf(criterion, locale));
    const body = { name: values.name.trim(), criteria, notes: values.notes.trim() };
    await (effect === undefined ? createEffect(body, idempotencyKey) : changeEffect(effect, body));
    onDone();
  };
  return (
    <Form form={form} labels={labelsFor(fields.length)} onSubmit={submit}>
      <TextField
        label="Name"
        autoComplete="off"
        error={errors.name?.message}
        {...form.register('name', { validate: (text) => text.trim() !== '' || 'Name the effect, such as dark anneal.' })}
      />
      <chakra.fieldset minW="0" display="grid" gap="3">
        <chakra.legend fontWeight="semibold" mb="1">
          A mark must meet
        </chakra.legend>
        {fields.map(({ id }, index) => (
          <CriterionRow key={id} form={form} index={index} onRemove={() => remove(index)} />
        ))}
        <div>
          <Button icon={<PlusIcon />} onClick={() => append(FIRST)}>
            Add a demand
          </Button>
        </div>
      </chakra.fieldset>
      <TextAreaField
        label="Where they come from"
        isOptional
        rows={2}
        help="A drawing, a customer’s specification, or common practice."
        error={errors.notes?.message}
        {...form.register('notes')}
      />
      <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
        {effect === undefined ? 'Add the effect' : 'Save the effect'}
      </Button>
    </Form>
  );
}

type RowProps = { form: UseFormReturn<Values>; index: number; onRemove: () => void };

function CriterionRow({ form, index, onRemove }: RowProps) {
  const { locale } = useSession().shop;
  const { errors } = form.formState;
  const [quantity, comparison] = useWatch({ control: form.control, name: [`criteria.${index}.quantity`, `criteria.${index}.comparison`] });
  const { label, unit } = QUANTITIES[quantity];
  const rule: NumberRule = { what: 'The limit', unit: unit === '1' ? '' : unit, least: -LARGEST, most: LARGEST };
  const shownUnit = rule.unit === '' ? {} : { unit: rule.unit };
  const at = <Key extends string>(key: Key) => `criteria.${index}.${key}` as const;
  const upperMessage = (text: string) => {
    const [upper, lower] = [readNumber(text, rule, locale), readNumber(form.getValues(at('value')), rule, locale)];
    if ('message' in upper || 'message' in lower) return messageOf(upper);
    return upper.value > lower.value || 'Enter an upper limit above the lower one.';
  };
  return (
    <chakra.div bg="bg.subtle" border="hairline" borderRadius="md" p="3" display="grid" gap="3">
      <chakra.div display="grid" gridTemplateColumns="minmax(0, 1fr) auto" gap="2" alignItems="end">
        <SelectField
          label="Measured"
          options={MEASUREMENT_QUANTITIES.map((value) => ({ value, label: QUANTITIES[value].label }))}
          error={messageAt(errors, at('quantity'))}
          {...form.register(at('quantity'))}
        />
        <Button
          kind="quiet"
          size="touch"
          shape="square"
          icon={<CrossIcon />}
          aria-label={`Remove the demand on ${label.toLowerCase()}`}
          onClick={onRemove}
        />
      </chakra.div>
      <chakra.div
        display="grid"
        gap="3"
        gridTemplateColumns={{ base: '1fr', sm: `repeat(${comparison === 'between' ? 3 : 2}, minmax(0, 1fr))` }}
      >
        <SelectField
          label="Must be"
          options={COMPARISONS.map((value) => ({ value, label: COMPARISON_LABELS[value] }))}
          error={messageAt(errors, at('comparison'))}
          {...form.register(at('comparison'))}
        />
        <NumberField
          label={comparison === 'between' ? 'Lower limit' : 'Limit'}
          {...shownUnit}
          error={messageAt(errors, at('value'))}
          {...form.register(at('value'), { validate: (text) => messageOf(readNumber(text, rule, locale)) })}
        />
        {comparison === 'between' && (
          <NumberField
            label="Upper limit"
            {...shownUnit}
            error={messageAt(errors, at('upper'))}
            {...form.register(at('upper'), { validate: upperMessage, shouldUnregister: true })}
          />
        )}
      </chakra.div>
    </chakra.div>
  );
}

function labelsFor(count: number): Readonly<Record<string, string>> {
  const rows = Array.from({ length: count }, (_, index) => [
    [`criteria.${index}.quantity`, `Demand ${index + 1}, what is measured`],
    [`criteria.${index}.comparison`, `Demand ${index + 1}, comparison`],
    [`criteria.${index}.value`, `Demand ${index + 1}, limit`],
    [`criteria.${index}.upper`, `Demand ${index + 1}, upper limit`],
  ]);
  return { name: 'Name', ...Object.fromEntries(rows.flat()), notes: 'Where they come from' };
}

function valuesOf(effect: Effect | undefined, locale: string): Values {
  const criteria = (effect?.criteria ?? []).map(({ quantity, comparison, value, upper }) => ({
    quantity,
    comparison,
    value: typedNumber(value, locale),
    upper: typedNumber(upper, locale),
  }));
  return { name: effect?.name ?? '', criteria, notes: effect?.notes ?? '' };
}

function criterionOf({ quantity, comparison, value, upper }: CriterionValues, locale: string): Criterion {
  const { unit } = QUANTITIES[quantity];
  const rule: NumberRule = { what: 'The limit', unit: unit === '1' ? '' : unit, least: -LARGEST, most: LARGEST };
  // checked before; were it not, the server would refuse null at the field
  const number = (text: string) => {
    const read = readNumber(text, rule, locale);
    return 'value' in read ? read.value : Number.NaN;
  };
  return { quantity, comparison, value: number(value), ...(comparison === 'between' ? { upper: number(upper) } : {}), unit };
}
