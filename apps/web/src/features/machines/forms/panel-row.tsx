import { chakra } from '@chakra-ui/react';
import { PANEL_UNITS } from '@proofplate/physics';
import { isCodeOf, PARAMETER_KEYS, PARAMETERS, type ParameterKey } from '@proofplate/recipe-model';
import type { ReactNode } from 'react';
import { type UseFormReturn, useWatch } from 'react-hook-form';
import { NumberField, SelectField, TextField } from '../../../components/field';
import { messageAt } from '../../../components/form';
import { messageOf, type NumberRule, readNumber, readOptionalNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { readList } from './machine-body';
import { needsRange, panelNumberRule, panelSymbol, rangeNumberRule, rangeSymbol } from './machine-rules';
import type { MachineValues } from './machine-values';

const PARAMETER_LABELS = Object.fromEntries(PARAMETER_KEYS.map((key) => [key, PARAMETERS[key].label]));
const MAX_LABEL_LENGTH = 40;
const LIMITS = [
  ['minimum', 'Smallest'],
  ['maximum', 'Largest'],
  ['step', 'Step'],
] as const;

type RowProps = { form: UseFormReturn<MachineValues>; index: number; taken: readonly ParameterKey[] };

export function PanelRow({ form, index, taken }: RowProps) {
  const { locale } = useSession().shop;
  const row = useRowShape(form, index);
  const { errors } = form.formState;
  const at = <Key extends string>(key: Key) => `panel.fields.${index}.${key}` as const;
  /** Limits belong to the unit they were typed in: under another one they would be other limits. */
  const clearLimits = (unit: string) => {
    const isShare = unit.startsWith('percent');
    form.setValue(at('minimum'), isShare ? '0' : '');
    form.setValue(at('maximum'), isShare ? '100' : '');
    for (const key of ['step', 'choices', 'rangeLow', 'rangeHigh'] as const) form.setValue(at(key), '');
  };
  const handleParameter = (next: string) => {
    if (!isCodeOf(PARAMETER_LABELS, next)) return;
    // the list's codes are the parameters
    const { panelUnits, unit: ownUnit } = PARAMETERS[next as ParameterKey];
    const unit = panelUnits[0] ?? ownUnit;
    form.setValue(at('unit'), unit, { shouldDirty: true });
    clearLimits(unit);
  };
  return (
    <>
      <Pair>
        <SelectField
          label="Sets"
          options={PARAMETER_KEYS.map((value) => ({
            value,
            label: PARAMETERS[value].label,
            isDisabled: value !== row.parameter && taken.includes(value),
          }))}
          error={messageAt(errors, at('parameter'))}
          {...form.register(at('parameter'), {
            onChange: (event: { target: { value: string } }) => handleParameter(event.target.value),
          })}
        />
        <TextField
          label="Label on the panel"
          autoComplete="off"
          maxLength={MAX_LABEL_LENGTH}
          error={messageAt(errors, at('label'))}
          {...form.register(at('label'), { validate: (text) => text.trim() !== '' || 'Write the label as the machine shows it.' })}
        />
      </Pair>
      <SelectField
        label="Unit"
        options={PARAMETERS[row.parameter].panelUnits.map((value) => ({ value, label: unitWords(value) }))}
        error={messageAt(errors, at('unit'))}
        {...form.register(at('unit'), { onChange: (event: { target: { value: string } }) => clearLimits(event.target.value) })}
      />
      {needsRange(row.parameter, row.unit) && <RangeEnds form={form} index={index} />}
      <chakra.div display="grid" gap="3" gridTemplateColumns={{ base: 'repeat(2, minmax(0, 1fr))', sm: 'repeat(3, minmax(0, 1fr))' }}>
        {LIMITS.map(([key, label]) => (
          <RowNumber key={key} form={form} index={index} name={key} label={label} rule={panelNumberRule(label, row.unit)} />
        ))}
      </chakra.div>
      {(row.choices !== '' || row.parameter === 'pulseWidthNs' || messageAt(errors, at('choices')) !== undefined) && (
        <TextField
          label="Offers only"
          isOptional
          help="Where the field is a list: its values with blanks between them."
          error={messageAt(errors, at('choices'))}
          {...form.register(at('choices'), { validate: (text) => listMessage(text, panelNumberRule('Each value', row.unit), locale) })}
        />
      )}
    </>
  );
}

/** What decides which fields the row has; its numbers may be typed without drawing it anew. */
function useRowShape({ control }: UseFormReturn<MachineValues>, index: number) {
  const at = <Key extends string>(key: Key) => `panel.fields.${index}.${key}` as const;
  const [parameter, unit, choices] = useWatch({ control, name: [at('parameter'), at('unit'), at('choices')] });
  return { parameter, unit, choices };
}

/** What a percentage is a share of. */
function RangeEnds({ form, index }: Omit<RowProps, 'taken'>) {
  const { parameter, unit } = useRowShape(form, index);
  const hasLow = unit === 'percentFromMinimum';
  const rule = rangeNumberRule('The end of the range', parameter, unit);
  return (
    <Pair>
      {hasLow && <RowNumber form={form} index={index} name="rangeLow" label="0 % is" rule={rule} isNeeded />}
      <RowNumber form={form} index={index} name="rangeHigh" label="100 % is" rule={rule} isNeeded symbol={rangeSymbol(parameter, unit)} />
    </Pair>
  );
}

type RowNumberProps = Omit<RowProps, 'taken'> & {
  name: 'minimum' | 'maximum' | 'step' | 'rangeLow' | 'rangeHigh';
  label: string;
  rule: NumberRule;
  symbol?: string;
  isNeeded?: boolean;
};

function RowNumber({ form, index, name, label, rule, symbol = rule.unit, isNeeded = false }: RowNumberProps) {
  const { locale } = useSession().shop;
  const at = `panel.fields.${index}.${name}` as const;
  const read = isNeeded ? readNumber : readOptionalNumber;
  const check = (text: string) => (name === 'maximum' ? upperMessage(text) : messageOf(read(text, rule, locale)));
  const upperMessage = (text: string) => {
    const upper = readOptionalNumber(text, rule, locale);
    const lower = readOptionalNumber(form.getValues(`panel.fields.${index}.minimum`), rule, locale);
    if ('message' in upper || upper.value === undefined || 'message' in lower || lower.value === undefined) return messageOf(upper);
    return upper.value > lower.value || 'The largest value must be above the smallest.';
  };
  return (
    <NumberField
      label={label}
      {...(symbol === '' ? {} : { unit: symbol })}
      error={messageAt(form.formState.errors, at)}
      {...form.register(at, { validate: check })}
    />
  );
}

function listMessage(text: string, rule: NumberRule, locale: string): string | true {
  const read = readList(text, rule, locale);
  return 'message' in read ? read.message : true;
}

function Pair({ children }: { children: ReactNode }) {
  return (
    <chakra.div display="grid" gap="3" gridTemplateColumns={{ base: '1fr', sm: 'repeat(2, minmax(0, 1fr))' }}>
      {children}
    </chakra.div>
  );
}

function unitWords(unit: keyof typeof PANEL_UNITS): string {
  const symbol = panelSymbol(unit);
  return `${symbol} · ${PANEL_UNITS[unit].label}`;
}
