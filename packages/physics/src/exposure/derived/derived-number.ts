import type { Quantity } from './mark-parameters';

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

export type AbsentNumber = Described & { readonly value?: undefined; readonly missingBecause: string };

export type DerivedNumber = PresentNumber | AbsentNumber;

/** Computes a number when all its inputs are known; else says which ones are not, and why. */
export function derive<Name extends string>(
  described: Described,
  inputs: Readonly<Record<Name, Quantity>>,
  rule: {
    readonly compute: (known: Readonly<Record<NoInfer<Name>, number>>) => number;
    readonly outOfRange?: (known: Readonly<Record<NoInfer<Name>, number>>) => string | undefined;
  },
): DerivedNumber {
  const reasons = new Set<string>();
  const known: Partial<Record<Name, number>> = {};
  for (const name in inputs) {
    const quantity: Quantity = inputs[name];
    if (typeof quantity === 'number') known[name] = quantity;
    else reasons.add(quantity.unknownBecause);
  }
  if (!isComplete(known, reasons)) return { ...described, missingBecause: [...reasons].join('; ') };
  const outOfRange = rule.outOfRange?.(known);
  return { ...described, value: rule.compute(known), inputs: known, ...(outOfRange === undefined ? {} : { outOfRange }) };
}

/** Without a reason every name has been filled in. */
function isComplete<Name extends string>(
  known: Partial<Record<Name, number>>,
  reasons: ReadonlySet<string>,
): known is Record<Name, number> {
  return reasons.size === 0;
}

/** A derived number as an input of the next one: its reason is handed on. */
export function quantityOf(derived: DerivedNumber): Quantity {
  return derived.missingBecause === undefined ? derived.value : { unknownBecause: derived.missingBecause };
}
