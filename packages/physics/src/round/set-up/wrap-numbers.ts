import { absent, type DerivedNumber } from '../../exposure/derived/derived-number';
import { ringCircumference } from '../ring-circumference';
import { rotaryResolution } from '../rotary-resolution';
import { taperDevelopment } from '../taper-development';
import { wrapRoundCylinder } from '../wrap-round-cylinder';
import { isTaper, PART_SOURCE, type RoundPart } from './round-part';
import { growthOverHalf } from './taper-numbers';

/** The marked surface and the artwork on it. On a cone the diameter is the one at the middle of the artwork. */
export type Wrap = {
  readonly diameterMm: number;
  readonly wrapLengthMm: number;
  readonly artworkWidthMm: number;
  readonly wrapAngleDeg: number;
  /** Largest radius under the artwork: a step of one angle falls most there. */
  readonly largestRadiusMm: number;
};

/** @throws RangeError for a body that cannot be, and for artwork that does not fit its length or leaves no width */
export function wrapOf(part: RoundPart): Wrap {
  const { body, lengthMm, artworkHeightMm, artwork } = part;
  const taper = isTaper(body) ? taperDevelopment(body.smallDiameterMm / 2, body.largeDiameterMm / 2, lengthMm) : undefined;
  const surfaceLengthMm = taper?.slantMm ?? lengthMm;
  if (artworkHeightMm > surfaceLengthMm) {
    throw new RangeError(`artworkHeightMm must be at most the surface’s length of ${surfaceLengthMm}, but is ${artworkHeightMm}`);
  }
  const { wrapLengthMm, diameterMm } = circumferenceOf(part);
  const artworkWidthMm = 'widthMm' in artwork ? artwork.widthMm : wrapLengthMm + artwork.seamMm;
  return {
    ...{ diameterMm, wrapLengthMm, artworkWidthMm },
    wrapAngleDeg: wrapRoundCylinder(diameterMm, artworkWidthMm).angleDeg,
    largestRadiusMm: diameterMm / 2 + (taper === undefined ? 0 : growthOverHalf(artworkHeightMm, taper.halfAngleDeg)),
  };
}

function circumferenceOf({ body, side }: RoundPart): { readonly wrapLengthMm: number; readonly diameterMm: number } {
  if (isTaper(body)) {
    const diameterMm = (body.smallDiameterMm + body.largeDiameterMm) / 2;
    return { diameterMm, wrapLengthMm: ringCircumference(diameterMm, 0).outsideMm };
  }
  const { outsideMm, insideMm } = ringCircumference(body.outerDiameterMm, body.wallMm);
  return side === 'outside'
    ? { diameterMm: body.outerDiameterMm, wrapLengthMm: outsideMm }
    : { diameterMm: body.outerDiameterMm - 2 * body.wallMm, wrapLengthMm: insideMm };
}

const described = (key: string, unit: string, formula: string) => ({ key, unit, formula, source: PART_SOURCE });
const NO_STEPS = { unknownBecause: 'the motor steps of one turn are not given' };

/** What is entered on the rotary and in the artwork. */
export function wrapNumbers(part: RoundPart, wrap: Wrap): readonly DerivedNumber[] {
  const { diameterMm, wrapLengthMm, artworkWidthMm, wrapAngleDeg } = wrap;
  const { overlapMm, gapMm } = wrapRoundCylinder(diameterMm, artworkWidthMm);
  const { artworkHeightMm, body, stepsPerTurn } = part;
  const seam = { inputs: { artworkWidthMm, wrapLengthMm } };
  const step = described('surfaceStep', 'µm', 'π D / n');
  return [
    { ...described('rotaryDiameter', 'mm', diameterFormula(part)), value: diameterMm, inputs: { ...body } },
    { ...described('wrapLength', 'mm', 'π D'), value: wrapLengthMm, inputs: { diameterMm } },
    artworkWidthNumber(part, wrap),
    { ...described('artworkHeight', 'mm', 'as asked for'), value: artworkHeightMm, inputs: { heightMm: artworkHeightMm } },
    { ...described('wrapAngle', 'deg', '360 W / (π D)'), value: wrapAngleDeg, inputs: { artworkWidthMm, diameterMm } },
    { ...described('seamOverlap', 'mm', 'W − π D, at least 0'), value: overlapMm, ...seam },
    { ...described('seamGap', 'mm', 'π D − W, at least 0'), value: gapMm, ...seam },
    { ...described('turnPerMm', 'deg/mm', '360 / (π D)'), value: 360 / wrapLengthMm, inputs: { diameterMm } },
    stepsPerTurn === undefined
      ? absent(step, NO_STEPS)
      : { ...step, value: rotaryResolution(diameterMm, stepsPerTurn), inputs: { diameterMm, stepsPerTurn } },
  ];
}

function artworkWidthNumber({ artwork }: RoundPart, { wrapLengthMm, artworkWidthMm: value }: Wrap): DerivedNumber {
  return 'widthMm' in artwork
    ? { ...described('artworkWidth', 'mm', 'as asked for'), value, inputs: { ...artwork } }
    : { ...described('artworkWidth', 'mm', 'π D + seam'), value, inputs: { wrapLengthMm, ...artwork } };
}

function diameterFormula({ body, side }: RoundPart): string {
  if (isTaper(body)) return '(D1 + D2) / 2, at the middle of the artwork';
  return side === 'outside' ? 'D' : 'D − 2 t';
}
