import { requirePositive } from '../arguments/require-positive';

/**
 * Depth over which the fluence falls by at most a given share.          2 zR sqrt(1/(1 - q) - 1)
 *
 * @param rayleighLengthMm  Rayleigh length, mm, finite, > 0
 * @param loss              allowed loss q of fluence as a share (0.1 is 10 %), 0 < loss < 1
 * @returns total depth on both sides of the focus, mm
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a Gaussian beam.
 * Source: ISO 11146-1, solved for z; docs/science/beam.md
 */
export function depthForFluenceLoss(rayleighLengthMm: number, loss: number): number {
  requirePositive({ rayleighLengthMm, loss });
  if (loss >= 1) throw new RangeError(`loss must be below 1, but is ${loss}`);
  // 1/(1 - q) - 1 written as q/(1 - q): no cancellation for a small loss.
  return 2 * rayleighLengthMm * Math.sqrt(loss / (1 - loss));
}
