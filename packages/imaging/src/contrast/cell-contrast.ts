import { requirePositive } from '../arguments/require-positive';
import { requireWithin } from '../arguments/require-within';

/**
 * Cell contrast of a directly marked code.          CC = (ML - MD) / ML
 *
 * @param lightMean  mean of the light modules ML, linear light, finite, > 0
 * @param darkMean   mean of the dark modules MD on the same scale, finite, >= 0, at most the light mean
 * @returns cell contrast, 0 to 1
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for means of modules, which glare and texture move less than the extremes of symbolContrast.
 * Source: ISO/IEC 29158:2020 (TR 29158:2011); docs/science/contrast.md
 */
export function cellContrast(lightMean: number, darkMean: number): number {
  requirePositive({ lightMean });
  requireWithin(0, lightMean, { darkMean });
  return (lightMean - darkMean) / lightMean;
}
