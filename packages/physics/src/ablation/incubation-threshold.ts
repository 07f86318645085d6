import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';

export type Incubation = {
  readonly singlePulseThresholdJPerCm2: number;
  readonly incubationCoefficient: number;
  /** Threshold that many pulses approach; 0 for the plain power law. */
  readonly saturatedThresholdJPerCm2: number;
};

/**
 * Threshold fluence after a number of pulses on one spot.          Fth(N) = Finf + (F1 - Finf) N^(S - 1)
 *
 * @param incubation.singlePulseThresholdJPerCm2  F1, J/cm^2, finite, > 0
 * @param incubation.incubationCoefficient        S, finite, > 0; 1 is no incubation
 * @param incubation.saturatedThresholdJPerCm2    Finf, J/cm^2, finite, 0 <= Finf <= F1; 0 gives F1 N^(S - 1)
 * @param pulses                                  number N of pulses, finite, >= 1
 * @returns threshold, J/cm^2, peak or average as F1 is
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a fixed spot and up to about a thousand pulses.
 * Source: Jee, Becker, Walser, J. Opt. Soc. Am. B 5 (1988) 648; saturation: Di Niso et al., Opt. Express 22 (2014) 12200;
 *         docs/science/ablation.md
 */
export function incubationThreshold(incubation: Incubation, pulses: number): number {
  const { singlePulseThresholdJPerCm2, incubationCoefficient, saturatedThresholdJPerCm2 } = incubation;
  requirePositive({ singlePulseThresholdJPerCm2, incubationCoefficient });
  requireAtLeast(0, { saturatedThresholdJPerCm2 });
  requireAtLeast(1, { pulses });
  if (saturatedThresholdJPerCm2 > singlePulseThresholdJPerCm2) {
    throw new RangeError(`saturatedThresholdJPerCm2 must be at most ${singlePulseThresholdJPerCm2}, but is ${saturatedThresholdJPerCm2}`);
  }
  return saturatedThresholdJPerCm2 + (singlePulseThresholdJPerCm2 - saturatedThresholdJPerCm2) * pulses ** (incubationCoefficient - 1);
}
