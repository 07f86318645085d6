import { SYMBOL_PARAMETERS, type SymbolGrade, type SymbolParameter, symbolParameterGrade } from './symbol-parameter-grade';

export type GradedSymbol = {
  readonly grade: SymbolGrade;
  /** Grade of each parameter given. */
  readonly parameters: Readonly<Partial<Record<SymbolParameter, SymbolGrade>>>;
  /** The parameters that decide. */
  readonly decidedBy: readonly SymbolParameter[];
};

/**
 * Grade of a two-dimensional code.          the lowest grade of its parameters
 *
 * @param values  values by parameter, pure numbers, finite, at least one
 * @returns the grade, the grade of each parameter, and those that decide
 * @throws RangeError naming the parameter and its value, if not finite; without any value
 * Valid for the parameters given: a verifier grades more (decoding, fixed patterns, reflectance margin).
 * Source: ISO/IEC 15415, ISO/IEC 29158; docs/science/symbol-grades.md
 */
export function symbolGrade(values: Readonly<Partial<Record<SymbolParameter, number>>>): GradedSymbol {
  const graded = SYMBOL_PARAMETERS.flatMap((parameter) => {
    const value = values[parameter];
    return value === undefined ? [] : [{ parameter, grade: symbolParameterGrade(parameter, value) }];
  });
  if (graded.length === 0) throw new RangeError('values must hold at least one parameter, but holds none');
  const [lowest] = graded.map(({ grade }) => grade).sort();
  return {
    grade: lowest,
    parameters: Object.fromEntries(graded.map(({ parameter, grade }) => [parameter, grade])),
    decidedBy: graded.filter(({ grade }) => grade === lowest).map(({ parameter }) => parameter),
  };
}
