import { type SetValue, showNumber } from '@proofplate/recipe-model';
import type { ComparedValueDto } from './dto/comparison.dto';
import type { ChangeSizeDto } from './dto/recipe-revision.dto';

/** One value of a comparison's row. */
export type Side =
  | { readonly kind: 'absent'; readonly missingBecause: string | null }
  | { readonly kind: 'word'; readonly text: string }
  | { readonly kind: 'number'; readonly value: number; readonly text: string }
  /** Typed on a panel: two are the same when the panel values or the physical values agree. */
  | { readonly kind: 'setting'; readonly value: number; readonly set: SetValue; readonly isSameAs: (other: SetValue) => boolean };

/** Computed numbers that differ less than this are the same number. */
const SAME_WITHIN = 1e-9;
const DIGITS = 12;

/** Every value of a row against the reference's. */
export function compareSides(
  sides: readonly Side[],
  { ids, referenceAt, unit }: { ids: readonly string[]; referenceAt: number; unit: string },
): ComparedValueDto[] {
  const reference = sides[referenceAt];
  return sides.map((side, index) => ({
    revisionId: ids[index] ?? '',
    value: 'value' in side ? side.value : null,
    text: textOf(side),
    missingBecause: side.kind === 'absent' ? side.missingBecause : null,
    change: index === referenceAt || reference === undefined ? 'reference' : changeOf(reference, side),
    size: index === referenceAt || reference === undefined ? null : sizeOf(reference, side, unit),
  }));
}

function textOf(side: Side): string | null {
  if (side.kind === 'absent') return null;
  return side.kind === 'setting' ? showNumber(side.value) : side.text;
}

function changeOf(reference: Side, side: Side): ComparedValueDto['change'] {
  if (isUnknown(reference) || isUnknown(side)) return isUnknown(reference) && isUnknown(side) ? 'same' : 'not comparable';
  if (reference.kind === 'absent') return side.kind === 'absent' ? 'same' : 'added';
  if (side.kind === 'absent') return 'removed';
  return isSame(reference, side) ? 'same' : 'changed';
}

/** Missing for a reason, which is another thing than not set. */
const isUnknown = (side: Side) => side.kind === 'absent' && side.missingBecause !== null;

function isSame(reference: Side, side: Side): boolean {
  if (reference.kind === 'setting' && side.kind === 'setting') return reference.isSameAs(side.set);
  if (reference.kind === 'word' && side.kind === 'word') return reference.text === side.text;
  if (!('value' in reference) || !('value' in side)) return false;
  return Math.abs(reference.value - side.value) <= SAME_WITHIN * Math.max(Math.abs(reference.value), Math.abs(side.value));
}

function sizeOf(reference: Side, side: Side, unit: string): ChangeSizeDto | null {
  if (!('value' in reference) || !('value' in side) || isSame(reference, side)) return null;
  const delta = withoutNoise(side.value - reference.value);
  if (unit === '%') return { delta, symbol: unit, percent: null, points: delta };
  const percent = reference.value === 0 ? null : withoutNoise(((side.value - reference.value) / Math.abs(reference.value)) * 100);
  return { delta, symbol: unit, percent, points: null };
}

/** 12 digits: 0.3 − 0.1 reads as 0.2. */
const withoutNoise = (value: number) => Number(value.toPrecision(DIGITS));
