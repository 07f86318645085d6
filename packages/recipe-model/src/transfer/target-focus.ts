import type { MarkStep } from '../vocabulary/setting';
import { roundPhysical } from './dial-in';
import { rayleighOf, spotOnWork } from './spot-on-work';
import { fieldOf } from './target-limits';
import type { Found, TransferChoice, TransferPlace } from './transfer-ground';

export type TargetFocus = { readonly focusOffsetMm: number; readonly spotUm: number };

/**
 * Where the surface lies on the target, and the spot there.          z2 = z1 zR2 / zR1, rounded to the panel; chosen: as chosen
 *
 * @param step    step of the source, with its focus offset in mm
 * @param places  source and target with their optics
 * @param choice  a focus offset that somebody chose, mm
 * @returns offset mm and 1/e² spot um, or what is missing on either side
 * Valid as a starting point: the same share of the Rayleigh length grows both spots by the same factor.
 * Source: docs/science/transfer.md
 */
export function targetFocus(
  { parameters }: MarkStep,
  { source, target }: { readonly source: TransferPlace; readonly target: TransferPlace },
  choice: TransferChoice,
): Found<TargetFocus> {
  const wanted = wantedOffset(parameters.values.focusOffsetMm?.physical ?? 0, source, target, choice.focusOffsetMm);
  if (wanted.value === undefined) return wanted;
  const field = fieldOf(target.panel, 'focusOffsetMm');
  const focusOffsetMm = field === undefined ? wanted.value : (roundPhysical(field, wanted.value)?.physical ?? wanted.value);
  const spot = spotOnWork(target, focusOffsetMm, 'target');
  return spot.value === undefined ? spot : { value: { focusOffsetMm, spotUm: spot.value } };
}

function wantedOffset(sourceMm: number, source: TransferPlace, target: TransferPlace, chosenMm: number | undefined): Found<number> {
  if (chosenMm !== undefined) return { value: chosenMm };
  if (sourceMm === 0) return { value: 0 };
  const before = rayleighOf(source, 'source');
  const after = rayleighOf(target, 'target');
  if (before.value === undefined || after.value === undefined) return { reasons: [...(before.reasons ?? []), ...(after.reasons ?? [])] };
  return { value: (sourceMm * after.value) / before.value };
}
