import { Box, chakra, Flex } from '@chakra-ui/react';
import {
  COMPARISON_LABELS,
  COMPARISONS,
  criterionText,
  LIMITS_OF_QUANTITY,
  MEASUREMENT_QUANTITIES,
  QUANTITIES,
} from '@proofplate/recipe-model';
import { useFieldArray } from 'react-hook-form';
import { Button } from '../../../../components/button';
import { NumberField, SelectField } from '../../../../components/field';
import { Form, messageAt, useSummaryForm } from '../../../../components/form';
import { CrossIcon, PlusIcon } from '../../../../components/icons';
import { shopDecimalSign } from '../../../../lib/format';
import { messageOf, readNumber, typedNumber } from '../../../../lib/read-number';
import { type Criterion, recordCriteria } from '../log.api';

type CriterionFields = { quantity: Criterion['quantity']; comparison: Criterion['comparison']; value: string; upper: string };
type CriteriaFields = { criteria: CriterionFields[] };

export type CriteriaFormProps = {
  couponId: string;
  version: number;
  /** What stands in the fields at first. */
  criteria: readonly Criterion[];
  locale: string;
  onRecorded: () => void;
};

/** What a mark must meet; recorded before anything is judged, so that results cannot bend it. */
export function CriteriaForm({ couponId, version, criteria, locale, onRecorded }: CriteriaFormProps) {
  const form = useSummaryForm<CriteriaFields>({ defaultValues: { criteria: criteria.map((each) => fieldsOf(each, locale)) } });
  const { fields, append, remove } = useFieldArray({ control: form.control, name: 'criteria' });
  const labels = Object.fromEntries(
    fields.flatMap((_, index) => [
      [`criteria.${index}.quantity`, `What is measured, criterion ${index + 1}`],
      [`criteria.${index}.value`, `Limit of criterion ${index + 1}`],
      [`criteria.${index}.upper`, `Upper limit of criterion ${index + 1}`],
    ]),
  );
  const handleSubmit = async ({ criteria: typed }: CriteriaFields) => {
    await recordCriteria(
      couponId,
      version,
      typed.map((each) => criterionOf(each, locale)),
    );
    onRecorded();
  };
  return (
    <Form form={form} labels={labels} onSubmit={handleSubmit}>
      {fields.length === 0 && <chakra.p color="fg.muted">No measured criteria: ratings alone decide.</chakra.p>}
      {fields.map((field, index) => (
        <CriterionRow key={field.id} form={form} index={index} locale={locale} onRemove={() => remove(index)} />
      ))}
      <Flex gap="2" wrap="wrap">
        <Button kind="primary" type="submit" isBusy={form.formState.isSubmitting}>
          {fields.length === 0 ? 'Record: ratings alone decide' : 'Record the criteria'}
        </Button>
        <Button icon={<PlusIcon />} onClick={() => append({ quantity: 'lightness', comparison: 'at most', value: '', upper: '' })}>
          Add a criterion
        </Button>
      </Flex>
    </Form>
  );
}

type CriterionRowProps = { form: ReturnType<typeof useSummaryForm<CriteriaFields>>; index: number; locale: string; onRemove: () => void };

function CriterionRow({ form, index, locale, onRemove }: CriterionRowProps) {
  const name = `criteria.${index}` as const;
  const quantity = form.watch(`${name}.quantity`);
  const isBetween = form.watch(`${name}.comparison`) === 'between';
  const { unit } = QUANTITIES[quantity];
  const unitProps = unit === '1' ? {} : { unit };
  const error = (field: string) => messageAt(form.formState.errors, `${name}.${field}`);
  const validate = (what: string) => (text: string) => messageOf(readNumber(text, rule(what, quantity), locale));
  return (
    <Box
      display="grid"
      gridTemplateColumns={{ base: '1fr 1fr', sm: 'minmax(0, 5fr) minmax(0, 4fr) minmax(0, 3fr) auto' }}
      gap="2"
      alignItems="start"
    >
      <Box gridColumn={{ base: '1 / -1', sm: 'auto' }}>
        <SelectField
          label="What is measured"
          error={error('quantity')}
          options={MEASUREMENT_QUANTITIES.map((code) => ({ value: code, label: QUANTITIES[code].label }))}
          {...form.register(`${name}.quantity`)}
        />
      </Box>
      <SelectField
        label="Demand"
        options={COMPARISONS.map((code) => ({ value: code, label: COMPARISON_LABELS[code] }))}
        {...form.register(`${name}.comparison`)}
      />
      <Box display="grid" gap="2">
        <NumberField
          label={isBetween ? 'Lower limit' : 'Limit'}
          error={error('value')}
          {...unitProps}
          {...form.register(`${name}.value`, { validate: validate('The limit') })}
        />
        {isBetween && (
          <NumberField
            label="Upper limit"
            error={error('upper')}
            {...unitProps}
            {...form.register(`${name}.upper`, { validate: validate('The upper limit') })}
          />
        )}
      </Box>
      <Button kind="quiet" shape="square" mt="6" aria-label={`Take criterion ${index + 1} out`} icon={<CrossIcon />} onClick={onRemove} />
    </Box>
  );
}

/** The recorded criteria in words. */
export function CriteriaWords({ criteria }: { criteria: readonly Criterion[] }) {
  if (criteria.length === 0) return <p>No measured criteria: ratings alone decide.</p>;
  return (
    <ul>
      {criteria.map((criterion) => (
        <li key={`${criterion.quantity} ${criterion.comparison}`}>{wordsOf(criterion)}</li>
      ))}
    </ul>
  );
}

const wordsOf = ({ upper, unit, ...rest }: Criterion) =>
  criterionText({ ...rest, unit: unit ?? QUANTITIES[rest.quantity].unit, ...(upper === undefined ? {} : { upper }) }, shopDecimalSign());

const rule = (what: string, quantity: Criterion['quantity']) => {
  const { unit } = QUANTITIES[quantity];
  return { what, unit: unit === '1' ? '' : unit, ...LIMITS_OF_QUANTITY[quantity] };
};

const fieldsOf = ({ quantity, comparison, value, upper }: Criterion, locale: string): CriterionFields => ({
  quantity,
  comparison,
  value: typedNumber(value, locale),
  upper: typedNumber(upper, locale),
});

function criterionOf({ quantity, comparison, value, upper }: CriterionFields, locale: string) {
  const numberOf = (text: string) => {
    const read = readNumber(text, rule('The limit', quantity), locale);
    return 'value' in read ? read.value : Number.NaN;
  };
  return { quantity, comparison, value: numberOf(value), ...(comparison === 'between' ? { upper: numberOf(upper) } : {}) };
}
