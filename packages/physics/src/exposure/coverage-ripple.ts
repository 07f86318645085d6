import { requirePositive } from '../arguments/require-positive';

export type CoverageRipple = {
  readonly contrast: number;
  readonly maxOverMean: number;
  readonly minOverMean: number;
};

/** Above this w/h the Fourier sum needs few terms and loses no digits; below it the sum over lines does. */
const FOURIER_FROM_RADIUS_OVER_SPACING = 0.4;
/** Terms of either sum that can still change a double: exp(-0.79 n^2) and exp(-12 k^2) fall below 1e-40 well before. */
const TERMS = 16;

/**
 * Unevenness of the energy across a fill of equal Gaussian lines.
 *                    S(y) = sum_k exp(-2 (y - k h)^2 / w^2), w = d/2; contrast = (max - min) / (max + min)
 *
 * @param spotDiameterUm  1/e^2 diameter d on the work, um, finite, > 0
 * @param lineSpacingUm   distance h of neighbouring lines, um, finite, > 0
 * @returns contrast (0 even, 1 separate lines) and the highest and lowest energy over the mean
 * @throws RangeError naming the argument and its value, if out of range
 * Valid inside a large fill of one scan direction, for lines without pulse structure.
 * Source: Poisson summation, leading term 2 exp(-pi^2 w^2 / (2 h^2)); docs/science/scanning.md
 */
export function coverageRipple(spotDiameterUm: number, lineSpacingUm: number): CoverageRipple {
  requirePositive({ spotDiameterUm, lineSpacingUm });
  const radiusOverSpacing = spotDiameterUm / 2 / lineSpacingUm;
  return radiusOverSpacing >= FOURIER_FROM_RADIUS_OVER_SPACING ? byFourierSum(radiusOverSpacing) : byLineSum(radiusOverSpacing);
}

/** The profile over its mean is 1 + 2 sum_n q^(n^2) cos(2 pi n y / h): odd terms change sign half way between lines, even ones don't. */
function byFourierSum(radiusOverSpacing: number): CoverageRipple {
  const exponent = (-(Math.PI ** 2) * radiusOverSpacing ** 2) / 2;
  let odd = 0;
  let even = 0;
  for (let n = TERMS; n >= 1; n -= 1) {
    const term = Math.exp(exponent * n ** 2);
    if (n % 2 === 1) odd += term;
    else even += term;
  }
  return { contrast: (2 * odd) / (1 + 2 * even), maxOverMean: 1 + 2 * (even + odd), minOverMean: 1 + 2 * (even - odd) };
}

function byLineSum(radiusOverSpacing: number): CoverageRipple {
  const meanPerLine = radiusOverSpacing * Math.sqrt(Math.PI / 2);
  const onLine = lineSum(0, radiusOverSpacing);
  const between = lineSum(0.5, radiusOverSpacing);
  return {
    contrast: (onLine - between) / (onLine + between),
    maxOverMean: onLine / meanPerLine,
    minOverMean: between / meanPerLine,
  };
}

function lineSum(positionOverSpacing: number, radiusOverSpacing: number): number {
  let sum = 0;
  for (let k = -TERMS; k <= TERMS; k += 1) sum += Math.exp(-2 * ((positionOverSpacing - k) / radiusOverSpacing) ** 2);
  return sum;
}
