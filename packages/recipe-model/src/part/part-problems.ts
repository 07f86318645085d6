import { type EnteredLength, type EnteredPart, LENGTHS_OF_SHAPE, type PartGround, type PartLength, type PartProblem } from './entered-part';
import { lengthMm, lengthWords } from './part-lengths';

const LONGEST_MM = 5000;
const LENGTH_WORDS: Readonly<Record<PartLength, string>> = {
  diameter: 'outside diameter',
  wall: 'wall',
  smallDiameter: 'diameter of the small end',
  largeDiameter: 'diameter of the large end',
  length: 'length of the part',
  artworkHeight: 'height of the artwork',
  artworkWidth: 'width of the artwork',
  seam: 'seam',
};

/** What is wrong with a part before anything is worked out; empty when it can be. */
export function partProblems(part: EnteredPart, { fieldSizeMm }: Pick<PartGround, 'fieldSizeMm'>): PartProblem[] {
  const missing = [...LENGTHS_OF_SHAPE[part.shape], 'artworkHeight' as const]
    .filter((field) => part[field] === undefined)
    .map((field) => ({ field, detail: `Enter the ${LENGTH_WORDS[field]}.` }));
  const out = lengthsOf(part).flatMap(([field, length]) => lengthProblem(field, length));
  const plain = [...missing, ...out, ...numberProblems(part)];
  return plain.length > 0 ? plain : [...bodyProblems(part), ...artworkProblems(part, fieldSizeMm)];
}

/** The lengths that the shape uses and that were typed. */
function lengthsOf(part: EnteredPart): [PartLength, EnteredLength][] {
  const used: PartLength[] = [...LENGTHS_OF_SHAPE[part.shape], 'artworkHeight', 'artworkWidth', 'seam'];
  return used.flatMap((field): [PartLength, EnteredLength][] => {
    const length = part[field];
    return length === undefined ? [] : [[field, length]];
  });
}

function lengthProblem(field: PartLength, length: EnteredLength): PartProblem[] {
  const mm = lengthMm(length);
  const most = lengthWords(LONGEST_MM, length.unit);
  if (!Number.isFinite(mm) || Math.abs(mm) > LONGEST_MM) return [{ field, detail: `The ${LENGTH_WORDS[field]} must be at most ${most}.` }];
  return field === 'seam' || mm > 0 ? [] : [{ field, detail: `The ${LENGTH_WORDS[field]} must be above zero.` }];
}

function numberProblems({ allowancePercent, steepestEdgeDeg, indexSteps, stepsPerTurn }: EnteredPart): PartProblem[] {
  const problems: PartProblem[] = [];
  if (!(allowancePercent >= 0.1 && allowancePercent <= 90)) problems.push({ field: 'allowancePercent', detail: 'Allow 0.1 to 90 %.' });
  if (steepestEdgeDeg !== undefined && !(steepestEdgeDeg >= 1 && steepestEdgeDeg <= 85)) {
    problems.push({ field: 'steepestEdgeDeg', detail: 'The steepest angle at an edge must be 1 to 85°, or empty.' });
  }
  if (!isCount(indexSteps, 100_000))
    problems.push({ field: 'indexSteps', detail: 'Index steps must be a whole number from 1 to 100000, or empty.' });
  if (!isCount(stepsPerTurn, 100_000_000)) {
    problems.push({ field: 'stepsPerTurn', detail: 'Motor steps of one turn must be a whole number from 1, or empty.' });
  }
  if (problems.length === 0 && indexSteps !== undefined && stepsPerTurn !== undefined && indexSteps > stepsPerTurn) {
    problems.push({ field: 'indexSteps', detail: `The rotary makes ${stepsPerTurn} motor steps in a turn. Index steps cannot be finer.` });
  }
  return problems;
}

const isCount = (count: number | undefined, most: number) =>
  count === undefined || (Number.isInteger(count) && count >= 1 && count <= most);

function bodyProblems(part: EnteredPart): PartProblem[] {
  const { shape, side, diameter, wall, smallDiameter, largeDiameter, shownIn } = part;
  if (shape === 'cylinder' && side === 'inside') {
    return [{ field: 'side', detail: 'A solid cylinder has no inside. Choose ring or tube, and enter its wall.' }];
  }
  if (
    LENGTHS_OF_SHAPE[shape].includes('wall') &&
    diameter !== undefined &&
    wall !== undefined &&
    lengthMm(wall) >= lengthMm(diameter) / 2
  ) {
    const half = lengthWords(lengthMm(diameter) / 2, shownIn);
    return [{ field: 'wall', detail: `The wall must be thinner than half the diameter, ${half}: nothing is left inside.` }];
  }
  if (shape !== 'cone' || smallDiameter === undefined || largeDiameter === undefined) return [];
  const [small, large] = [lengthMm(smallDiameter), lengthMm(largeDiameter)];
  if (small > large)
    return [{ field: 'smallDiameter', detail: 'The small end is wider than the large end. Enter the narrower diameter here.' }];
  return small === large
    ? [{ field: 'largeDiameter', detail: 'Both ends are equally wide, so this is no cone. Choose cylinder, ring or tube.' }]
    : [];
}

function artworkProblems(part: EnteredPart, fieldSizeMm: PartGround['fieldSizeMm']): PartProblem[] {
  const { artworkHeight, artworkWidth, seam, shownIn } = part;
  const { surfaceLengthMm, turnMm } = surfaceOf(part);
  const problems: PartProblem[] = [];
  const heightMm = artworkHeight === undefined ? 0 : lengthMm(artworkHeight);
  if (heightMm > surfaceLengthMm) {
    problems.push({
      field: 'artworkHeight',
      detail: `The artwork is higher than the part’s surface is long, ${lengthWords(surfaceLengthMm, shownIn)}.`,
    });
  } else if (typeof fieldSizeMm === 'number' && heightMm > fieldSizeMm) {
    const field = lengthWords(fieldSizeMm, shownIn);
    problems.push({
      field: 'artworkHeight',
      detail: `The marking field of this lens is ${field}. Mark the artwork in parts, or take a lens with a larger field.`,
    });
  }
  if (artworkWidth !== undefined && lengthMm(artworkWidth) > 2 * turnMm) {
    problems.push({
      field: 'artworkWidth',
      detail: `The artwork goes more than twice round the part. A whole turn is ${lengthWords(turnMm, shownIn)}.`,
    });
  }
  if (artworkWidth === undefined && seam !== undefined && Math.abs(lengthMm(seam)) >= turnMm) {
    problems.push({ field: 'seam', detail: `The seam must be shorter than a whole turn, ${lengthWords(turnMm, shownIn)}.` });
  }
  return problems;
}

function surfaceOf({ shape, side, diameter, wall, smallDiameter, largeDiameter, length }: EnteredPart) {
  const mm = (entered: EnteredLength | undefined) => (entered === undefined ? 0 : lengthMm(entered));
  if (shape === 'cone') {
    const slantMm = Math.hypot((mm(largeDiameter) - mm(smallDiameter)) / 2, mm(length));
    return { surfaceLengthMm: slantMm, turnMm: (Math.PI * (mm(smallDiameter) + mm(largeDiameter))) / 2 };
  }
  return { surfaceLengthMm: mm(length), turnMm: Math.PI * (mm(diameter) - (side === 'inside' ? 2 * mm(wall) : 0)) };
}
