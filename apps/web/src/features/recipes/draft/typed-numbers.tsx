import {
  type DelaysUs,
  type NumberedSetting,
  type NumbersGround,
  PARAMETER_KEYS,
  PARAMETERS,
  type ParameterValues,
  settingNumbers,
  type TypedMachine,
  typedSetting,
} from '@proofplate/recipe-model';
import { NumbersPanel } from '../../../components/numbers-panel/numbers-panel';
import { numbersGroups } from '../../../components/setting-numbers';
import { readOptionalNumber } from '../../../lib/read-number';
import { useSession } from '../../../lib/session';
import { DELAY_NAMES, type StepValues } from './draft-values';
import { readField } from './read-draft';

export type NumbersMachine = { machine: TypedMachine; ground: NumbersGround };
export type TypedNumbersProps = NumbersMachine & { steps: readonly StepValues[]; label: string; shows: 'steps' | 'totals' };

/** What follows from mark steps as they are being typed, worked out here at every key. */
export function TypedNumbers({ steps, machine, ground, label, shows }: TypedNumbersProps) {
  const { locale } = useSession().shop;
  const numbers = settingNumbers(
    steps.map((step) => typedStep(step, machine, locale)),
    ground,
  );
  const groups = shows === 'steps' ? numbersGroups(numbers.steps) : numbersGroups([], numbers.totals);
  return <NumbersPanel label={label} groups={groups} />;
}

export function typedStep(step: StepValues, machine: TypedMachine, locale: string): NumberedSetting {
  return typedSetting(machine, {
    fill: step.fill,
    delaysUs: delaysOf(step, locale),
    read: (field, { speedMmPerS }) => readField(step, field, { locale, ...(speedMmPerS === undefined ? {} : { speedMmPerS }) }),
    beside: besidePanel(step, machine),
  });
}

/** A value that stands on no field of the panel is kept as it was entered; its physical value is known where the unit is the model's own. */
function besidePanel({ stored }: StepValues, { panel }: TypedMachine): ParameterValues {
  const values: ParameterValues = {};
  for (const key of PARAMETER_KEYS) {
    const entered = stored[key];
    const isOnPanel = panel.fields.some(({ parameter }) => parameter === key);
    if (entered !== undefined && !isOnPanel && entered.unit === PARAMETERS[key].unit) values[key] = { entered, physical: entered.value };
  }
  return values;
}

function delaysOf({ delaysUs }: StepValues, locale: string): DelaysUs {
  const rule = { what: 'The delay', unit: 'µs', least: -100_000, most: 100_000 };
  const read = DELAY_NAMES.flatMap((name) => {
    const delay = readOptionalNumber(delaysUs[name], rule, locale);
    return 'value' in delay && delay.value !== undefined ? [[name, delay.value] as const] : [];
  });
  return Object.fromEntries(read);
}
