import type { DerivedNumber } from '@proofplate/physics';
import type { MarkStep } from '@proofplate/recipe-model';
import { numbersOf } from '../coupons/coupon-plan-numbers';
import type { DerivedNumberDto } from './dto/derived-number.dto';
import type { RevisionRecord } from './stored-revision';

/** Numbers that follow from a mark step on the machine and lens of its recipe. */
export function stepNumbers({ parameters }: MarkStep, { profile, optics }: Pick<RevisionRecord, 'profile' | 'optics'>): DerivedNumberDto[] {
  return [...numbersOf(parameters, { physical: profile.physical, ...optics }).values()].map(toDerivedNumberDto);
}

function toDerivedNumberDto({ key, unit, formula, source, ...number }: DerivedNumber): DerivedNumberDto {
  const described = { key, unit, formula, source };
  if (number.missingBecause !== undefined)
    return { ...described, value: null, missingBecause: number.missingBecause, outOfRange: null, inputs: {} };
  return { ...described, value: number.value, missingBecause: null, outOfRange: number.outOfRange ?? null, inputs: { ...number.inputs } };
}
