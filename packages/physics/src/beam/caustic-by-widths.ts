import { leastSquares } from '@proofplate/statistics';
import { type Caustic, type CausticMeasurement, causticOf } from './caustic';
import { causticByParabola } from './caustic-by-parabola';

export type CausticFit = { readonly value: Caustic; readonly iterations: number; readonly converged: boolean };

type Hyperbola = { readonly waistUm: number; readonly positionMm: number; readonly divergenceMrad: number };

const MAX_ITERATIONS = 100;
/** Relative step at which the parameters have settled, far inside the error of any measured width. */
const SETTLED = 1e-12;
const SMALLEST_SHARE = 2 ** -30;

/**
 * Beam numbers from a measured caustic by least squares in the widths themselves.          min sum (d - sqrt(d0^2 + Theta^2 (z - z0)^2))^2
 *
 * @param measurement  positions, mm, finite, at least 10; diameters, um, > 0, as many; wavelength, nm, > 0
 * @returns the caustic, iterations used, and whether the steps settled (not settling is a result)
 * @throws RangeError naming the argument, or saying that the points form no caustic
 * Valid like causticByParabola, which gives the start; all widths weigh the same.
 * Source: ISO 11146-1 (hyperbolic fit), Gauss-Newton with halved steps; docs/science/caustic.md
 */
export function causticByWidths(measurement: CausticMeasurement): CausticFit {
  const start = causticByParabola(measurement);
  let fit: Hyperbola = { waistUm: start.waistDiameterUm, positionMm: start.waistPositionMm, divergenceMrad: start.fullDivergenceMrad };
  let iterations = 0;
  let converged = false;
  while (!converged && iterations < MAX_ITERATIONS) {
    iterations += 1;
    const next = improve(fit, measurement);
    converged = hasSettled(fit, next);
    fit = next;
  }
  const value = causticOf(Math.abs(fit.waistUm), Math.abs(fit.divergenceMrad), {
    waistPositionMm: fit.positionMm,
    wavelengthNm: measurement.wavelengthNm,
  });
  return { value, iterations, converged };
}

function widthAt({ waistUm, positionMm, divergenceMrad }: Hyperbola, zMm: number): number {
  return Math.hypot(waistUm, divergenceMrad * (zMm - positionMm));
}

function sumOfSquares(fit: Hyperbola, { positionsMm, diametersUm }: CausticMeasurement): number {
  return positionsMm.reduce((sum, zMm, i) => sum + (diametersUm[i] - widthAt(fit, zMm)) ** 2, 0);
}

/** One Gauss-Newton step, halved until it does not make the fit worse. */
function improve(fit: Hyperbola, measurement: CausticMeasurement): Hyperbola {
  const { positionsMm, diametersUm } = measurement;
  const rayleighMm = fit.waistUm / fit.divergenceMrad;
  // Columns for relative steps of waist, position (in Rayleigh lengths) and divergence, so that all have a like size.
  const rows = positionsMm.map((zMm) => {
    const widthUm = widthAt(fit, zMm);
    const farUm = fit.divergenceMrad * (zMm - fit.positionMm);
    return [fit.waistUm ** 2 / widthUm, (-farUm * fit.waistUm) / widthUm, farUm ** 2 / widthUm];
  });
  const [waistStep, positionStep, divergenceStep] = leastSquares(
    rows,
    positionsMm.map((zMm, i) => diametersUm[i] - widthAt(fit, zMm)),
  );
  const before = sumOfSquares(fit, measurement);
  for (let share = 1; share > SMALLEST_SHARE; share /= 2) {
    const next = {
      waistUm: fit.waistUm * (1 + share * waistStep),
      positionMm: fit.positionMm + share * positionStep * rayleighMm,
      divergenceMrad: fit.divergenceMrad * (1 + share * divergenceStep),
    };
    if (sumOfSquares(next, measurement) <= before) return next;
  }
  return fit;
}

function hasSettled(before: Hyperbola, after: Hyperbola): boolean {
  const rayleighMm = after.waistUm / after.divergenceMrad;
  const steps = [
    after.waistUm / before.waistUm - 1,
    after.divergenceMrad / before.divergenceMrad - 1,
    (after.positionMm - before.positionMm) / rayleighMm,
  ];
  return steps.every((step) => Math.abs(step) <= SETTLED);
}
