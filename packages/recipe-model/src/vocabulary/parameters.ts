import type { PanelUnit } from '@proofplate/physics';

export type ParameterKey =
  | 'powerPercent'
  | 'speedMmPerS'
  | 'frequencyKhz'
  | 'pulseWidthNs'
  | 'lineSpacingUm'
  | 'passes'
  | 'focusOffsetMm'
  | 'hatchAngleDeg'
  | 'angleStepDeg'
  | 'wobbleDiameterUm'
  | 'wobbleFrequencyKhz';

export type ParameterClass = 'essential' | 'supplementary' | 'non-essential';

export const PARAMETER_CLASS_LABELS: Readonly<Record<ParameterClass, string>> = {
  essential: 'essential: a change needs new confirmation',
  supplementary: 'supplementary: a change is listed',
  'non-essential': 'non-essential: a change is noted',
};

export type ParameterMeaning = {
  label: string;
  /** The unit of the stored physical value. */
  unit: PanelUnit;
  symbol: string;
  class: ParameterClass;
  /** Units in which a machine's panel may show the parameter. */
  panelUnits: readonly PanelUnit[];
  /** Whole numbers only, zero, negative: what the physical value may be. */
  wholeNumber: boolean;
  mayBeZero: boolean;
  mayBeNegative: boolean;
  help: string;
};

const SPEED_UNITS = ['mm/s', 'm/s', 'in/s', 'm/min', 'mm/min', 'percentFromZero', 'percentFromMinimum'] as const;
const FREQUENCY_UNITS = ['kHz', 'Hz', 'percentFromZero', 'percentFromMinimum'] as const;
const SPACING_UNITS = ['um', 'mm', 'in', 'lpi', 'lpcm'] as const;
const POSITIVE = { wholeNumber: false, mayBeZero: false, mayBeNegative: false } as const;
const ESSENTIAL = 'essential' as const;

/** The one vocabulary of cells, revisions, transfers and differences, in the order in which people read a setting. */
export const PARAMETERS: Readonly<Record<ParameterKey, ParameterMeaning>> = {
  powerPercent: {
    ...POSITIVE,
    label: 'Power',
    unit: 'percentFromZero',
    symbol: '%',
    class: ESSENTIAL,
    panelUnits: ['percentFromZero', 'percentFromMinimum', 'W'],
    mayBeZero: true,
    help: 'Average power as set on the panel. A percent is a number only together with its machine.',
  },
  speedMmPerS: {
    ...POSITIVE,
    label: 'Scan speed',
    unit: 'mm/s',
    symbol: 'mm/s',
    class: ESSENTIAL,
    panelUnits: SPEED_UNITS,
    help: 'Speed of the spot over the work while the beam is on.',
  },
  frequencyKhz: {
    ...POSITIVE,
    label: 'Pulse frequency',
    unit: 'kHz',
    symbol: 'kHz',
    class: ESSENTIAL,
    panelUnits: [...FREQUENCY_UNITS, 'ppi'],
    help: 'Pulses per second. Absent: the beam is continuous.',
  },
  pulseWidthNs: {
    ...POSITIVE,
    label: 'Pulse width',
    unit: 'ns',
    symbol: 'ns',
    class: ESSENTIAL,
    panelUnits: ['ns', 'us'],
    help: 'Only where the source lets it be set.',
  },
  lineSpacingUm: {
    ...POSITIVE,
    label: 'Line spacing',
    unit: 'um',
    symbol: 'µm',
    class: ESSENTIAL,
    panelUnits: SPACING_UNITS,
    help: 'Distance between neighbouring lines of the fill.',
  },
  passes: {
    ...POSITIVE,
    label: 'Passes',
    unit: 'count',
    symbol: '×',
    class: ESSENTIAL,
    panelUnits: ['count'],
    wholeNumber: true,
    help: 'How often the step is repeated. A crossed fill scans twice in each pass.',
  },
  focusOffsetMm: {
    ...POSITIVE,
    label: 'Focus offset',
    unit: 'mm',
    symbol: 'mm',
    class: ESSENTIAL,
    panelUnits: ['mm', 'um', 'in'],
    mayBeZero: true,
    mayBeNegative: true,
    help: 'Plus: the work surface lies farther from the lens than the focal plane.',
  },
  hatchAngleDeg: {
    ...POSITIVE,
    label: 'Fill angle',
    unit: 'deg',
    symbol: '°',
    class: ESSENTIAL,
    panelUnits: ['deg'],
    mayBeZero: true,
    mayBeNegative: true,
    help: 'Direction of the lines; 0 lies along the part’s x axis.',
  },
  angleStepDeg: {
    ...POSITIVE,
    label: 'Angle step',
    unit: 'deg',
    symbol: '°',
    class: ESSENTIAL,
    panelUnits: ['deg'],
    mayBeZero: true,
    mayBeNegative: true,
    help: 'Turn of the fill angle from pass to pass.',
  },
  wobbleDiameterUm: {
    ...POSITIVE,
    label: 'Wobble diameter',
    unit: 'um',
    symbol: 'µm',
    class: ESSENTIAL,
    panelUnits: ['um', 'mm', 'in'],
    help: 'Diameter of the circle that the line is swung around; absent: no wobble.',
  },
  wobbleFrequencyKhz: {
    ...POSITIVE,
    label: 'Wobble frequency',
    unit: 'kHz',
    symbol: 'kHz',
    class: ESSENTIAL,
    panelUnits: ['kHz', 'Hz'],
    help: 'Turns of the wobble circle per second.',
  },
};

/** The keys in reading order. */
export const PARAMETER_KEYS: readonly ParameterKey[] = [
  'powerPercent',
  'speedMmPerS',
  'frequencyKhz',
  'pulseWidthNs',
  'lineSpacingUm',
  'passes',
  'focusOffsetMm',
  'hatchAngleDeg',
  'angleStepDeg',
  'wobbleDiameterUm',
  'wobbleFrequencyKhz',
];
