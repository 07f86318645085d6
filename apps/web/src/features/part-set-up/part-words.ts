import { type LengthUnit, lengthIn, type PartField, type PartNumber, type PartResults, type PartShape } from '@proofplate/recipe-model';
import { formatNumber, formatQuantity } from '../../lib/format';

export const SHAPE_WORDS: Readonly<Record<PartShape, string>> = { cylinder: 'Solid', ring: 'Ring', tube: 'Tube', cone: 'Cone' };

export const FIELD_LABELS: Readonly<Record<PartField, string>> = {
  shape: 'Shape',
  side: 'Marked surface',
  diameter: 'Outside diameter',
  wall: 'Wall',
  smallDiameter: 'Diameter, small end',
  largeDiameter: 'Diameter, large end',
  length: 'Length along the axis',
  artworkHeight: 'Artwork height, along the part',
  artworkWidth: 'Artwork width, round the part',
  seam: 'Seam',
  allowance: 'What may be lost towards a strip’s edge',
  allowancePercent: 'How much',
  focusAt: 'Focus',
  steepestEdgeDeg: 'Steepest angle at an edge',
  indexSteps: 'Index steps',
  stepsPerTurn: 'Motor steps of one turn',
  shownIn: 'Unit of the machine’s control',
};

const LABELS: Readonly<Record<string, string>> = {
  rotaryDiameter: 'Diameter to enter on the rotary',
  wrapLength: 'Wrap length, one whole turn',
  artworkWidth: 'Artwork width',
  artworkHeight: 'Artwork height',
  wrapAngle: 'Turn for the artwork',
  seamOverlap: 'Overlap at the seam',
  seamGap: 'Gap at the seam',
  turnPerMm: 'Turn for one millimetre',
  surfaceStep: 'Way of the surface for one motor step',
  focalSpot: 'Spot at the focus',
  rayleighLength: 'Rayleigh length',
  spotAtWork: 'Spot at the work',
  usableFall: 'Fall within what is allowed',
  stripWidth: 'Widest strip in focus',
  leastIndexSteps: 'Index steps, at least',
  indexSteps: 'Index steps',
  stepsOfWholeTurn: 'Strips of a whole turn',
  indexAngle: 'Turn of one step',
  fieldWidth: 'Width of one strip',
  stripFall: 'Fall across one strip',
  focusBelowCrown: 'Focus, from the strip’s middle',
  edgeFluence: 'Fluence at a strip’s edge, by the angle',
  edgeSpot: 'Spot across, at a strip’s edge',
  edgeShift: 'Shift at a strip’s edge without compensation',
  slantLength: 'Length of the slant',
  tiltAngle: 'Tilt of the part',
  sectorAngle: 'Sector of the flat artwork',
  sectorInnerRadius: 'Its inner radius, small end',
  sectorOuterRadius: 'Its outer radius, large end',
  widthErrorAtEnds: 'Width error at the artwork’s ends',
};

export const LIMIT_WORDS = {
  focus: 'the focus ends it',
  'edge angle': 'the steepest angle ends it',
  field: 'the marking field ends it',
} as const;

export const numberLabel = (key: string): string => LABELS[key] ?? key;

export function findNumber({ numbers }: Pick<PartResults, 'numbers'>, key: string): PartNumber | undefined {
  return numbers.find((number) => number.key === key);
}

export const numberValue = (results: Pick<PartResults, 'numbers'>, key: string): number | null => findNumber(results, key)?.value ?? null;

const DECIMALS: Readonly<Record<LengthUnit, number>> = { mm: 3, in: 4 };

/** "50.265 mm", "1.9789 in": as it is entered on a control. */
export function lengthText(mm: number, unit: LengthUnit, locale: string): string {
  return formatQuantity(Number(lengthIn(mm, unit).toFixed(DECIMALS[unit])), unit, { locale });
}

/** Without the unit, where it stands apart. */
export function lengthFigure(mm: number, unit: LengthUnit, locale: string): string {
  return formatNumber(Number(lengthIn(mm, unit).toFixed(DECIMALS[unit])), { locale });
}

/** "16.364°": the sign stands close. */
export function degrees(angle: number, decimals: number, locale: string): string {
  return `${formatNumber(Number(angle.toFixed(decimals)), { locale })}°`;
}

/** A number of the table in the unit that is read at the machine. */
export function valueText({ value, unit }: PartNumber, shownIn: LengthUnit, locale: string): string {
  if (value === null) return '';
  if (unit === 'mm') return lengthText(value, shownIn, locale);
  const figure = Number(value.toPrecision(5));
  if (unit === '1') return formatNumber(figure, { locale });
  return unit.startsWith('deg')
    ? `${formatNumber(figure, { locale })}${unit.replace('deg', '°')}`
    : formatQuantity(figure, unit, { locale });
}

/** Unit at the end of an input's name, longest first. */
const ENDINGS: readonly (readonly [ending: string, unit: string])[] = [
  ['Deg', '°'],
  ['Um', 'µm'],
  ['Mm', 'mm'],
  ['Nm', 'nm'],
];

/** "wrap length 62.832 mm, seam 0 mm". */
export function inputText(inputs: Readonly<Record<string, number>>, locale: string): string {
  return Object.entries(inputs)
    .map(([name, value]) => {
      const [ending, unit] = ENDINGS.find(([own]) => name.endsWith(own)) ?? ['', ''];
      const plain = name.slice(0, name.length - ending.length).replace(/[A-Z]/g, (letter) => ` ${letter.toLowerCase()}`);
      const figure = Number(value.toPrecision(6));
      return `${plain.trim()} ${unit === '°' ? `${formatNumber(figure, { locale })}°` : formatQuantity(figure, unit, { locale })}`;
    })
    .join(', ');
}
