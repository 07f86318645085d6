import { leastSquares } from '@proofplate/statistics';
import { type Caustic, type CausticMeasurement, causticOf, requireCausticMeasurement } from './caustic';

/**
 * Beam numbers from a measured caustic by a parabola in d^2, unweighted.
 *          d^2 = a + b z + c z^2; d0 = sqrt(4ac - b^2)/(2 sqrt c), z0 = -b/(2c), Theta = sqrt c, M^2 = pi sqrt(4ac - b^2)/(8 lambda)
 *
 * @param measurement  positions, mm, finite, at least 10; diameters, um, > 0, as many; wavelength, nm, > 0
 * @returns waist diameter and position, divergence, Rayleigh length, M^2
 * @throws RangeError naming the argument, or saying that the points form no caustic (4ac <= b^2, or M^2 below 1)
 * Valid with about half the positions within one Rayleigh length and half beyond two. Wide spots weigh most.
 * Source: ISO 11146-1; docs/science/caustic.md
 */
export function causticByParabola(measurement: CausticMeasurement): Caustic {
  requireCausticMeasurement(measurement);
  const { positionsMm, diametersUm, wavelengthNm } = measurement;
  // Positions are moved to their middle and scaled to -1..1: the normal columns would lose half the digits.
  const lowest = Math.min(...positionsMm);
  const middle = (lowest + Math.max(...positionsMm)) / 2;
  const halfRange = middle - lowest;
  if (!(halfRange > 0)) throw new RangeError(`positionsMm must differ, but all are ${middle}`);
  const rows = positionsMm.map((position) => {
    const t = (position - middle) / halfRange;
    return [1, t, t ** 2];
  });
  const [a, b, c] = leastSquares(
    rows,
    diametersUm.map((diameterUm) => diameterUm ** 2),
  );
  const discriminant = 4 * a * c - b ** 2;
  if (!(c > 0 && discriminant > 0)) throw new RangeError('the diameters form no caustic: the fitted parabola reaches a width of zero');
  const waistDiameterUm = Math.sqrt(discriminant / c) / 2;
  const waistPositionMm = middle - (halfRange * b) / (2 * c);
  return causticOf(waistDiameterUm, Math.sqrt(c) / halfRange, { waistPositionMm, wavelengthNm });
}
