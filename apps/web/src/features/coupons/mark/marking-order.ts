import { PANEL_UNITS } from '@proofplate/physics';
import { PARAMETERS, type Panel, type ParameterSet as Setting, sameValue, showValue } from '@proofplate/recipe-model';
import { formatEntered, shopDecimalSign } from '../../../lib/format';
import type { Coupon, CouponCell, ParameterSet } from '../coupons.api';

export type DialRow = {
  key: string;
  label: string;
  value: string;
  unit: string;
  spoken: string;
  /** What stood there for the cell before; absent where nothing changed. */
  before: string | undefined;
};

export const inRunOrder = ({ cells }: Pick<Coupon, 'cells'>): readonly CouponCell[] => [...cells].sort((a, b) => a.runOrder - b.runOrder);

/** The cell whose turn it is: the first that nothing was said of. */
export const currentCell = (ordered: readonly CouponCell[]): CouponCell | undefined =>
  ordered.find(({ markState }) => markState === 'planned');

/** The cell that the machine was last set for. A skipped one was not marked, but its setting may not have been dialled in either. */
export const cellSetBefore = (ordered: readonly CouponCell[], current: CouponCell): CouponCell | undefined =>
  ordered.filter(({ runOrder, markState }) => runOrder < current.runOrder && (markState === 'marked' || markState === 'differs')).at(-1);

/** The act that Undo takes back: the latest one, whatever its place in the order. */
export const lastDone = (ordered: readonly CouponCell[]): CouponCell | undefined =>
  ordered
    .filter(({ markState }) => markState !== 'planned')
    .reduce<CouponCell | undefined>(
      (last, cell) => (last === undefined || (cell.markedAt ?? '') >= (last.markedAt ?? '') ? cell : last),
      undefined,
    );

/** What is dialled, in the order of the panel, with what changes from the setting before. */
export function dialRows(panel: Panel, set: ParameterSet, before?: ParameterSet): readonly DialRow[] {
  return panel.fields.flatMap((field) => {
    const value = set.values[field.parameter];
    if (value === undefined) return [];
    const earlier = before?.values[field.parameter];
    const isChanged = before !== undefined && (earlier === undefined || !sameValue(earlier, value));
    const text = (one: NonNullable<typeof earlier>) =>
      showValue(field, one, { decimalSign: shopDecimalSign() })?.text ?? formatEntered(one.entered.value);
    const unit = PANEL_UNITS[field.unit];
    return [
      {
        key: field.parameter,
        label: field.label,
        value: text(value),
        unit: unit.symbol,
        spoken: unit.spoken,
        before: isChanged ? (earlier === undefined ? 'not set' : text(earlier)) : undefined,
      },
    ];
  });
}

/** Values that the panel has no field for: they cannot be dialled in, so they are named. */
export function notOnPanel(panel: Panel, { values }: ParameterSet): readonly string[] {
  const shown = new Set<string>(panel.fields.map(({ parameter }) => parameter));
  return Object.keys(values)
    .filter((key) => !shown.has(key))
    .map((key) => PARAMETERS[key as keyof Setting['values']].label);
}
