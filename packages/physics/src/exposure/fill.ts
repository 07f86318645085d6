/** How an area is scanned. `outline` follows the contour only and fills nothing. */
export type Fill = 'one direction' | 'both directions' | 'crossed' | 'outline';

/**
 * Scans over the area in one pass of a fill.          crossed: 2; else 1
 *
 * @param fill  how the area is scanned
 * @returns 2 for a crossed fill, else 1; an outline counts as one run round the contour
 * Valid for the fills named; nothing is thrown.
 * Source: definition; docs/science/scanning.md
 */
export function scansPerPass(fill: Fill): number {
  return fill === 'crossed' ? 2 : 1;
}
