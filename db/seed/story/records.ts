import type { CouponLayout } from '@proofplate/imaging';
import type { Criterion, ParameterSet, RevisionContent } from '@proofplate/recipe-model';
import type { ModelledMark } from '../photos/mark-model';
import type { CouponPhotoTruth } from '../photos/render-coupon-photo';

export type MarkedCell = {
  readonly id: string;
  readonly address: string;
  readonly parameters: ParameterSet;
  mark?: ModelledMark;
  rating?: number;
  measured: { readonly quantity: string; readonly value: number; readonly unit: string }[];
};

/** What the later acts know of a coupon. */
export type CouponRecord = {
  readonly id: string;
  readonly code: string;
  readonly lot: string;
  readonly layout: CouponLayout;
  readonly cells: MarkedCell[];
  readonly criteria: readonly Criterion[];
  readonly calibrationId: string | null;
  markedAt?: Date;
  photoId?: string;
  truth?: CouponPhotoTruth;
};

export type RevisionRecord = {
  readonly id: string;
  readonly recipeId: string;
  readonly recipeCode: string;
  readonly recipeTitle: string;
  readonly content: RevisionContent;
  readonly profileId: string;
  readonly calibrationId: string | null;
  readonly calibratedOn: string | null;
  number?: number;
  state: 'draft' | 'in_review' | 'returned' | 'scheduled' | 'approved' | 'superseded' | 'withdrawn';
  contentHash?: string;
  readonly confirmationCellIds: string[];
  readonly confirmationRuns: { readonly code: string; readonly pieces: number }[];
};

/** Everything that the story has made so far, by its name in the story. */
export class Made {
  readonly coupons = new Map<string, CouponRecord>();
  readonly revisions = new Map<string, RevisionRecord>();

  coupon(key: string): CouponRecord {
    return found(this.coupons, key);
  }

  revision(key: string): RevisionRecord {
    return found(this.revisions, key);
  }
}

function found<Value>(map: ReadonlyMap<string, Value>, key: string): Value {
  const value = map.get(key);
  if (value === undefined) throw new RangeError(`the story has not come to ${key} yet`);
  return value;
}

/** The cell that the shop would choose: the best rated, of these the nearest to what was wanted. */
export function bestCell({ cells }: CouponRecord): MarkedCell {
  const [best] = cells
    .filter(({ mark }) => mark !== undefined)
    .sort((one, other) => (other.rating ?? 0) - (one.rating ?? 0) || (one.mark?.deltaETarget ?? 0) - (other.mark?.deltaETarget ?? 0));
  if (best === undefined) throw new RangeError('no cell is marked');
  return best;
}
