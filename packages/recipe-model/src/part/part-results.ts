import type { DerivedNumber, RoundPartSetUp, StripLimit } from '@proofplate/physics';

/** A number of a part as it is stored and sent; absent with the reason, never zero instead. */
export type PartNumber = {
  readonly key: string;
  readonly unit: string;
  readonly formula: string;
  readonly source: string;
  readonly value: number | null;
  readonly missingBecause: string | null;
  readonly isRuledOutByMode: boolean;
  readonly outOfRange: string | null;
  readonly inputs: Readonly<Record<string, number>>;
};

export type PartResults = {
  readonly isMirrored: boolean;
  readonly stripLimit: StripLimit | null;
  readonly numbers: readonly PartNumber[];
};

/** The set-up as it is kept with a run. */
export function partResults({ isMirrored, stripLimit, numbers }: RoundPartSetUp): PartResults {
  return { isMirrored, stripLimit, numbers: numbers.map(partNumber) };
}

function partNumber({ key, unit, formula, source, ...number }: DerivedNumber): PartNumber {
  const described = { key, unit, formula, source };
  if (number.missingBecause !== undefined) {
    const { missingBecause, isRuledOutByMode } = number;
    return { ...described, value: null, missingBecause, isRuledOutByMode, outOfRange: null, inputs: {} };
  }
  const { value, inputs, outOfRange = null } = number;
  return { ...described, value, missingBecause: null, isRuledOutByMode: false, outOfRange, inputs };
}
