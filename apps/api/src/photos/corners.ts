/** A point of the upright picture as fractions of its width and height, from the upper left. */
export type Corner = { readonly x: number; readonly y: number };

/** Smallest plate that a grid can be read from, as a share of the picture. */
const SMALLEST_SHARE = 0.01;

/**
 * What is wrong with four corners, or undefined. They go around the plate clockwise as seen, beginning at the origin mark, and enclose it
 * without crossing or denting.
 */
export function cornersFault(corners: readonly Corner[]): string | undefined {
  if (corners.length !== 4) return 'Give all four corners of the plate.';
  const turns = corners.map((corner, index) => turn(at(corners, index - 1), corner, at(corners, index + 1)));
  if (turns.every((value) => value < 0)) return 'The corners run anticlockwise. Begin at the origin mark and go clockwise.';
  if (!turns.every((value) => value > 0)) return 'The lines between the corners cross or dent. Put each corner on the corner of the plate.';
  if (area(corners) < SMALLEST_SHARE) return 'The plate is too small in this photo to be read. Go nearer and take another.';
  return undefined;
}

/** Positive for a clockwise turn, because y grows downwards. */
function turn(before: Corner, here: Corner, after: Corner): number {
  return (here.x - before.x) * (after.y - here.y) - (here.y - before.y) * (after.x - here.x);
}

function area(corners: readonly Corner[]): number {
  const doubled = corners.reduce((sum, corner, index) => {
    const next = at(corners, index + 1);
    return sum + corner.x * next.y - next.x * corner.y;
  }, 0);
  return Math.abs(doubled) / 2;
}

function at(corners: readonly Corner[], index: number): Corner {
  return corners[(index + corners.length) % corners.length] ?? { x: 0, y: 0 };
}
