import { chakra } from '@chakra-ui/react';
import { type Control, useWatch } from 'react-hook-form';
import { Button } from '../../../components/button';
import { NumberField, TextAreaField, TextField } from '../../../components/field';
import { Form, useSummaryForm } from '../../../components/form';
import { messageOf, type NumberRule, readNumber, readOptionalNumber, typedNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { readReadings } from '../calibration-readings';
import { CalibrationCurve } from '../components/calibration-curve';
import { addCalibration, type CalibrationBody, type Machine } from '../machines.api';
import { FREQUENCY_RULE, PULSE_WIDTH_RULE } from './machine-rules';

type Values = {
  measuredOn: string;
  meter: string;
  meterDueOn: string;
  wavelengthNm: string;
  frequencyKhz: string;
  pulseWidthNs: string;
  points: string;
  notes: string;
};

const LABELS: Readonly<Record<keyof Values, string>> = {
  measuredOn: 'Measured on',
  meter: 'Meter',
  meterDueOn: 'Meter’s own calibration ends on',
  wavelengthNm: 'Wavelength set on the meter',
  frequencyKhz: 'Pulse frequency',
  pulseWidthNs: 'Pulse width',
  points: 'Percent and watts',
  notes: 'Notes',
};
const WAVELENGTH: NumberRule = { what: 'The wavelength', unit: 'nm', least: 100, most: 20_000 };

/** A dated table from a power meter. It is never changed afterwards: a new reading is a new table. */
export function CalibrationForm({ machine, onAdded }: { machine: Machine; onAdded: () => void }) {
  const { locale } = useSession().shop;
  const form = useSummaryForm<Values>({
    defaultValues: {
      measuredOn: '',
      meter: '',
      meterDueOn: '',
      wavelengthNm: typedNumber(machine.profile.physical.wavelengthNm, locale),
      frequencyKhz: '',
      pulseWidthNs: '',
      points: '',
      notes: '',
    },
  });
  const { errors, isSubmitting } = form.formState;
  const optional = (rule: NumberRule) => ({ validate: (text: string) => messageOf(readOptionalNumber(text, rule, locale)) });
  const submit = async (values: Values, { idempotencyKey }: { idempotencyKey: string }) => {
    await addCalibration(machine.id, bodyOf(values, locale), idempotencyKey);
    onAdded();
  };
  return (
    <chakra.div display="grid" gap="6" gridTemplateColumns={{ base: '1fr', md: 'minmax(0, 1fr) minmax(0, 1fr)' }} alignItems="start">
      <Form form={form} labels={LABELS} onSubmit={submit}>
        <TextField
          type="date"
          label={LABELS.measuredOn}
          error={errors.measuredOn?.message}
          {...form.register('measuredOn', { required: 'Say on which day it was measured.' })}
        />
        <TextField
          label={LABELS.meter}
          help="Type and number, so that its certificate can be found."
          error={errors.meter?.message}
          {...form.register('meter', { validate: (text) => text.trim() !== '' || 'Name the meter, such as its type and number.' })}
        />
        <TextField type="date" label={LABELS.meterDueOn} isOptional error={errors.meterDueOn?.message} {...form.register('meterDueOn')} />
        <NumberField
          label={LABELS.wavelengthNm}
          unit="nm"
          error={errors.wavelengthNm?.message}
          {...form.register('wavelengthNm', { validate: (text) => messageOf(readNumber(text, WAVELENGTH, locale)) })}
        />
        <NumberField
          label={LABELS.frequencyKhz}
          unit="kHz"
          isOptional
          help="Power depends on it: the table holds within 10 % of this frequency."
          error={errors.frequencyKhz?.message}
          {...form.register('frequencyKhz', optional(FREQUENCY_RULE))}
        />
        <NumberField
          label={LABELS.pulseWidthNs}
          unit="ns"
          isOptional
          help="Where the source lets it be set: the table holds at this width only."
          error={errors.pulseWidthNs?.message}
          {...form.register('pulseWidthNs', optional(PULSE_WIDTH_RULE))}
        />
        <TextAreaField
          label={LABELS.points}
          rows={8}
          spellCheck={false}
          help="One reading a line, such as 20 3.1, at least three. Two columns of a spreadsheet can be pasted."
          error={errors.points?.message}
          {...form.register('points', { validate: (text) => readReadings(text, locale).message ?? true })}
        />
        <TextAreaField label={LABELS.notes} isOptional rows={2} error={errors.notes?.message} {...form.register('notes')} />
        <Button type="submit" kind="primary" size="touch" isBusy={isSubmitting}>
          Add the calibration
        </Button>
      </Form>
      <CurvePreview control={form.control} locale={locale} />
    </chakra.div>
  );
}

/** The curve that the typed table makes, or what keeps it from being one. */
function CurvePreview({ control, locale }: { control: Control<Values>; locale: string }) {
  const text = useWatch({ control, name: 'points' });
  const { points, message } = readReadings(text, locale);
  return (
    <chakra.section aria-labelledby="curve-title" position={{ md: 'sticky' }} top="4" order={{ base: 0, md: 1 }}>
      <chakra.h3 id="curve-title" mb="2">
        The curve
      </chakra.h3>
      {message === undefined ? (
        <CalibrationCurve label={`Power over percent through ${points.length} readings`} newest={{ key: 'typed', points }} />
      ) : (
        <chakra.p color="fg.muted" aria-live="polite">
          {text.trim() === '' ? 'It appears here as soon as three readings are typed.' : message}
        </chakra.p>
      )}
      <chakra.p mt="2" fontSize="sm" lineHeight="sm" color="fg.muted">
        Measure with the enclosure as the manual and the laser safety officer say; a meter head reflects.
      </chakra.p>
    </chakra.section>
  );
}

function bodyOf(values: Values, locale: string): CalibrationBody {
  const number = (text: string, rule: NumberRule) => {
    const read = readOptionalNumber(text, rule, locale);
    return 'value' in read ? (read.value ?? null) : null;
  };
  return {
    measuredOn: values.measuredOn,
    meter: values.meter.trim(),
    meterDueOn: values.meterDueOn === '' ? null : values.meterDueOn,
    // checked before; were it not, the server would refuse null at this field
    wavelengthNm: number(values.wavelengthNm, WAVELENGTH) ?? Number.NaN,
    frequencyKhz: number(values.frequencyKhz, FREQUENCY_RULE),
    pulseWidthNs: number(values.pulseWidthNs, PULSE_WIDTH_RULE),
    points: readReadings(values.points, locale).points,
    notes: values.notes.trim(),
  };
}
