import { straightLineFit } from '@proofplate/statistics';
import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

/**
 * Incubation coefficient from thresholds at several numbers of pulses.          ln F = ln F1 + (S - 1) ln N, least squares
 *
 * @param pulses              numbers N of pulses, finite, >= 1, at least 3, not all equal
 * @param thresholdsJPerCm2   thresholds at them, J/cm^2, finite, > 0, as many
 * @returns S and F1 in J/cm^2
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for the plain power law without saturation.
 * Source: Jee, Becker, Walser, J. Opt. Soc. Am. B 5 (1988) 648; docs/science/ablation.md
 */
export function incubationFit(
  pulses: readonly number[],
  thresholdsJPerCm2: readonly number[],
): { readonly incubationCoefficient: number; readonly singlePulseThresholdJPerCm2: number } {
  for (const [i, count] of pulses.entries()) requireAtLeast(1, { [`pulses[${i}]`]: count });
  for (const [i, threshold] of thresholdsJPerCm2.entries()) requirePositive({ [`thresholdsJPerCm2[${i}]`]: threshold });
  const line = straightLineFit(pulses.map(Math.log), thresholdsJPerCm2.map(Math.log));
  return { incubationCoefficient: 1 + line.slope, singlePulseThresholdJPerCm2: Math.exp(line.intercept) };
}
