import { type DerivedNumber, type RoundBody, type RoundPart, type RoundPartSetUp, roundPartSetUp } from '@proofplate/physics';
import { type EnteredLength, type EnteredPart, LENGTHS_OF_SHAPE, type PartGround, type PartProblem } from './entered-part';
import { lengthMm, lengthWords } from './part-lengths';
import { partProblems } from './part-problems';

export type PartSetUp =
  | ({ readonly kind: 'worked out' } & RoundPartSetUp)
  | { readonly kind: 'refused'; readonly problems: readonly PartProblem[] };

const UM_PER_MM = 1000;

/** What no number here covers; stands beside every set-up. */
export const PART_NOT_CHECKED: readonly string[] = [
  'Clamping, run-out, balance and slip of the part are not checked; nor is the direction in which the rotary turns.',
  'The diameter is for a chuck that turns the part about its own axis, not for a drive of rollers.',
];
export const PART_INSIDE_NOT_CHECKED = 'Whether the beam and the head reach the place inside the part, past its rim, is not checked.';

/**
 * The set-up of a round part on a rotary axis, from what a person typed; the same in the browser and on the server.
 *
 * @param part    shape, lengths in mm or inch as typed, artwork, and how much may be lost towards a strip's edge
 * @param ground  beam and lens of the machine, focus offsets of the setting's steps
 * @returns the measures with unit, formula, source and inputs, or the reason where an input is not known; or what is wrong, by field:
 *          impossible bodies, artwork that does not fit, a part too small for the lens, too few or too many index steps
 * Valid as roundPartSetUp
 * Source: docs/science/round-parts.md
 */
export function partSetUp(part: EnteredPart, ground: PartGround): PartSetUp {
  const problems = partProblems(part, ground);
  if (problems.length > 0) return { kind: 'refused', problems };
  const setUp = roundPartSetUp(toRoundPart(part), ground);
  const late = [...tooSmall(part, setUp.numbers), ...wrongSteps(part, setUp.numbers)];
  return late.length > 0 ? { kind: 'refused', problems: late } : { kind: 'worked out', ...setUp };
}

function toRoundPart({ allowance, allowancePercent, focusAt, steepestEdgeDeg, indexSteps, stepsPerTurn, ...part }: EnteredPart): RoundPart {
  return {
    side: part.side,
    body: bodyOf(part),
    lengthMm: mmOf(part.length),
    artworkHeightMm: mmOf(part.artworkHeight),
    artwork: part.artworkWidth === undefined ? { seamMm: mmOf(part.seam) } : { widthMm: mmOf(part.artworkWidth) },
    allowance: { kind: allowance, share: allowancePercent / 100 },
    focusAt,
    ...(steepestEdgeDeg === undefined ? {} : { steepestEdgeDeg }),
    ...(indexSteps === undefined ? {} : { indexSteps }),
    ...(stepsPerTurn === undefined ? {} : { stepsPerTurn }),
  };
}

function bodyOf({
  shape,
  diameter,
  wall,
  smallDiameter,
  largeDiameter,
}: Pick<EnteredPart, 'shape' | 'diameter' | 'wall' | 'smallDiameter' | 'largeDiameter'>): RoundBody {
  if (shape === 'cone') return { smallDiameterMm: mmOf(smallDiameter), largeDiameterMm: mmOf(largeDiameter) };
  return { outerDiameterMm: mmOf(diameter), wallMm: LENGTHS_OF_SHAPE[shape].includes('wall') ? mmOf(wall) : 0 };
}

const mmOf = (length: EnteredLength | undefined) => (length === undefined ? 0 : lengthMm(length));
const numberOf = (numbers: readonly DerivedNumber[], key: string) => numbers.find((number) => number.key === key)?.value;

/** A strip, or a whole part, no wider than the spot cannot be marked: the beam passes its edge. */
function tooSmall({ shape, shownIn }: EnteredPart, numbers: readonly DerivedNumber[]): PartProblem[] {
  const widestMm = numberOf(numbers, 'stripWidth') ?? numberOf(numbers, 'rotaryDiameter');
  const spotUm = numberOf(numbers, 'spotAtWork');
  if (widestMm === undefined || spotUm === undefined || widestMm > spotUm / UM_PER_MM) return [];
  const [width, spot] = [lengthWords(widestMm, shownIn), lengthWords(spotUm / UM_PER_MM, shownIn)];
  const detail = `This part is too small for this lens: ${width} of it can be marked at once, and the spot alone is ${spot} wide.`;
  return [{ field: shape === 'cone' ? 'smallDiameter' : 'diameter', detail: `${detail} Take a lens of shorter focal length.` }];
}

function wrongSteps({ indexSteps, shownIn }: EnteredPart, numbers: readonly DerivedNumber[]): PartProblem[] {
  if (indexSteps === undefined) return [];
  const [least, field, spotUm] = [numberOf(numbers, 'leastIndexSteps'), numberOf(numbers, 'fieldWidth'), numberOf(numbers, 'spotAtWork')];
  if (least !== undefined && indexSteps < least)
    return [{ field: 'indexSteps', detail: tooFewWords(indexSteps, { least, numbers, shownIn }) }];
  if (field === undefined || spotUm === undefined || field > spotUm / UM_PER_MM) return [];
  const [strip, spot] = [lengthWords(field, shownIn), lengthWords(spotUm / UM_PER_MM, shownIn)];
  const detail = `The part is too small for ${indexSteps} index steps: a strip would be ${strip} wide, no wider than the spot of ${spot}.`;
  return [{ field: 'indexSteps', detail }];
}

function tooFewWords(
  indexSteps: number,
  {
    least,
    numbers,
    shownIn,
  }: { readonly least: number; readonly numbers: readonly DerivedNumber[]; readonly shownIn: EnteredPart['shownIn'] },
): string {
  const [fall, strip] = [numberOf(numbers, 'stripFall'), numberOf(numbers, 'stripWidth')];
  const falls = fall === undefined ? '' : ` The edge of a strip would lie ${lengthWords(fall, shownIn)} off its middle.`;
  const widest = strip === undefined ? '' : `, ${lengthWords(strip, shownIn)} wide at most`;
  const steps = indexSteps === 1 ? '1 index step' : `${indexSteps} index steps`;
  return `The part is too small for ${steps} with this lens.${falls} Take at least ${least}${widest}, allow more loss, or take a lens of longer focal length.`;
}
