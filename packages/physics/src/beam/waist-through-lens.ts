import { requireAtLeast } from '../arguments/require-at-least';
import { requireFinite } from '../arguments/require-finite';
import { requirePositive } from '../arguments/require-positive';
import { rayleighLength } from './rayleigh-length';

export type LensedWaist = {
  readonly waistRadiusUm: number;
  readonly wavelengthNm: number;
  readonly m2: number;
  readonly focalLengthMm: number;
  readonly waistPositionMm: number;
};

export type WaistImage = {
  readonly inputRayleighLengthMm: number;
  readonly waistRadiusUm: number;
  readonly rayleighLengthMm: number;
  readonly distanceMm: number;
};

/**
 * Waist behind a thin lens, for a beam that is not collimated at it.
 *          m = f / sqrt((s + f)^2 + zR^2); w0' = m w0; zR' = m^2 zR; s' = f - f^2 (s + f) / ((s + f)^2 + zR^2)
 *
 * @param beam.waistRadiusUm    1/e^2 radius of the waist before the lens, um, finite, > 0
 * @param beam.wavelengthNm     wavelength, nm, finite, > 0
 * @param beam.m2               beam propagation ratio M^2, finite, >= 1
 * @param beam.focalLengthMm    focal length f, mm, finite, > 0
 * @param beam.waistPositionMm  position s of that waist, mm, finite, negative before the lens
 * @returns Rayleigh length before the lens; radius, Rayleigh length and distance of the waist behind it
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for a paraxial beam and a thin lens without aberrations.
 * Source: S. A. Self, Appl. Opt. 22 (1983) 658; docs/science/caustic.md
 */
export function waistThroughLens({ waistRadiusUm, wavelengthNm, m2, focalLengthMm, waistPositionMm }: LensedWaist): WaistImage {
  requirePositive({ waistRadiusUm, wavelengthNm, focalLengthMm });
  requireAtLeast(1, { m2 });
  requireFinite({ waistPositionMm });
  const inputRayleighLengthMm = rayleighLength({ spotDiameterUm: 2 * waistRadiusUm, wavelengthNm, m2 });
  const fromFocusMm = waistPositionMm + focalLengthMm;
  const squareMm2 = fromFocusMm ** 2 + inputRayleighLengthMm ** 2;
  const magnification = focalLengthMm / Math.sqrt(squareMm2);
  return {
    inputRayleighLengthMm,
    waistRadiusUm: magnification * waistRadiusUm,
    rayleighLengthMm: magnification ** 2 * inputRayleighLengthMm,
    distanceMm: focalLengthMm - (focalLengthMm ** 2 * fromFocusMm) / squareMm2,
  };
}
