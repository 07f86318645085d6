import { chakra } from '@chakra-ui/react';
import { emptyPanelFor, isCodeOf, SOURCE_KIND_LABELS, SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import { useRef } from 'react';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { NumberField, SelectField, TextAreaField, TextField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { formatUnit } from '../../../lib/format';
import { messageOf, type NumberRule, readNumber, readOptionalNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { readEnergies, readList } from './machine-body';
import { FREQUENCY_RULE, HEAD_NUMBERS, PULSE_WIDTH_RULE, SOURCE_NUMBERS, type SourceNumberRule } from './machine-rules';
import { hasPulseWidths, isPulsed, type MachineValues, typedPanel } from './machine-values';

type FormProps = { form: UseFormReturn<MachineValues> };

/** What the source and the scan head are. Fields that the kind of source does not have are left out. */
export function SourceFields({ form }: FormProps) {
  const { locale } = useSession().shop;
  const sourceKind = useWatch({ control: form.control, name: 'physical.sourceKind' });
  const { errors } = form.formState;
  const kindBefore = useRef(sourceKind);
  const handleKind = (next: string) => {
    if (!isCodeOf(SOURCE_KIND_LABELS, next)) return;
    const startOf = (kind: SourceKind) => typedPanel(emptyPanelFor(kind), locale);
    // Rows that nobody has touched follow the kind; a panel that somebody typed stays.
    const isUntouched = JSON.stringify(form.getValues('panel')) === JSON.stringify(startOf(kindBefore.current));
    if (isUntouched) form.setValue('panel', startOf(next), { shouldDirty: true });
    kindBefore.current = next;
  };
  return (
    <>
      <SelectField
        label="Kind of source"
        options={SOURCE_KINDS.map((value) => ({ value, label: SOURCE_KIND_LABELS[value] }))}
        error={messageAt(errors, 'physical.sourceKind')}
        {...form.register('physical.sourceKind', { onChange: (event: { target: { value: string } }) => handleKind(event.target.value) })}
      />
      {SOURCE_NUMBERS.map((rule) => (
        <SourceNumberField key={rule.name} form={form} rule={rule} />
      ))}
      {isPulsed(sourceKind) && (
        <RangeFields form={form} name="frequencyRangeKhz" rule={FREQUENCY_RULE} words={['Lowest', 'Highest', 'pulse frequency']} />
      )}
      {hasPulseWidths(sourceKind) && <PulseWidthFields form={form} />}
      {isPulsed(sourceKind) && <PulseEnergyField form={form} hasWidths={hasPulseWidths(sourceKind)} />}
      <ScanHeadFields form={form} />
    </>
  );
}

/** Few people know these by heart, and a machine works without them here: they stand folded. */
function ScanHeadFields({ form }: FormProps) {
  const hasError = HEAD_NUMBERS.some(({ name }) => messageAt(form.formState.errors, `physical.${name}`) !== undefined);
  const isKnown = HEAD_NUMBERS.some(({ name }) => form.getValues(`physical.${name}`) !== '');
  return (
    <chakra.details open={hasError || isKnown}>
      <chakra.summary py="2.5" fontWeight="semibold" cursor="pointer">
        Scan head: speeds and delays
      </chakra.summary>
      <chakra.p mb="3" fontSize="sm" lineHeight="sm" color="fg.muted">
        For the marking time. Leave out what nobody knows: a time that would need it is then left out too.
      </chakra.p>
      <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: '1fr', sm: 'repeat(2, minmax(0, 1fr))' }}>
        {HEAD_NUMBERS.map((rule) => (
          <SourceNumberField key={rule.name} form={form} rule={rule} />
        ))}
      </chakra.div>
    </chakra.details>
  );
}

function SourceNumberField({ form, rule }: FormProps & { rule: SourceNumberRule }) {
  const { locale } = useSession().shop;
  const read = rule.isNeeded === true ? readNumber : readOptionalNumber;
  const name = `physical.${rule.name}` as const;
  return (
    <NumberField
      label={rule.label}
      rule={rule}
      {...(rule.unit === '' ? {} : { unit: formatUnit(rule.unit) })}
      {...(rule.help === undefined ? {} : { help: rule.help })}
      isOptional={rule.isNeeded !== true}
      error={messageAt(form.formState.errors, name)}
      {...form.register(name, { validate: (text) => messageOf(read(text, rule, locale)) })}
    />
  );
}

type RangeFieldsProps = FormProps & {
  name: 'frequencyRangeKhz' | 'pulseWidthRangeNs';
  rule: NumberRule;
  words: readonly [low: string, high: string, quantity: string];
};

/** Both ends or neither; the upper one is not below the lower. */
function RangeFields({ form, name, rule, words: [low, high, quantity] }: RangeFieldsProps) {
  const { locale } = useSession().shop;
  const { errors } = form.formState;
  const [from, to] = [`physical.${name}.from`, `physical.${name}.to`] as const;
  const check = (own: string, other: typeof from | typeof to) => {
    const isNeeded = form.getValues(other).trim() !== '';
    return isNeeded ? readNumber(own, rule, locale) : readOptionalNumber(own, rule, locale);
  };
  const checkUpper = (text: string) => {
    const upper = check(text, from);
    const lower = readOptionalNumber(form.getValues(from), rule, locale);
    if ('message' in upper || upper.value === undefined || !('value' in lower) || lower.value === undefined) return messageOf(upper);
    return upper.value >= lower.value || `The ${high.toLowerCase()} ${quantity} must be at least the ${low.toLowerCase()}.`;
  };
  return (
    <chakra.div display="grid" gap="4" gridTemplateColumns={{ base: '1fr', sm: 'repeat(2, minmax(0, 1fr))' }}>
      <NumberField
        label={`${low} ${quantity}`}
        unit={rule.unit}
        isOptional
        error={messageAt(errors, from)}
        {...form.register(from, { validate: (text) => messageOf(check(text, to)) })}
      />
      <NumberField
        label={`${high} ${quantity}`}
        unit={rule.unit}
        isOptional
        error={messageAt(errors, to)}
        {...form.register(to, { validate: checkUpper })}
      />
    </chakra.div>
  );
}

function PulseWidthFields({ form }: FormProps) {
  const { locale } = useSession().shop;
  const check = (text: string) => {
    const read = readList(text, PULSE_WIDTH_RULE, locale);
    return 'message' in read ? read.message : true;
  };
  return (
    <>
      <RangeFields form={form} name="pulseWidthRangeNs" rule={PULSE_WIDTH_RULE} words={['Shortest', 'Longest', 'pulse width']} />
      <TextField
        label="Only these pulse widths"
        unit="ns"
        isOptional
        help="Where the source offers a list: the widths with blanks between them, such as 4 8 14 20."
        error={messageAt(form.formState.errors, 'physical.pulseWidthsNs')}
        {...form.register('physical.pulseWidthsNs', { validate: check })}
      />
    </>
  );
}

/** From the data sheet: without it watts are not worked out where the machine was never measured. */
function PulseEnergyField({ form, hasWidths }: FormProps & { hasWidths: boolean }) {
  const { locale } = useSession().shop;
  const name = 'physical.maxPulseEnergyMj';
  const error = messageAt(form.formState.errors, name);
  const check = (text: string) => {
    const read = readEnergies(text, hasWidths, locale);
    return 'message' in read ? read.message : true;
  };
  const field = form.register(name, { validate: check });
  if (!hasWidths) {
    return <NumberField label="Largest pulse energy" unit="mJ" isOptional help="From the data sheet." error={error} {...field} />;
  }
  return (
    <TextAreaField
      label="Largest pulse energy at each pulse width"
      isOptional
      rows={4}
      help="One pair a line, width in ns and energy in mJ, such as 200 1.0. A table can be pasted."
      error={error}
      {...field}
    />
  );
}
