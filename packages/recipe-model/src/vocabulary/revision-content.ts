import type { FeatureKind } from './lists';
import type { MarkStep, SetUpStep } from './setting';

/** A closed range; an open end is absent. */
export type Range = { from?: number; to?: number };

/** Where the setting may be used, as the author states it. */
export type LimitsOfUse = { thicknessMm?: Range; partDiameterMm?: Range; notes: string };

/** What the recipe covers beyond its five keys (material, finish, effect, machine, lens); two approved recipes must not overlap in it. */
export type RecipeScope = {
  thicknessMm?: Range;
  partDiameterMm?: Range;
  featureKind?: FeatureKind;
  featureSizeMm?: Range;
  materialGroupId?: string;
  customerSpecification?: string;
};

/** What a signature covers. */
export type RevisionContent = {
  steps: MarkStep[];
  setUpSteps: SetUpStep[];
  limits: LimitsOfUse;
  scope: RecipeScope;
};
