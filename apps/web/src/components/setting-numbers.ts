import { formatNumber, formatQuantity, formatUnit, inShopNumbers } from '../lib/format';
import { paths } from '../lib/paths';
import { isShare } from '../lib/share-numbers';
import type { NumbersGroup, ShownNumber } from './numbers-panel/shown-number';
import { stepTitle } from './setting-rows';

/** A number that follows from a setting: worked out here, or as the server gave it. */
export type SettingNumber = {
  readonly key: string;
  readonly unit: string;
  readonly formula: string;
  readonly source: string;
  readonly value?: number | null;
  readonly inputs?: Readonly<Record<string, number>>;
  readonly missingBecause?: string | null | undefined;
  readonly isRuledOutByMode?: boolean;
  readonly lookAt: readonly string[];
};
export type StepNumbers = { readonly numbers: readonly SettingNumber[]; readonly remarks: readonly { readonly text: string }[] };

/** What a derived number is called beside a setting; the key itself names its meaning and unit in the api. */
const LABELS: Readonly<Record<string, string>> = {
  workPower: 'Average power',
  focalSpot: 'Spot at the focus',
  rayleighLength: 'Rayleigh length',
  spotAtWork: 'Spot at the work',
  pulseEnergy: 'Pulse energy',
  averageFluence: 'Average fluence',
  peakFluence: 'Peak fluence',
  averageIrradiance: 'Average irradiance',
  peakIrradiance: 'Peak irradiance',
  rectangularPeakPower: 'Peak power, rectangular pulse',
  gaussianPeakPower: 'Peak power, Gaussian pulse',
  pulsePitch: 'Pulse pitch',
  pulseOverlap: 'Pulse overlap',
  pulsesPerSpot: 'Pulses per spot',
  pulsesPerSpotArea: 'Pulses per spot area',
  lineEnergy: 'Line energy',
  interactionTime: 'Interaction time',
  lineOverlap: 'Line overlap',
  scansPerSpot: 'Scans per spot',
  coverageRipple: 'Coverage ripple',
  arealDose: 'Dose',
  areaRate: 'Area rate',
  timePer100Mm2: 'Time for 100 mm²',
  markingTime: 'Marking time of the area',
  totalArealDose: 'Dose of all steps',
  totalTimePer100Mm2: 'Time for 100 mm², all steps',
};

/** What a marker asks for; the order is that of the beam: power, spot, pulse, line, area. */
const FIRST = new Set([
  ...['workPower', 'spotAtWork', 'pulseEnergy', 'rectangularPeakPower', 'peakFluence', 'averageIrradiance'],
  ...['pulsePitch', 'pulseOverlap', 'lineOverlap', 'arealDose', 'timePer100Mm2', 'totalArealDose', 'totalTimePer100Mm2'],
]);
const SHOWN_DIGITS = 3;
const INPUT_DIGITS = 6;
/** Below this a pulse energy reads better in the next smaller unit. */
const SMALL_MJ = 0.1;
const SCIENCE_PAGE = /(?:^|;\s*)docs\/science\/([a-z-]+)\.md/u;
/** The area is not known where only a setting is shown, and nobody asked for it. */
const NEEDS_AREA = 'markingTime';

/** The numbers of 1 … n mark steps as groups of the panel, totals first. */
export function numbersGroups(
  steps: readonly StepNumbers[],
  totals: readonly SettingNumber[] = [],
  titleOf: (index: number) => string = (index) => `Step ${index + 1}`,
): NumbersGroup[] {
  const all: NumbersGroup[] =
    totals.length === 0 ? [] : [{ key: 'all', title: 'All steps', numbers: totals.map(shownNumber), remarks: [] }];
  const each = steps.map(({ numbers, remarks }, index) => ({
    key: `step-${index + 1}`,
    title: titleOf(index),
    numbers: numbers.filter(isAskedFor).map(shownNumber),
    remarks: remarks.map(({ text }) => inShopNumbers(text)),
  }));
  return [...all, ...each];
}

