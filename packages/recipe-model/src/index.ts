export {
  CAUTION_LEVEL_LABELS,
  type Caution,
  type CautionLevel,
  type CautionScope,
} from './cautions/caution';
export type { Panel, PanelField } from './panel/panel';
export { COMPARISON_LABELS, COMPARISONS, type Comparison, type Criterion } from './vocabulary/criteria';
export { codesOf, isCodeOf, type Labels } from './vocabulary/labelled';
export {
  ASSIST_LABELS,
  ASSISTS,
  type Assist,
  EFFECT_KEYS,
  EFFECT_LABELS,
  type EffectKey,
  FEATURE_KIND_LABELS,
  FEATURE_KINDS,
  type FeatureKind,
  FILL_LABELS,
  FILLS,
  type Fill,
  OUTCOME_LABELS,
  OUTCOMES,
  type Outcome,
  RATING_CAPTIONS,
  RATINGS,
  type Rating,
  ROUTE_KIND_LABELS,
  ROUTE_KINDS,
  type RouteKind,
  RUN_KIND_LABELS,
  RUN_KINDS,
  type RunKind,
  SOURCE_KIND_LABELS,
  SOURCE_KINDS,
  type SourceKind,
  STEP_PURPOSE_LABELS,
  STEP_PURPOSES,
  type StepPurpose,
} from './vocabulary/lists';
export {
  type FamilyMeaning,
  MATERIAL_FAMILIES,
  MATERIAL_FAMILY_KEYS,
  type MaterialFamily,
  materialFamilyOf,
} from './vocabulary/material-families';
export {
  MEASUREMENT_METHODS,
  MEASUREMENT_QUANTITIES,
  METHOD_LABELS,
  type MeasurementMethod,
  type MeasurementQuantity,
  QUANTITIES,
  type QuantityMeaning,
} from './vocabulary/measurements';
export {
  PARAMETER_CLASS_LABELS,
  PARAMETER_KEYS,
  PARAMETERS,
  type ParameterClass,
  type ParameterKey,
  type ParameterMeaning,
} from './vocabulary/parameters';
export type { PhysicalProfile, PulseEnergyLimit } from './vocabulary/profile';
export type { LimitsOfUse, Range, RecipeScope, RevisionContent } from './vocabulary/revision-content';
export { ROLE_LABELS, ROLES, type Role, roleAtLeast } from './vocabulary/roles';
export type {
  DelaysUs,
  EnteredValue,
  MarkStep,
  ParameterSet,
  ParameterValues,
  SetUpStep,
  SetValue,
  WorkPower,
} from './vocabulary/setting';
