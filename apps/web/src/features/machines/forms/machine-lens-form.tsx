import { type UseFormReturn, useWatch } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField, SelectField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { messageOf, type NumberRule, readOptionalNumber, typedLength, typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { addMachineLens, changeMachineLens, type LensChoice, type MachineLens, type MachineLensBody } from '../machines.api';

type Values = {
  lensId: string;
  workingDistanceMm: string;
  focusMethod: string;
  measuredSpotUm: string;
  spotMethod: string;
  spotMeasuredOn: string;
};

const LABELS: Readonly<Record<keyof Values, string>> = {
  lensId: 'Lens',
  workingDistanceMm: 'Working distance',
  focusMethod: 'How focus is found',
  measuredSpotUm: 'Measured spot',
  spotMethod: 'How the spot was measured',
  spotMeasuredOn: 'Measured on',
};
const DISTANCE: NumberRule = { what: 'The working distance', unit: 'mm', least: 1, most: 3000, isShopLength: true };
const SPOT: NumberRule = { what: 'The measured spot', unit: 'µm', least: 0.5, most: 5000 };
const EMPTY: Values = { lensId: '', workingDistanceMm: '', focusMethod: '', measuredSpotUm: '', spotMethod: '', spotMeasuredOn: '' };

type AddProps = { machineId: string; lenses: readonly LensChoice[]; onDone: () => void };

export function AddMachineLensForm({ machineId, lenses, onDone }: AddProps) {
  const form = useSummaryForm<Values>({ defaultValues: EMPTY });
  const { locale } = useSession().shop;
  const submit = async (values: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await addMachineLens(machineId, { lensId: values.lensId, ...bodyOf(values, locale) }, idempotencyKey);
    onDone();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <SelectField
        label={LABELS.lensId}
        options={lenses.map(({ id, name }) => ({ value: id, label: name }))}
        placeholder="Choose a lens"
        error={form.formState.errors.lensId?.message}
        {...form.register('lensId', { required: 'Choose a lens of the shop.' })}
      />
      <PairFields form={form} />
      <Button type="submit" kind="primary" size="touch" isBusy={form.formState.isSubmitting}>
        Add the lens
      </Button>
    </Form>
  );
}

export function ChangeMachineLensForm({ pair, onDone }: { pair: MachineLens; onDone: () => void }) {
  const { locale } = useSession().shop;
  const form = useSummaryForm<Values>({ defaultValues: valuesOf(pair, locale) });
  const submit = async (values: Values) => {
    await changeMachineLens(pair, bodyOf(values, locale));
    onDone();
  };
  return (
    <Form form={form} labels={LABELS} onSubmit={submit}>
      <PairFields form={form} />
      <Button type="submit" kind="primary" size="touch" isBusy={form.formState.isSubmitting}>
        Save the changes
      </Button>
    </Form>
  );
}

function PairFields({ form }: { form: UseFormReturn<Values> }) {
  const { locale } = useSession().shop;
  const { errors } = form.formState;
  const isSpotTyped = useWatch({ control: form.control, name: 'measuredSpotUm' }).trim() !== '';
  const isMeasured = () => form.getValues('measuredSpotUm').trim() !== '';
  const spotMessage = (text: string) => {
    const hasRest = form.getValues('spotMethod').trim() !== '' || form.getValues('spotMeasuredOn') !== '';
    if (text.trim() === '' && hasRest) return 'Enter the measured spot, or clear its method and day.';
    return messageOf(readOptionalNumber(text, SPOT, locale));
  };
  return (
    <>
      <NumberField
        label={LABELS.workingDistanceMm}
        rule={DISTANCE}
        isOptional
        help="From the lens to the work at focus."
        error={errors.workingDistanceMm?.message}
        {...form.register('workingDistanceMm', { validate: (text) => messageOf(readOptionalNumber(text, DISTANCE, locale)) })}
      />
      <TextField
        label={LABELS.focusMethod}
        isOptional
        help="Such as gauge block 176, or two red dots that meet."
        error={errors.focusMethod?.message}
        {...form.register('focusMethod')}
      />
      <NumberField
        label={LABELS.measuredSpotUm}
        rule={SPOT}
        isOptional
        help="Diameter where the intensity is 1/e² of the middle. Leave it out if nobody measured it."
        error={errors.measuredSpotUm?.message}
        {...form.register('measuredSpotUm', { validate: spotMessage })}
      />
      <TextField
        label={LABELS.spotMethod}
        isOptional={!isSpotTyped}
        help={isSpotTyped ? 'Needed with a measured spot. Such as knife edge, or crater widths.' : 'Such as knife edge, or crater widths.'}
        error={errors.spotMethod?.message}
        {...form.register('spotMethod', { validate: (text) => !isMeasured() || text.trim() !== '' || 'Say how the spot was measured.' })}
      />
      <TextField
        type="date"
        label={LABELS.spotMeasuredOn}
        isOptional={!isSpotTyped}
        help={isSpotTyped ? 'Needed with a measured spot.' : undefined}
        error={errors.spotMeasuredOn?.message}
        {...form.register('spotMeasuredOn', {
          validate: (day) => !isMeasured() || day !== '' || 'Say on which day the spot was measured.',
        })}
      />
    </>
  );
}

function valuesOf(pair: MachineLens, locale: string): Values {
  return {
    lensId: pair.lensId,
    workingDistanceMm: typedLength(pair.workingDistanceMm, locale),
    focusMethod: pair.focusMethod,
    measuredSpotUm: typedNumber(pair.measuredSpotUm, locale),
    spotMethod: pair.spotMethod ?? '',
    spotMeasuredOn: pair.spotMeasuredOn ?? '',
  };
}

function bodyOf(values: Values, locale: string): MachineLensBody {
  const number = (text: string, rule: NumberRule) => {
    const read = readOptionalNumber(text, rule, locale);
    return 'value' in read ? (read.value ?? null) : null;
  };
  return {
    workingDistanceMm: number(values.workingDistanceMm, DISTANCE),
    focusMethod: values.focusMethod.trim(),
    measuredSpotUm: number(values.measuredSpotUm, SPOT),
    spotMethod: values.spotMethod.trim() === '' ? null : values.spotMethod.trim(),
    spotMeasuredOn: values.spotMeasuredOn === '' ? null : values.spotMeasuredOn,
  };
}
