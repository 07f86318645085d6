import { requirePositive } from '../arguments/require-positive';

export type OptimumFluence = {
  readonly peakFluenceJPerCm2: number;
  readonly depthNm: number;
  readonly volumePerEnergyUm3PerUj: number;
  readonly removalRateMm3PerMinW: number;
  readonly flatTopFluenceJPerCm2: number;
};

const UM_PER_NM = 1e-3;
const UJ_PER_UM2_PER_J_PER_CM2 = 0.01;
/** um^3/uJ is 1e-9 mm^3 / 1e-6 J = 1e-3 mm^3/(W s), 60 s a minute. */
const MM3_PER_MIN_W_PER_UM3_PER_UJ = 0.06;

/**
 * Peak fluence that removes most volume for its energy.          Fopt = e^2 Fth; depth 2 delta; V/E = 2 delta / (e^2 Fth)
 *
 * @param thresholdJPerCm2    peak threshold fluence Fth, J/cm^2, finite, > 0
 * @param penetrationDepthNm  energy penetration depth delta, nm, finite, > 0
 * @returns peak fluence, depth on the axis there, volume per energy and as a rate, and the optimum e Fth of a flat-top spot
 * @throws RangeError naming the argument and its value, if out of range
 * Valid like ablationPerPulse; scanned beams depart from it by incubation and heat.
 * Source: Raciukaitis et al. (2009); limits: Zemaitis et al., Sci. Rep. 8 (2018),
 *         10.1038/s41598-018-35604-z; docs/science/ablation.md
 */
export function optimumFluence(thresholdJPerCm2: number, penetrationDepthNm: number): OptimumFluence {
  requirePositive({ thresholdJPerCm2, penetrationDepthNm });
  const peakFluenceJPerCm2 = Math.E ** 2 * thresholdJPerCm2;
  const volumePerEnergyUm3PerUj = (2 * penetrationDepthNm * UM_PER_NM) / (peakFluenceJPerCm2 * UJ_PER_UM2_PER_J_PER_CM2);
  return {
    peakFluenceJPerCm2,
    depthNm: 2 * penetrationDepthNm,
    volumePerEnergyUm3PerUj,
    removalRateMm3PerMinW: volumePerEnergyUm3PerUj * MM3_PER_MIN_W_PER_UM3_PER_UJ,
    flatTopFluenceJPerCm2: Math.E * thresholdJPerCm2,
  };
}
