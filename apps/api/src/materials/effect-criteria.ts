import { type Criterion, QUANTITIES, quantityProblem } from '@proofplate/recipe-model';
import type { FieldProblem } from '../common/errors/domain-error';

export type EnteredCriterion = Omit<Criterion, 'unit'> & { readonly unit?: string | undefined };

/** What a single field cannot see: a limit that the quantity cannot reach, a unit that is not its own, limits the wrong way round, the same demand twice. */
export function criteriaProblems(criteria: readonly EnteredCriterion[]): FieldProblem[] {
  return criteria.flatMap((criterion, index) => {
    const { quantity, comparison, value, upper, unit } = criterion;
    const pointer = `#/criteria/${index}`;
    const isDouble = criteria.findIndex((other) => other.quantity === quantity && other.comparison === comparison) < index;
    return [
      ...(isDouble ? [{ pointer: `${pointer}/quantity`, detail: 'This demand stands in the list already.' }] : []),
      ...impossible(quantity, { pointer: `${pointer}/value`, limit: value }),
      ...impossible(quantity, { pointer: `${pointer}/upper`, limit: upper }),
      ...(unit !== undefined && unit !== QUANTITIES[quantity].unit
        ? [{ pointer: `${pointer}/unit`, detail: `${QUANTITIES[quantity].label} is given in ${unitWords(QUANTITIES[quantity].unit)}.` }]
        : []),
      ...(comparison === 'between' && (upper === undefined || upper <= value)
        ? [{ pointer: `${pointer}/upper`, detail: 'Enter an upper limit above the lower one.' }]
        : []),
      ...(comparison !== 'between' && upper !== undefined
        ? [{ pointer: `${pointer}/upper`, detail: 'An upper limit belongs to “between” only.' }]
        : []),
    ];
  });
}

function impossible(quantity: Criterion['quantity'], { pointer, limit }: { pointer: string; limit: number | undefined }): FieldProblem[] {
  const detail = limit === undefined ? undefined : quantityProblem(quantity, limit);
  return detail === undefined ? [] : [{ pointer, detail }];
}

/** Criteria as stored: the quantity's own unit beside each limit. */
export function criteriaAsStored(criteria: readonly EnteredCriterion[]): Criterion[] {
  return criteria.map(({ quantity, comparison, value, upper }) => ({
    quantity,
    comparison,
    value,
    ...(upper === undefined ? {} : { upper }),
    unit: QUANTITIES[quantity].unit,
  }));
}

const unitWords = (unit: string) => (unit === '1' ? 'a pure number' : unit);
