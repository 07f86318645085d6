import { requireWithin } from '../arguments/require-within';

export type SymbolParameter =
  | 'symbolContrast'
  | 'modulation'
  | 'cellContrast'
  | 'axialNonuniformity'
  | 'gridNonuniformity'
  | 'unusedErrorCorrection';

/** 4 is the best, 0 a failure; some reports print A, B, C, D, F. */
export type SymbolGrade = 0 | 1 | 2 | 3 | 4;

type Limits = { readonly betterIs: 'higher' | 'lower'; readonly limits: readonly [number, number, number, number] };

/** Limits of grades 4, 3, 2 and 1. */
export const SYMBOL_GRADE_LIMITS: Readonly<Record<SymbolParameter, Limits>> = {
  symbolContrast: { betterIs: 'higher', limits: [0.7, 0.55, 0.4, 0.2] },
  modulation: { betterIs: 'higher', limits: [0.5, 0.4, 0.3, 0.2] },
  cellContrast: { betterIs: 'higher', limits: [0.3, 0.25, 0.2, 0.15] },
  axialNonuniformity: { betterIs: 'lower', limits: [0.06, 0.08, 0.1, 0.12] },
  gridNonuniformity: { betterIs: 'lower', limits: [0.38, 0.5, 0.63, 0.75] },
  unusedErrorCorrection: { betterIs: 'higher', limits: [0.62, 0.5, 0.37, 0.25] },
};

export const SYMBOL_PARAMETERS: readonly SymbolParameter[] = [
  'symbolContrast',
  'modulation',
  'cellContrast',
  'axialNonuniformity',
  'gridNonuniformity',
  'unusedErrorCorrection',
];

const GRADES: readonly SymbolGrade[] = [4, 3, 2, 1];
/** 0.62 - 0.07 must reach the limit of 0.55 whatever its last binary digit. */
const ROUNDING_ALLOWANCE = 1e-12;

/**
 * Grade of one parameter of a two-dimensional code.          the best grade whose limit the value reaches, else 0
 *
 * @param parameter  which parameter
 * @param value      its value, a pure number (0.55, not 55 %), finite
 * @returns grade 4 to 0
 * @throws RangeError naming the parameter and its value, if not finite
 * Valid for values of a verifier that follows the standards; of a photo the grade is an estimate, never a verification.
 * Source: ISO/IEC 15415, ISO/IEC 29158; docs/science/symbol-grades.md
 */
export function symbolParameterGrade(parameter: SymbolParameter, value: number): SymbolGrade {
  requireWithin(Number.NEGATIVE_INFINITY, Number.POSITIVE_INFINITY, { [parameter]: value });
  const { betterIs, limits } = SYMBOL_GRADE_LIMITS[parameter];
  const reached = limits.findIndex((limit) =>
    betterIs === 'higher' ? value >= limit - ROUNDING_ALLOWANCE : value <= limit + ROUNDING_ALLOWANCE,
  );
  return reached === -1 ? 0 : GRADES[reached];
}
