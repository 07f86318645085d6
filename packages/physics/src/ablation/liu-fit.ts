import { type StraightLineFit, straightLineFit } from '@proofplate/statistics';
import { requirePositive } from '../arguments/require-positive';

export type LiuFit = {
  readonly spotRadiusUm: number;
  readonly spotRadiusStandardErrorUm: number;
  readonly thresholdEnergyUj: number;
  readonly thresholdEnergyStandardErrorUj: number;
  readonly thresholdPeakFluenceJPerCm2: number;
  readonly thresholdPeakFluenceStandardErrorJPerCm2: number;
  readonly slopeUm2: number;
  readonly slopeStandardErrorUm2: number;
  readonly interceptUm2: number;
  readonly rSquared: number;
};

const MIN_POINTS = 5;
const J_PER_CM2_PER_UJ_PER_UM2 = 100;

/**
 * Spot radius and threshold from the diameters of single craters.
 *          D^2 = 2 w0^2 ln(E/Eth), a line over ln E: w0 = sqrt(slope/2), Eth = exp(-intercept/slope), Fth = 2 Eth/(pi w0^2)
 *          standard errors to first order from the line's, whose slope and mean height are uncorrelated
 *
 * @param pulseEnergiesUj    pulse energies, uJ, finite, > 0, at least 5
 * @param craterDiametersUm  crater diameters, um, finite, > 0, as many
 * @returns 1/e^2 radius, threshold as pulse energy and as peak fluence, each with the standard error that the scatter of the points
 *          gives it (errors of power meter and microscope scale are not in it), and the line behind them
 * @throws RangeError naming the argument, or saying that the craters do not grow with the energy
 * Valid for a Gaussian spot, one threshold, one number of pulses for all points, peak fluence up to about 10 thresholds.
 * Source: J. M. Liu, Opt. Lett. 7 (1982) 196; docs/science/ablation.md
 */
export function liuFit(pulseEnergiesUj: readonly number[], craterDiametersUm: readonly number[]): LiuFit {
  if (pulseEnergiesUj.length < MIN_POINTS)
    throw new RangeError(`pulseEnergiesUj must have at least ${MIN_POINTS} values, but has ${pulseEnergiesUj.length}`);
  for (const [i, energyUj] of pulseEnergiesUj.entries()) requirePositive({ [`pulseEnergiesUj[${i}]`]: energyUj });
  for (const [i, diameterUm] of craterDiametersUm.entries()) requirePositive({ [`craterDiametersUm[${i}]`]: diameterUm });
  const line = straightLineFit(
    pulseEnergiesUj.map(Math.log),
    craterDiametersUm.map((diameterUm) => diameterUm ** 2),
  );
  if (line.slope <= 0) throw new RangeError(`the craters must grow with the pulse energy, but the slope of D² is ${line.slope} µm²`);
  const spotRadiusUm = Math.sqrt(line.slope / 2);
  const thresholdEnergyUj = Math.exp(-line.intercept / line.slope);
  const thresholdPeakFluenceJPerCm2 = ((4 * thresholdEnergyUj) / (Math.PI * line.slope)) * J_PER_CM2_PER_UJ_PER_UM2;
  const { energyShare, fluenceShare } = relativeErrors(line);
  return {
    spotRadiusUm,
    spotRadiusStandardErrorUm: line.slopeStandardError / (4 * spotRadiusUm),
    thresholdEnergyUj,
    thresholdEnergyStandardErrorUj: thresholdEnergyUj * energyShare,
    thresholdPeakFluenceJPerCm2,
    thresholdPeakFluenceStandardErrorJPerCm2: thresholdPeakFluenceJPerCm2 * fluenceShare,
    slopeUm2: line.slope,
    slopeStandardErrorUm2: line.slopeStandardError,
    interceptUm2: line.intercept,
    rSquared: line.rSquared,
  };
}

/** ln Eth = x - y/slope at the line's centre (x, y), and ln Fth = ln Eth - ln slope + constant. */
function relativeErrors({ slope, slopeStandardError, centre }: StraightLineFit) {
  const byHeight = centre.yStandardError / slope;
  const bySlope = slopeStandardError / slope;
  const lever = centre.y / slope;
  return { energyShare: Math.hypot(byHeight, lever * bySlope), fluenceShare: Math.hypot(byHeight, (lever - 1) * bySlope) };
}
