import { requirePositive } from '../arguments/require-positive';

/** Widths of a beam measured along its axis. */
export type CausticMeasurement = {
  readonly positionsMm: readonly number[];
  readonly diametersUm: readonly number[];
  readonly wavelengthNm: number;
};

/** What a caustic says about the beam. */
export type Caustic = {
  readonly waistDiameterUm: number;
  readonly waistPositionMm: number;
  readonly fullDivergenceMrad: number;
  readonly rayleighLengthMm: number;
  readonly m2: number;
};

const MIN_POSITIONS = 10;
/** Exact data of a perfect beam may round to just below 1. */
const M2_ROUNDING = 1e-6;

/**
 * Refuses a measurement that no fit should be made of.
 *
 * @param measurement  positions, mm, finite, at least 10; diameters, um, > 0, as many; wavelength, nm, > 0
 * @throws RangeError naming the argument and its value
 * Source: ISO 11146-1 (at least 10 positions); docs/science/caustic.md
 */
export function requireCausticMeasurement({ positionsMm, diametersUm, wavelengthNm }: CausticMeasurement): void {
  requirePositive({ wavelengthNm });
  if (positionsMm.length < MIN_POSITIONS)
    throw new RangeError(`positionsMm must have at least ${MIN_POSITIONS} positions, but has ${positionsMm.length}`);
  if (diametersUm.length !== positionsMm.length) {
    throw new RangeError(`diametersUm must have as many values as positionsMm (${positionsMm.length}), but has ${diametersUm.length}`);
  }
  for (const [index, diameterUm] of diametersUm.entries()) {
    requirePositive({ [`diametersUm[${index}]`]: diameterUm });
    if (!Number.isFinite(positionsMm[index]))
      throw new RangeError(`positionsMm[${index}] must be a finite number, but is ${positionsMm[index]}`);
  }
}

/**
 * Beam numbers from the parameters of a fitted hyperbola.          zR = d0 / Theta, M^2 = pi d0 Theta / (4 lambda)
 *
 * @param waistDiameterUm     d0, um, > 0
 * @param fullDivergenceMrad  Theta, mrad, > 0
 * @param place               waist position, mm, and wavelength, nm
 * @returns the caustic
 * @throws RangeError when the M^2 is below 1, which no beam has: the measurement is bad
 * Source: ISO 11146-1; docs/science/caustic.md
 */
export function causticOf(
  waistDiameterUm: number,
  fullDivergenceMrad: number,
  { waistPositionMm, wavelengthNm }: { readonly waistPositionMm: number; readonly wavelengthNm: number },
): Caustic {
  const m2 = (Math.PI * waistDiameterUm * fullDivergenceMrad) / (4 * wavelengthNm);
  if (m2 < 1 - M2_ROUNDING) throw new RangeError(`the fitted M² must be at least 1, but is ${m2}: measure the caustic again`);
  return { waistDiameterUm, waistPositionMm, fullDivergenceMrad, rayleighLengthMm: waistDiameterUm / fullDivergenceMrad, m2 };
}
