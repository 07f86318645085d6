/** Rules of a shop that only its owner changes, by a signed act. */
export type ShopPolicy = {
  readonly minimumConfirmationMarks: number;
  readonly authorMaySign: boolean;
  readonly reviewEveryDays: number;
  readonly overdueBlocks: boolean;
  readonly photoRequired: boolean;
  readonly calibrationAgeDays: number;
  readonly powerShiftPercent: number;
  readonly secondFactorForSigning: boolean;
};

/** What a new shop starts with. */
export const DEFAULT_SHOP_POLICY: ShopPolicy = {
  minimumConfirmationMarks: 3,
  authorMaySign: false,
  reviewEveryDays: 365,
  overdueBlocks: false,
  photoRequired: true,
  calibrationAgeDays: 180,
  powerShiftPercent: 5,
  secondFactorForSigning: false,
};

const POLICY_KEYS = [
  'minimumConfirmationMarks',
  'authorMaySign',
  'reviewEveryDays',
  'overdueBlocks',
  'photoRequired',
  'calibrationAgeDays',
  'powerShiftPercent',
  'secondFactorForSigning',
] as const satisfies readonly (keyof ShopPolicy)[];

/** True when no rule differs. */
export const isSamePolicy = (one: ShopPolicy, other: ShopPolicy) => POLICY_KEYS.every((key) => one[key] === other[key]);
