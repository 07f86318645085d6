import { requirePositive } from '../arguments/require-positive';
import { arealDose } from '../exposure/areal-dose';
import { averageIrradiance } from '../exposure/average-irradiance';
import { interactionTime } from '../exposure/interaction-time';

export type ContinuousSetting = {
  readonly powerW: number;
  readonly speedMmPerS: number;
  readonly lineSpacingUm: number;
  readonly spotDiameterUm: number;
};

export type ContinuousTransfer = {
  readonly powerW: number;
  readonly speedMmPerS: number;
  readonly lineSpacingUm: number;
  readonly averageIrradianceWPerMm2: number;
  readonly interactionTimeUs: number;
  readonly arealDoseJPerMm2: number;
};

/**
 * A setting of a continuous beam carried to another spot size.          r = d2/d1; P2 = P1 r^2; v2 = v1 r; h2 = h1 r
 *
 * @param source                power W, speed mm/s, line spacing um, 1/e^2 spot um, all finite, > 0
 * @param targetSpotDiameterUm  1/e^2 spot d2 of the other machine or lens, um, finite, > 0
 * @returns setting for the other spot, and what it keeps: irradiance, interaction time, areal dose of one scan
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for the same wavelength; the heat flow is not kept. The result is a proposal that needs a coupon.
 * Source: dimensional analysis; docs/science/transfer.md
 */
export function continuousTransfer(source: ContinuousSetting, targetSpotDiameterUm: number): ContinuousTransfer {
  const { powerW, speedMmPerS, lineSpacingUm, spotDiameterUm } = source;
  requirePositive({ powerW, speedMmPerS, lineSpacingUm, spotDiameterUm, targetSpotDiameterUm });
  const ratio = targetSpotDiameterUm / spotDiameterUm;
  return {
    powerW: powerW * ratio ** 2,
    speedMmPerS: speedMmPerS * ratio,
    lineSpacingUm: lineSpacingUm * ratio,
    averageIrradianceWPerMm2: averageIrradiance(powerW, spotDiameterUm),
    interactionTimeUs: interactionTime(spotDiameterUm, speedMmPerS),
    arealDoseJPerMm2: arealDose({ powerW, speedMmPerS, lineSpacingUm, scans: 1 }),
  };
}
