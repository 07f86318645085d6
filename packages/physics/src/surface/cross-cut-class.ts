import { requireAtLeast } from '../arguments/require-at-least';

export type CrossCutClass = {
  /** ASTM D3359 method B: 5B is the best. */
  readonly astm: '5B' | '4B' | '3B' | '2B' | '1B' | '0B';
  /** ISO 2409: 0 is the best. */
  readonly iso: 0 | 1 | 2 | 3 | 4 | 5;
  /** Largest share of the area removed, percent. */
  readonly removedUpToPercent: number;
};

/** The classes of both standards, best first. */
export const CROSS_CUT_CLASSES: readonly CrossCutClass[] = [
  { astm: '5B', iso: 0, removedUpToPercent: 0 },
  { astm: '4B', iso: 1, removedUpToPercent: 5 },
  { astm: '3B', iso: 2, removedUpToPercent: 15 },
  { astm: '2B', iso: 3, removedUpToPercent: 35 },
  { astm: '1B', iso: 4, removedUpToPercent: 65 },
  { astm: '0B', iso: 5, removedUpToPercent: 100 },
];

/**
 * Adhesion class of a coating from the cross-cut test.          none: 5B/0; < 5 %: 4B/1; < 15: 3B/2; < 35: 2B/3; < 65: 1B/4; above: 0B/5
 *
 * @param removedPercent  share of the cross-cut area that came off, percent, 0 to 100
 * @returns the class in both standards
 * @throws RangeError naming the argument and its value, if out of range or exactly 5, 15, 35 or 65: there the standards word the limit
 *         differently, so that the class itself has to be asked for
 * Valid for marks on coatings and for marking sprays only, cut and taped as the standard says.
 * Source: ASTM D3359 method B, ISO 2409:2013; docs/science/adhesion.md
 */
export function crossCutClass(removedPercent: number): CrossCutClass {
  requireAtLeast(0, { removedPercent });
  const found = CROSS_CUT_CLASSES.find(({ removedUpToPercent }) => removedPercent <= removedUpToPercent);
  if (found === undefined) throw new RangeError(`removedPercent must be at most 100, but is ${removedPercent}`);
  const isOnLimit = removedPercent === found.removedUpToPercent && found.iso > 0 && found.iso < 5;
  if (isOnLimit) {
    throw new RangeError(
      `removedPercent must not lie on a limit that the standards word differently, but is ${removedPercent}: enter the class`,
    );
  }
  return found;
}
