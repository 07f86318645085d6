import {
  LIMITS_OF_QUANTITY,
  METHODS_OF_QUANTITY,
  type MeasurementMethod,
  type MeasurementQuantity,
  QUANTITIES,
} from '@proofplate/recipe-model';
import { readNumber } from '../../../lib/read-number';
import type { Measurement, MeasurementConditions, NewMeasurement } from './log.api';

/** Methods whose numbers somebody types; those from photos are computed. */
export const typedMethods = (quantity: MeasurementQuantity): readonly MeasurementMethod[] =>
  METHODS_OF_QUANTITY[quantity].filter((method) => method !== 'photo');

export const ILLUMINANTS = ['D65', 'D50', 'A', 'C', 'F2', 'F11'] as const;
export const OBSERVERS = ['2°', '10°'] as const;
export const GEOMETRIES = ['45/0', '0/45', 'd/8 gloss included', 'd/8 gloss excluded'] as const;
const GRADES = ['A', 'B', 'C', 'D', 'F'] as const;

export type Grade = (typeof GRADES)[number];
export type ReadResult = { value: number } | { grade: Grade } | { message: string };

/** Reads what was typed or pasted for one cell; a code grade may be its letter. */
export function readResult(text: string, quantity: MeasurementQuantity, locale: string): ReadResult {
  const letter = GRADES.find((grade) => grade === text.trim().toUpperCase());
  if (quantity === 'code-grade' && letter !== undefined) return { grade: letter };
  const { label, unit } = QUANTITIES[quantity];
  return readNumber(text, { what: label, unit: unit === '1' ? '' : unit, ...LIMITS_OF_QUANTITY[quantity] }, locale);
}

export type MeasuringCommon = {
  quantity: MeasurementQuantity;
  method: MeasurementMethod;
  instrument: string;
  methodDetail: MeasurementConditions;
  uncertainty: number | undefined;
  /** Given: each value takes the place of the one that counts so far. */
  replaceReason: string | undefined;
};

/** Measurements to send, with the cell that each belongs to, in the order of the cells. */
export function measurementsOf(
  typed: ReadonlyMap<string, string>,
  common: MeasuringCommon,
  { earlier, locale }: { earlier: readonly Measurement[]; locale: string },
): NewMeasurement[] {
  const { quantity, method, instrument, methodDetail, uncertainty, replaceReason } = common;
  return [...typed].flatMap(([cellId, text]) => {
    if (text.trim() === '') return [];
    const read = readResult(text, quantity, locale);
    if ('message' in read) return [];
    const before = replaceReason === undefined ? undefined : counting(earlier, cellId, quantity);
    return [
      {
        cellId,
        quantity,
        method,
        ...read,
        ...(instrument === '' ? {} : { instrument }),
        ...(Object.keys(methodDetail).length === 0 ? {} : { methodDetail }),
        ...(uncertainty === undefined ? {} : { uncertainty }),
        ...(before === undefined ? {} : { supersedesId: before.id, reason: replaceReason }),
      },
    ];
  });
}

export function counting(rows: readonly Measurement[], cellId: string, quantity: MeasurementQuantity): Measurement | undefined {
  return rows.find((row) => row.counts && row.cellId === cellId && row.quantity === quantity);
}

/** Messages of a refused batch by cell: "#/measurements/3/value" is the fourth that was sent. */
export function refusedCells(
  errors: readonly { pointer: string; detail: string }[],
  sent: readonly NewMeasurement[],
): { cells: ReadonlyMap<string, string>; others: readonly string[] } {
  const cells = new Map<string, string>();
  const others = new Set<string>();
  for (const { pointer, detail } of errors) {
    const [, index, field = ''] = /^#\/measurements\/(\d+)\/(.*)$/.exec(pointer) ?? [];
    const cellId = index === undefined ? undefined : sent[Number(index)]?.cellId;
    if (cellId === undefined || /^(?:method|instrument|unit|uncertainty|reason)/.test(field)) others.add(detail);
    else cells.set(cellId, detail);
  }
  return { cells, others: [...others] };
}

type Named = { name: string; label: string };
const DEMANDED: Partial<Record<MeasurementMethod, readonly (Named & { key: keyof MeasurementConditions })[]>> = {
  colorimeter: [
    { key: 'illuminant', name: 'illuminant', label: 'Illuminant' },
    { key: 'observer', name: 'observer', label: 'Observer' },
    { key: 'geometry', name: 'geometry', label: 'Geometry of light and view' },
  ],
  verifier: [
    { key: 'apertureMil', name: 'aperture', label: 'Aperture' },
    { key: 'light', name: 'light', label: 'Light' },
    { key: 'angleDeg', name: 'light-angle', label: 'Angle of the light' },
  ],
};

/** What a method demands and was left open, at its field: without it the numbers cannot be compared. */
export function missingConditions(
  method: MeasurementMethod,
  given: MeasurementConditions & { instrument: string },
): (Named & { message: string })[] {
  const instrument = method !== 'manual' && given.instrument.trim() === '' ? [{ name: 'instrument', label: 'Instrument' }] : [];
  const conditions = (DEMANDED[method] ?? []).filter(({ key }) => (given[key] ?? '') === '');
  return [
    ...instrument.map((field) => ({ ...field, message: 'Name the instrument.' })),
    ...conditions.map(({ name, label }) => ({ name, label, message: 'Say it: without it the number cannot be compared.' })),
  ];
}
