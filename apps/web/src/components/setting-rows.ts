import { PANEL_UNITS } from '@proofplate/physics';
import {
  ASSIST_LABELS,
  type Assist,
  FILL_LABELS,
  type Fill,
  PARAMETER_KEYS,
  PARAMETERS,
  type Panel,
  type PanelField,
  type ParameterValues,
  type SetValue,
  STEP_PURPOSE_LABELS,
  type StepPurpose,
  showNumber,
  showValue,
} from '@proofplate/recipe-model';
import { formatNumber, formatQuantity } from '../lib/format';
import type { Fact } from './fact-list';
import type { SettingRow } from './setting-card';

/** A mark step as the api gives it. */
export type ShownStep = {
  purpose: StepPurpose;
  pauseAfterS: number;
  parameters: {
    values: ParameterValues;
    fill: Fill;
    assist: Assist;
    delaysUs?: Partial<Record<'laserOn' | 'laserOff' | 'jump' | 'corner', number>>;
    power: { watts: number | null; basis?: 'calibration' | 'not calibrated'; reason?: string };
  };
};
type Step = ShownStep;
type DecimalSign = '.' | ',';

/** What is dialled, in the order of the machine's panel; a value that another unit says better has it underneath. */
export function settingRows(step: Step, panel: Panel, decimalSign: DecimalSign): SettingRow[] {
  const { values, power } = step.parameters;
  const speed = values.speedMmPerS?.physical;
  return panel.fields.flatMap((field) => {
    const value = values[field.parameter];
    if (value === undefined) return [];
    const shown = showValue(field, value, { decimalSign, ...(speed === undefined ? {} : { speedMmPerS: speed }) });
    const note = field.parameter === 'powerPercent' ? powerNote(power) : physicalNote(field.parameter, value, field.unit);
    return [
      {
        key: field.parameter,
        label: field.label,
        ...(note === undefined ? {} : { note }),
        ...(field.parameter === 'powerPercent' && power.watts === null && power.reason !== undefined ? { noteReason: power.reason } : {}),
        value: asPanelShows(shown?.text ?? enteredText(value, decimalSign), field, decimalSign),
        unit: shown?.symbol ?? PANEL_UNITS[value.entered.unit].symbol,
      },
    ];
  });
}

/** The panel's own decimals (0.030 on a panel with a step of 0.001), and the sign of an offset. */
function asPanelShows(text: string, { parameter, step }: PanelField, decimalSign: DecimalSign): string {
  const [whole = '', decimals = ''] = text.split(decimalSign);
  const shownDecimals = step === undefined ? 0 : (String(step).split('.')[1]?.length ?? 0);
  const padded = decimals.padEnd(shownDecimals, '0');
  const isPlus = parameter === 'focusOffsetMm' && !text.startsWith('\u2212') && /[1-9]/.test(text);
  return `${isPlus ? '+' : ''}${whole}${padded === '' ? '' : `${decimalSign}${padded}`}`;
}

export function enteredText({ entered }: SetValue, decimalSign: DecimalSign): string {
  return showNumber(entered.value, decimalSign);
}

export function powerNote(power: Step['parameters']['power']): string {
  if (power.watts === null) return 'watts not known';
  const watts = formatQuantity(power.watts, 'W', { significantDigits: 3 });
  return power.basis === 'calibration' ? `${watts} at the work` : `about ${watts}, not calibrated`;
}

function physicalNote(key: keyof typeof PARAMETERS, { physical }: SetValue, panelUnit: string): string | undefined {
  const { unit, symbol } = PARAMETERS[key];
  if (key === 'focusOffsetMm' && physical !== 0) return physical > 0 ? 'surface farther from the lens' : 'surface nearer to the lens';
  return unit === panelUnit || unit === 'count' ? undefined : `${formatNumber(Number(physical.toPrecision(6)))} ${symbol}`;
}

/** What belongs to the step but stands on no field of the panel. */
export function besidePanel(step: Step, panel: Panel, decimalSign: DecimalSign): Fact[] {
  const onPanel = new Set(panel.fields.map(({ parameter }) => parameter));
  const { values, fill, assist, delaysUs } = step.parameters;
  const others = PARAMETER_KEYS.flatMap((key) => {
    const value = values[key];
    if (value === undefined || onPanel.has(key)) return [];
    return [{ label: PARAMETERS[key].label, value: enteredText(value, decimalSign), unit: PANEL_UNITS[value.entered.unit].symbol }];
  });
  const delays = DELAYS.flatMap(({ key, label }) => {
    const value = delaysUs?.[key];
    return value === undefined ? [] : [{ label, value: formatNumber(value), unit: 'µs' }];
  });
  return [
    { label: 'Fill', value: FILL_LABELS[fill] },
    { label: 'Assist', value: ASSIST_LABELS[assist] },
    ...others,
    ...delays,
    ...(step.pauseAfterS > 0 ? [{ label: 'Pause after it', value: formatNumber(step.pauseAfterS), unit: 's' }] : []),
  ];
}

export const DELAYS = [
  { key: 'laserOn', label: 'Laser-on delay' },
  { key: 'laserOff', label: 'Laser-off delay' },
  { key: 'jump', label: 'Jump delay' },
  { key: 'corner', label: 'Corner delay' },
] as const;

/** "Step 2 of 3: clean up"; a single step needs no count. */
export function stepTitle(step: Step, index: number, count: number): string {
  const purpose = STEP_PURPOSE_LABELS[step.purpose];
  return count === 1 ? purpose : `Step ${index + 1} of ${count}: ${purpose.toLowerCase()}`;
}
