import { requirePositive } from '../arguments/require-positive';

export type AblatingPulse = {
  readonly peakFluenceJPerCm2: number;
  readonly thresholdJPerCm2: number;
  readonly penetrationDepthNm: number;
  readonly spotRadiusUm: number;
};

export type AblationPerPulse = {
  readonly depthNm: number;
  readonly craterDiameterUm: number;
  readonly volumeUm3: number;
  readonly pulseEnergyUj: number;
  readonly volumePerEnergyUm3PerUj: number;
};

const UM_PER_NM = 1e-3;
const UJ_PER_UM2_PER_J_PER_CM2 = 0.01;

/**
 * Depth, crater and volume that one Gaussian pulse removes.
 *          z = delta ln(F0/Fth); D = w0 sqrt(2 ln(F0/Fth)); V = (pi/4) w0^2 delta ln^2(F0/Fth); E = pi w0^2 F0 / 2
 *
 * @param pulse.peakFluenceJPerCm2  peak fluence F0, J/cm^2, finite, > 0
 * @param pulse.thresholdJPerCm2    peak threshold fluence Fth, J/cm^2, finite, > 0
 * @param pulse.penetrationDepthNm  energy penetration depth delta, nm, finite, > 0
 * @param pulse.spotRadiusUm        1/e^2 radius w0 on the work, um, finite, > 0
 * @returns depth, nm; crater diameter, um; volume, um^3; pulse energy, uJ; volume per energy, um^3/uJ. At or below the threshold
 *          nothing is removed
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for ultrashort pulses below plasma shielding; for nanosecond pulses a fit at best.
 * Source: Raciukaitis et al. (2009); docs/science/ablation.md
 */
export function ablationPerPulse({
  peakFluenceJPerCm2,
  thresholdJPerCm2,
  penetrationDepthNm,
  spotRadiusUm,
}: AblatingPulse): AblationPerPulse {
  requirePositive({ peakFluenceJPerCm2, thresholdJPerCm2, penetrationDepthNm, spotRadiusUm });
  const excess = Math.max(0, Math.log(peakFluenceJPerCm2 / thresholdJPerCm2));
  const pulseEnergyUj = (Math.PI / 2) * spotRadiusUm ** 2 * peakFluenceJPerCm2 * UJ_PER_UM2_PER_J_PER_CM2;
  const volumeUm3 = (Math.PI / 4) * spotRadiusUm ** 2 * penetrationDepthNm * UM_PER_NM * excess ** 2;
  return {
    depthNm: penetrationDepthNm * excess,
    craterDiameterUm: spotRadiusUm * Math.sqrt(2 * excess),
    volumeUm3,
    pulseEnergyUj,
    volumePerEnergyUm3PerUj: volumeUm3 / pulseEnergyUj,
  };
}
