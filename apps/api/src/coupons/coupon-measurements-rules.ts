import { METHOD_LABELS, METHODS_OF_QUANTITY, type MeasurementMethod, QUANTITIES, quantityProblem } from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';
import { CODE_GRADES, type MeasurementConditionsDto, type NewMeasurementDto } from './dto/add-measurements.dto';

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
  if (grade !== undefined && quantity !== 'code-grade') return [{ pointer: `${pointer}/grade`, detail: 'Only a code has a grade.' }];
  if (value === undefined && grade === undefined) return [{ pointer: `${pointer}/value`, detail: 'Enter the value.' }];
  const problem = value === undefined ? undefined : quantityProblem(quantity, value);
  return problem === undefined ? [] : [{ pointer: `${pointer}/value`, detail: problem }];
}

function methodProblems({ quantity, method, methodDetail, instrument, photoId }: NewMeasurementDto, pointer: string): FieldProblem[] {
  const methods = METHODS_OF_QUANTITY[quantity];
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
