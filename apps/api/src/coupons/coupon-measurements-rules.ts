import { METHOD_LABELS, type MeasurementMethod, type MeasurementQuantity, QUANTITIES } from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';
import { CODE_GRADES, type MeasurementConditionsDto, type NewMeasurementDto } from './dto/add-measurements.dto';

const COLOUR: readonly MeasurementMethod[] = ['photo', 'colorimeter'];
/** Which method can give which quantity. A code grade comes from a verifier only: a photo never verifies. */
const METHODS_OF: Readonly<Record<MeasurementQuantity, readonly MeasurementMethod[]>> = {
  lightness: COLOUR,
  a: COLOUR,
  b: COLOUR,
  chroma: COLOUR,
  'hue-angle': COLOUR,
  contrast: [...COLOUR, 'verifier'],
  'delta-e-2000': COLOUR,
  evenness: [...COLOUR, 'microscope'],
  depth: ['profilometer', 'microscope', 'calliper', 'manual'],
  'roughness-ra': ['profilometer', 'microscope'],
  'roughness-rz': ['profilometer', 'microscope'],
  'line-width': ['microscope', 'profilometer', 'calliper', 'photo'],
  'crater-diameter': ['microscope', 'calliper'],
  'code-grade': ['verifier'],
  'tape-class': ['manual'],
  'wipe-test': ['manual'],
  'salt-spray-hours': ['manual'],
};

type Limits = { readonly least: number; readonly most: number };
/** What the quantity can be at all; depth is negative where the mark stands up, a crater is 0 where the pulse left none. */
const LIMITS_OF: Readonly<Record<MeasurementQuantity, Limits>> = {
  lightness: { least: 0, most: 100 },
  a: { least: -128, most: 128 },
  b: { least: -128, most: 128 },
  chroma: { least: 0, most: 182 },
  'hue-angle': { least: 0, most: 360 },
  contrast: { least: -1, most: 1 },
  'delta-e-2000': { least: 0, most: 200 },
  evenness: { least: 0, most: 100 },
  depth: { least: -5000, most: 20_000 },
  'roughness-ra': { least: 0, most: 1000 },
  'roughness-rz': { least: 0, most: 5000 },
  'line-width': { least: 0, most: 10_000 },
  'crater-diameter': { least: 0, most: 10_000 },
  'code-grade': { least: 0, most: 4 },
  'tape-class': { least: 0, most: 5 },
  'wipe-test': { least: 0, most: 1_000_000 },
  'salt-spray-hours': { least: 0, most: 50_000 },
};

type Condition = keyof MeasurementConditionsDto;
const CONDITIONS_OF: Partial<Readonly<Record<MeasurementMethod, readonly Condition[]>>> = {
  colorimeter: ['illuminant', 'observer', 'geometry'],
  verifier: ['apertureMil', 'light', 'angleDeg'],
};
const CONDITION_WORDS: Readonly<Record<Condition, string>> = {
  illuminant: 'illuminant',
  observer: 'observer',
  geometry: 'geometry of light and view',
  apertureMil: 'aperture',
  light: 'light',
  angleDeg: 'angle of the light',
};
const WITHOUT_INSTRUMENT: readonly MeasurementMethod[] = ['photo', 'manual'];

/** What a single field cannot see: method, conditions and value against the quantity. */
export function measurementProblems(measurement: NewMeasurementDto, pointer: string): FieldProblem[] {
  return [
    ...unitProblems(measurement, pointer),
    ...valueProblems(measurement, pointer),
    ...methodProblems(measurement, pointer),
    ...supersedingProblems(measurement, pointer),
  ];
}

/** Value in the quantity’s unit; the letter of a code grade stands for 4 … 0. */
export function measuredValue({ value, grade }: Pick<NewMeasurementDto, 'value' | 'grade'>): number | null {
  if (value !== undefined) return value;
  return grade === undefined ? null : CODE_GRADES.length - 1 - CODE_GRADES.indexOf(grade);
}

function unitProblems({ quantity, unit }: NewMeasurementDto, pointer: string): FieldProblem[] {
  const { label, unit: own } = QUANTITIES[quantity];
  if (unit === undefined || unit === own) return [];
  return [{ pointer: `${pointer}/unit`, detail: `${label} is given ${own === '1' ? 'as a pure number' : `in ${own}`}.` }];
}

function valueProblems({ quantity, value, grade }: NewMeasurementDto, pointer: string): FieldProblem[] {
  const { label, unit } = QUANTITIES[quantity];
  const { least, most } = LIMITS_OF[quantity];
  if (grade !== undefined && quantity !== 'code-grade') return [{ pointer: `${pointer}/grade`, detail: 'Only a code has a grade.' }];
  if (value === undefined && grade === undefined) return [{ pointer: `${pointer}/value`, detail: 'Enter the value.' }];
  if (value === undefined || (value >= least && value <= most)) return [];
  const ending = unit === '1' ? '' : ` ${unit}`;
  return [{ pointer: `${pointer}/value`, detail: `${label} must be from ${least} to ${most}${ending}.` }];
}

function methodProblems({ quantity, method, methodDetail, instrument, photoId }: NewMeasurementDto, pointer: string): FieldProblem[] {
  const methods = METHODS_OF[quantity];
  if (!methods.includes(method)) {
    const words = methods.map((each) => METHOD_LABELS[each]).join(', ');
    return [{ pointer: `${pointer}/method`, detail: `${QUANTITIES[quantity].label} is measured by: ${words}.` }];
  }
  const wanted = CONDITIONS_OF[method] ?? [];
  const absent = wanted.filter((condition) => (methodDetail?.[condition] ?? '') === '');
  const given = Object.entries(methodDetail ?? {}).filter(([, value]) => value !== undefined && value !== '');
  const foreign = given.filter(([condition]) => !wanted.some((own) => own === condition));
  return [
    ...absent.map((condition) => ({
      pointer: `${pointer}/methodDetail/${condition}`,
      detail: `Say the ${CONDITION_WORDS[condition]}: without it the number cannot be compared.`,
    })),
    ...foreign.map(([condition]) => ({
      pointer: `${pointer}/methodDetail/${condition}`,
      detail: 'This does not belong to the method. Leave it out.',
    })),
    ...(!WITHOUT_INSTRUMENT.includes(method) && (instrument ?? '') === ''
      ? [{ pointer: `${pointer}/instrument`, detail: 'Name the instrument.' }]
      : []),
    ...(method === 'photo' && photoId === undefined ? [{ pointer: `${pointer}/photoId`, detail: 'Name the photo it was read from.' }] : []),
  ];
}

function supersedingProblems({ supersedesId, reason }: NewMeasurementDto, pointer: string): FieldProblem[] {
  if (supersedesId === undefined || (reason ?? '') !== '') return [];
  return [{ pointer: `${pointer}/reason`, detail: 'Say why this takes the place of the earlier value.' }];
}