type NumberedRevision = {
  readonly derived: readonly StepNumbers[];
  readonly derivedTotals: readonly SettingNumber[];
  readonly steps: readonly Parameters<typeof stepTitle>[0][];
};

/** The numbers as the server keeps them beside a setting, under the names that the setting cards have. */
export function revisionNumbers({ derived, derivedTotals, steps }: NumberedRevision): NumbersGroup[] {
  return numbersGroups(derived, derivedTotals, (index) => {
    const step = steps[index];
    return step === undefined ? '' : stepTitle(step, index, steps.length);
  });
}

function isAskedFor({ key, missingBecause }: SettingNumber): boolean {
  return key !== NEEDS_AREA || typeof missingBecause !== 'string' || !missingBecause.includes('size of the filled area');
}

function shownNumber(number: SettingNumber): ShownNumber {
  const { key, formula, source, inputs = {}, lookAt, missingBecause } = number;
  const page = SCIENCE_PAGE.exec(source)?.[1];
  return {
    key,
    label: numberLabel(key),
    ...shownValue(number),
    reason: inShopNumbers(reasonWords(missingBecause ?? '')),
    isRuledOut: number.isRuledOutByMode === true,
    formula,
    inputs: inputWords(inputs),
    source: source.replace(SCIENCE_PAGE, ''),
    more: page === undefined ? undefined : paths.science(page),
    lookAt: lookAt.map(inShopNumbers),
    isFirst: FIRST.has(key),
  };
}

export function numberLabel(key: string): string {
  return LABELS[key] ?? key;
}

function shownValue({ key, value, unit }: SettingNumber): Pick<ShownNumber, 'text' | 'unit'> {
  if (value === null || value === undefined) return { text: undefined, unit: '' };
  if (isShare(key)) return { text: formatNumber(value * 100, { decimals: 1 }), unit: '%' };
  if (unit === 'mJ' && Math.abs(value) < SMALL_MJ) return { text: rounded(value * 1000), unit: 'µJ' };
  return { text: rounded(value), unit: unit === '1' ? '' : formatUnit(unit) };
}

const rounded = (value: number) => formatNumber(Number(value.toPrecision(SHOWN_DIGITS)));

/** Behind "because": no capital, no full stop at the end. */
function reasonWords(reason: string): string {
  const plain = reason.replace(/\.$/u, '');
  return /^[A-Z][a-z ]/u.test(plain) ? plain.charAt(0).toLowerCase() + plain.slice(1) : plain;
}

/** Unit at the end of an input's name, longest first. */
const UNITS: readonly (readonly [ending: string, unit: string])[] = [
  ['JPerMm2', 'J/mm²'],
  ['JPerCm2', 'J/cm²'],
  ['Percent', '%'],
  ['MmPerS', 'mm/s'],
  ['Khz', 'kHz'],
  ['Um', 'µm'],
  ['Mm', 'mm'],
  ['Nm', 'nm'],
  ['Ns', 'ns'],
  ['Ms', 'ms'],
  ['Mj', 'mJ'],
  ['Uj', 'µJ'],
  ['W', 'W'],
  ['J', 'J'],
  ['S', 's'],
];

/** "From power 12 W, speed 800 mm/s."; nothing where no number went in. */
export function inputWords(inputs: Readonly<Record<string, number>>): string {
  const words = Object.entries(inputs).map(([name, value]) => {
    const [ending, unit] = UNITS.find(([own]) => name.endsWith(own)) ?? ['', ''];
    const plain = spaced(name.slice(0, name.length - ending.length));
    return `${plain} ${formatQuantity(Number(value.toPrecision(INPUT_DIGITS)), unit)}`;
  });
  return words.length === 0 ? '' : `From ${words.join(', ')}.`;
}

/** "spotDiameter" → "spot diameter", "step1Dose" → "step 1 dose". */
function spaced(name: string): string {
  return name
    .replace(/[A-Z]|\d+/g, (part) => ` ${part.toLowerCase()}`)
    .replace(/\bm 2\b/, 'M²')
    .trim();
}
