import { averageFluence } from './average-fluence';

/**
 * Fluence of a Gaussian pulse on the beam axis.          F0 = 8 E / (pi d^2) = 2 E / (pi w^2)
 *
 * @param pulseEnergyMj   pulse energy, mJ, finite, >= 0
 * @param spotDiameterUm  1/e^2 diameter on the work, um, finite, > 0
 * @returns peak fluence, J/cm^2; twice averageFluence
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a Gaussian spot; M^2 enters through spotDiameterUm.
 * Source: RP Photonics Encyclopedia, "fluence", and "Lost factors of 2" (2025); docs/science/pulses.md
 */
export function peakFluence(pulseEnergyMj: number, spotDiameterUm: number): number {
  return 2 * averageFluence(pulseEnergyMj, spotDiameterUm);
}
