import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';

export type PulseTrain = {
  readonly pulseEnergyMj: number;
  readonly residualHeatShare: number;
  readonly spotDiameterUm: number;
  readonly pitchUm: number;
  readonly frequencyKhz: number;
  readonly pulses: number;
  readonly densityKgPerM3: number;
  readonly heatCapacityJPerKgK: number;
  readonly diffusivityMm2PerS: number;
};

export type HeatAccumulation = {
  readonly temperatureRiseK: number;
  /** The same for a point source that stands still: an upper bound for small spots. */
  readonly pointSourceRiseK: number;
};

const J_PER_MJ = 1e-3;
const M_PER_UM = 1e-6;
const M2_PER_MM2 = 1e-6;
const HZ_PER_KHZ = 1e3;

/**
 * Temperature left under the spot just before the next pulse.
 *          dT = sum_{n=1..N} eta E/(rho c_p) exp(-(n p)^2/s_n) / (pi s_n sqrt(pi D t_n)), t_n = n/f, s_n = w^2/2 + 4 D t_n
 *
 * @param train.pulseEnergyMj         pulse energy E, mJ, finite, >= 0
 * @param train.residualHeatShare     share eta of it that stays as heat, 0 to 1
 * @param train.spotDiameterUm        1/e^2 spot diameter 2 w, um, finite, > 0
 * @param train.pitchUm               way p of the spot between pulses, um, finite, >= 0
 * @param train.frequencyKhz          pulse frequency f, kHz, finite, > 0
 * @param train.pulses                pulses N so far, whole, >= 1
 * @param train.densityKgPerM3        density rho, kg/m^3, finite, > 0
 * @param train.heatCapacityJPerKgK   specific heat capacity c_p, J/(kg K), finite, > 0
 * @param train.diffusivityMm2PerS    thermal diffusivity D, mm^2/s, finite, > 0
 * @returns rise over the temperature before the first pulse, K, for the spot and for a resting point source
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a half space with constant properties, without melting or losses; the part much thicker than sqrt(D N/f). A number to
 * be cautious by, not a prediction.
 * Source: instantaneous sources, Carslaw, Jaeger, Conduction of Heat in Solids (1959); docs/science/thermal.md
 */
export function heatAccumulation(train: PulseTrain): HeatAccumulation {
  const { pulseEnergyMj, residualHeatShare, pitchUm, pulses } = train;
  const { spotDiameterUm, frequencyKhz, densityKgPerM3, heatCapacityJPerKgK, diffusivityMm2PerS } = train;
  requirePositive({ spotDiameterUm, frequencyKhz, densityKgPerM3, heatCapacityJPerKgK, diffusivityMm2PerS });
  requireAtLeast(0, { pulseEnergyMj, residualHeatShare, pitchUm });
  requireWhole({ pulses });
  if (residualHeatShare > 1) throw new RangeError(`residualHeatShare must be at most 1, but is ${residualHeatShare}`);
  const strengthKM3 = (residualHeatShare * pulseEnergyMj * J_PER_MJ) / (densityKgPerM3 * heatCapacityJPerKgK);
  const diffusivityM2PerS = diffusivityMm2PerS * M2_PER_MM2;
  const periodS = 1 / (frequencyKhz * HZ_PER_KHZ);
  const radiusM = (spotDiameterUm / 2) * M_PER_UM;
  let spotSum = 0;
  let pointSum = 0;
  // Oldest pulse first: its share is the smallest, so the sum keeps its digits.
  for (let n = pulses; n >= 1; n -= 1) {
    const spreadM2 = 4 * diffusivityM2PerS * n * periodS;
    const sizeM2 = radiusM ** 2 / 2 + spreadM2;
    spotSum += Math.exp(-((n * pitchUm * M_PER_UM) ** 2) / sizeM2) / (sizeM2 * Math.sqrt(spreadM2));
    pointSum += spreadM2 ** -1.5;
  }
  // Surface source of a half space: 2 / sqrt(pi)^3 over spread^(3/2); sqrt(pi D t) is sqrt(pi spread) / 2.
  const factor = (2 * strengthKM3) / Math.PI ** 1.5;
  return { temperatureRiseK: factor * spotSum, pointSourceRiseK: factor * pointSum };
}
