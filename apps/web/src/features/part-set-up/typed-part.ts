import { parseTypedNumber } from '@proofplate/physics';
import {
  type EnteredLength,
  type EnteredPart,
  type FocusAllowance,
  type FocusPlace,
  LENGTHS_OF_SHAPE,
  type LengthUnit,
  type PartField,
  type PartLength,
  type PartShape,
  type PartSide,
} from '@proofplate/recipe-model';
import { decimalSignOf, readOptionalNumber, typedNumber } from '../../lib/read-number';

/** The part as it stands in the fields: text stays as it was typed. */
export type TypedPart = {
  shape: PartShape;
  side: PartSide;
  wrap: 'whole turn' | 'part of a turn';
  allowance: FocusAllowance;
  focusAt: FocusPlace;
  shownIn: LengthUnit;
} & Record<PartLength | 'allowancePercent' | 'steepestEdgeDeg' | 'indexSteps' | 'stepsPerTurn', string>;

export type PartMessages = Partial<Record<PartField, string>>;

export function emptyPart(shownIn: LengthUnit): TypedPart {
  return {
    ...{ shape: 'cylinder', side: 'outside', wrap: 'whole turn', allowance: 'fluence loss', focusAt: 'mid', shownIn },
    ...{ diameter: '', wall: '', smallDiameter: '', largeDiameter: '', length: '', artworkHeight: '', artworkWidth: '', seam: '' },
    ...{ allowancePercent: '10', steepestEdgeDeg: '30', indexSteps: '', stepsPerTurn: '' },
  };
}

/** A saved part back in its fields, each length with the unit that it was typed in. */
export function typedFrom(part: EnteredPart, locale: string): TypedPart {
  const length = (entered: EnteredLength | undefined) =>
    entered === undefined ? '' : `${typedNumber(entered.value, locale)}${entered.unit === part.shownIn ? '' : ` ${entered.unit}`}`;
  return {
    ...{ shape: part.shape, side: part.side, allowance: part.allowance, focusAt: part.focusAt, shownIn: part.shownIn },
    wrap: part.artworkWidth === undefined ? 'whole turn' : 'part of a turn',
    diameter: length(part.diameter),
    wall: length(part.wall),
    smallDiameter: length(part.smallDiameter),
    largeDiameter: length(part.largeDiameter),
    length: length(part.length),
    artworkHeight: length(part.artworkHeight),
    artworkWidth: length(part.artworkWidth),
    seam: length(part.seam),
    allowancePercent: typedNumber(part.allowancePercent, locale),
    steepestEdgeDeg: typedNumber(part.steepestEdgeDeg, locale),
    indexSteps: typedNumber(part.indexSteps, locale),
    stepsPerTurn: typedNumber(part.stepsPerTurn, locale),
  };
}

/** Lengths that stand in the form for this shape and wrap. */
export function lengthsOf({ shape, wrap }: Pick<TypedPart, 'shape' | 'wrap'>): PartLength[] {
  return [...LENGTHS_OF_SHAPE[shape], 'artworkHeight', wrap === 'whole turn' ? 'seam' : 'artworkWidth'];
}

/** Reads the fields. What cannot be read keeps its message; what is empty and needed is listed apart, so that nobody is told off while typing. */
export function readTypedPart(
  typed: TypedPart,
  locale: string,
): { readonly part: EnteredPart; readonly messages: PartMessages; readonly missing: readonly PartLength[] } {
  const messages: PartMessages = {};
  const missing: PartLength[] = [];
  const lengths: Partial<Record<PartLength, EnteredLength>> = {};
  for (const field of lengthsOf(typed)) {
    if (typed[field].trim() === '') {
      if (field !== 'seam') missing.push(field);
      continue;
    }
    const read = readLength(typed[field], typed.shownIn, locale);
    if ('message' in read) messages[field] = read.message;
    else lengths[field] = read;
  }
  const number = (field: keyof typeof NUMBER_RULES) => {
    const read = readOptionalNumber(typed[field], NUMBER_RULES[field], locale);
    if ('message' in read) messages[field] = read.message;
    return 'message' in read ? undefined : read.value;
  };
  const allowancePercent = number('allowancePercent');
  if (allowancePercent === undefined) messages.allowancePercent ??= 'Say how much may be lost, such as 10.';
  const optional = { steepestEdgeDeg: number('steepestEdgeDeg'), indexSteps: number('indexSteps'), stepsPerTurn: number('stepsPerTurn') };
  const { shape, side, allowance, focusAt, shownIn } = typed;
  const part = { ...{ shape, side, allowance, focusAt, shownIn, allowancePercent: allowancePercent ?? 0 }, ...lengths, ...given(optional) };
  return { part, messages, missing };
}

/** Only the unit and the size are looked at here: what fits the part is said by the function that works it out. */
const NUMBER_RULES = {
  allowancePercent: { what: 'The allowance', unit: '%', least: 0.1, most: 90 },
  steepestEdgeDeg: { what: 'The steepest angle', unit: '°', least: 1, most: 85 },
  indexSteps: { what: 'Index steps', unit: '', least: 1, most: 100_000, isWhole: true },
  stepsPerTurn: { what: 'Motor steps of one turn', unit: '', least: 1, most: 100_000_000, isWhole: true },
} as const;

function readLength(text: string, unit: LengthUnit, locale: string): EnteredLength | { message: string } {
  const read = parseTypedNumber(text, { decimalSign: decimalSignOf(locale) });
  if (read.kind === 'refused') return { message: read.reason === 'unknown unit' ? 'Type lengths in mm or in.' : read.message };
  if (read.unit === null) return { value: read.value, unit };
  return read.unit === 'mm' || read.unit === 'in' ? { value: read.value, unit: read.unit } : { message: 'Type lengths in mm or in.' };
}

function given<T extends Record<string, number | undefined>>(values: T): Partial<Record<keyof T, number>> {
  // Object.fromEntries widens the keys to string; they are those of the argument.
  return Object.fromEntries(Object.entries(values).filter(([, value]) => value !== undefined)) as Partial<Record<keyof T, number>>;
}
