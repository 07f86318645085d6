import type { Quantity, Unknown } from './mark-parameters';

type Described = {
  readonly key: string;
  readonly unit: string;
  /** How the number is computed, for showing beside it. */
  readonly formula: string;
  /** Where the formula comes from. */
  readonly source: string;
};

export type PresentNumber = Described & {
  readonly value: number;
  /** Numbers that went into the value, by name with unit. */
  readonly inputs: Readonly<Record<string, number>>;
  readonly missingBecause?: undefined;
  /** Limit of the formula that these inputs break; the value is still what the formula gives. */
  readonly outOfRange?: string;
};

export type AbsentNumber = Described & {
  readonly value?: undefined;
  readonly missingBecause: string;
  /** True when the number has no meaning in this mode; false when an input would bring it. */
  readonly isRuledOutByMode: boolean;
};

export type DerivedNumber = PresentNumber | AbsentNumber;

/**
 * Computes a number when all its inputs are known; else says which ones are not, and why. A reason of the mode stands alone: with it no
 * further input would help.
 */
export function derive<Name extends string>(
  described: Described,
  inputs: Readonly<Record<Name, Quantity>>,
  rule: {
    readonly compute: (known: Readonly<Record<NoInfer<Name>, number>>) => number;
    readonly outOfRange?: (known: Readonly<Record<NoInfer<Name>, number>>) => string | undefined;
  },
): DerivedNumber {
  const unknowns: Unknown[] = [];
  const known: Partial<Record<Name, number>> = {};
  for (const name in inputs) {
    const quantity: Quantity = inputs[name];
    if (typeof quantity === 'number') known[name] = quantity;
    else unknowns.push(quantity);
  }
  if (!isComplete(known, unknowns)) return absent(described, ...unknowns);
  const outOfRange = rule.outOfRange?.(known);
  return { ...described, value: rule.compute(known), inputs: known, ...(outOfRange === undefined ? {} : { outOfRange }) };
}

/** Without an unknown every name has been filled in. */
function isComplete<Name extends string>(
  known: Partial<Record<Name, number>>,
  unknowns: readonly Unknown[],
): known is Record<Name, number> {
  return unknowns.length === 0;
}

/** A number without a value, and why. */
export function absent(described: Described, ...unknowns: readonly Unknown[]): AbsentNumber {
  const byMode = unknowns.filter((unknown) => unknown.isRuledOutByMode === true);
  const telling = byMode.length > 0 ? byMode : unknowns;
  const reasons = new Set(telling.map((unknown) => unknown.unknownBecause));
  return { ...described, missingBecause: [...reasons].join('; '), isRuledOutByMode: byMode.length > 0 };
}

/** A derived number as an input of the next one: its reason is handed on. */
export function quantityOf(derived: DerivedNumber): Quantity {
  return derived.missingBecause === undefined
    ? derived.value
    : { unknownBecause: derived.missingBecause, isRuledOutByMode: derived.isRuledOutByMode };
}
