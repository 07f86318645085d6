import { requirePositive } from '../arguments/require-positive';

const UM_PER_MM = 1000;

/**
 * Way that heat travels in a time.          L = sqrt(D t); many texts print 2 sqrt(D t)
 *
 * @param diffusivityMm2PerS  thermal diffusivity D, mm^2/s, finite, > 0
 * @param timeS               time t, s, finite, > 0
 * @returns diffusion length sqrt(D t), um
 * @throws RangeError naming the argument and its value, if out of range
 * Valid in one dimension: a length well below the spot diameter and the thickness of the part.
 * Source: Carslaw, Jaeger, Conduction of Heat in Solids (1959); docs/science/thermal.md
 */
export function diffusionLength(diffusivityMm2PerS: number, timeS: number): number {
  requirePositive({ diffusivityMm2PerS, timeS });
  return Math.sqrt(diffusivityMm2PerS * timeS) * UM_PER_MM;
}
