import { PARAMETER_KEYS } from '@proofplate/recipe-model';
import { HEAD_NUMBERS, SOURCE_NUMBERS } from './machine-rules';

const FIXED: Readonly<Record<string, string>> = {
  name: 'Name',
  serialNumber: 'Serial number',
  warmUpMinutes: 'Warm-up before marking',
  mountedLensId: 'Lens that is mounted now',
  'physical.sourceKind': 'Kind of source',
  ...Object.fromEntries([...SOURCE_NUMBERS, ...HEAD_NUMBERS].map(({ name, label }) => [`physical.${name}`, label])),
  'physical.frequencyRangeKhz.from': 'Lowest pulse frequency',
  'physical.frequencyRangeKhz.to': 'Highest pulse frequency',
  'physical.pulseWidthRangeNs.from': 'Shortest pulse width',
  'physical.pulseWidthRangeNs.to': 'Longest pulse width',
  'physical.pulseWidthsNs': 'Only these pulse widths',
  'physical.maxPulseEnergyMj': 'Largest pulse energy',
};

const ROW: Readonly<Record<string, string>> = {
  parameter: 'what it sets',
  label: 'label',
  unit: 'unit',
  minimum: 'smallest',
  maximum: 'largest',
  step: 'step',
  choices: 'offers only',
  rangeLow: '0 % is',
  rangeHigh: '100 % is',
};

const ROWS = PARAMETER_KEYS.map((_, index) =>
  Object.entries(ROW).map(([key, words]) => [`panel.fields.${index}.${key}`, `Row ${index + 1}, ${words}`] as const),
);

/** Names of all fields that the form can have; the summary and refusals find the fields by them. */
export const MACHINE_LABELS: Readonly<Record<string, string>> = { ...FIXED, 'panel.fields': 'Panel', ...Object.fromEntries(ROWS.flat()) };
