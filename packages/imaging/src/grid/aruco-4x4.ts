/**
 * Inner 4 x 4 bits of the first four markers of the ArUco dictionary "4x4, 50 ids" (ids 0 to 3), row by row, 1 = bright.
 *
 * The dictionary is public (Garrido-Jurado et al., Pattern Recognition 47 (2014) 2280; Garrido-Jurado et al., Pattern
 * Recognition 51 (2016) 481). These constants were read back from photographs of printed markers: the mean grey of each of
 * the 36 modules at the known marker corners gave the same bits in an easy, a low-contrast and a brushed-metal picture.
 */
const INNER_BITS = ['1011 0101 0011 0010', '0000 1111 1001 1010', '0011 0011 0010 1101', '1001 1001 0100 0110'] as const;

/** Ids of the corner marks, clockwise from the top left of the plate. */
export type FiducialId = 0 | 1 | 2 | 3;

/** Modules along one side of a marker: four bits and a dark border of one module on either side. */
export const ARUCO_MODULES_PER_SIDE = 6;

/**
 * Modules of one corner mark, border included, as seen from the front with the plate upright.
 *
 * @param id marker id, 0 to 3
 * @returns 6 rows of 6 booleans, true = dark module; the outermost ring is dark
 * @throws RangeError if the id is none of the four
 * Valid for a marker read dark on bright; an inverted photograph swaps the meaning of true.
 * Source: see INNER_BITS in this file; docs/science/coupon-layout.md
 */
export function arucoModules(id: FiducialId): readonly (readonly boolean[])[] {
  const rows = INNER_BITS[id]?.split(' ');
  if (rows === undefined) {
    throw new RangeError(`id must be 0, 1, 2 or 3, got ${String(id)}`);
  }
  const border = Array.from({ length: ARUCO_MODULES_PER_SIDE }, () => true);
  const inner = rows.map((row) => [true, ...[...row].map((bit) => bit === '0'), true]);
  return [border, ...inner, border];
}
