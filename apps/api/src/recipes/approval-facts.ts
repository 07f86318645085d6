import type { MarkStep, RecipeScope, RouteKind } from '@proofplate/recipe-model';
import type { ShopPolicy } from '../shops/shop-policy';
import type { EvidenceCell, RevisionCalibration, RevisionRecord } from './stored-revision';

/** Everything that the checks weigh. */
export type ApprovalFacts = {
  readonly record: RevisionRecord;
  readonly policy: ShopPolicy;
  readonly now: Date;
  /** Approved revision of the recipe; null: there is none, or it is this one. */
  readonly current: { readonly number: number | null; readonly steps: readonly MarkStep[]; readonly newestEvidenceAt: Date | null } | null;
  /** Readings of the machine's power, newest first. */
  readonly readings: readonly RevisionCalibration[];
  /** Other recipes with the same five keys that have an approved or scheduled revision. */
  readonly mates: readonly { readonly recipeCode: string; readonly scope: RecipeScope }[];
  readonly acknowledgedByAuthor: readonly string[];
};

/** Routes on which marks of the machine itself have to prove the setting. */
export const provesOnCoupons = (route: RouteKind): boolean => route === 'coupons' || route === 'transferred';

/**
 * Same material, finish, effect, machine in its physical state, and lens. A plate burnt before it was logged may be of a machine that was
 * changed since: what nobody knows is not the same.
 */
export function isSameWork({ coupon }: EvidenceCell, { recipe, profile }: RevisionRecord): boolean {
  const { keys } = coupon;
  return (
    keys.materialId === recipe.material.id &&
    keys.finishId === recipe.finish.id &&
    keys.effectId === recipe.effect.id &&
    keys.machineId === recipe.machine.id &&
    keys.lensId === recipe.lens.id &&
    coupon.physicalNumber === profile.physicalNumber &&
    !coupon.unknownFields.includes('profile')
  );
}
