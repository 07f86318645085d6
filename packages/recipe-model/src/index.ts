export type { DecimalSign, Fill, PanelUnit } from '@proofplate/physics';
export { type BoundRevision, boundContent } from './canonical/bound-content';
export { canonicalForm, NotCanonicalError } from './canonical/canonical-form';
export { CONTENT_FORMAT, contentHash, contentText } from './canonical/content-text';
export {
  CAUTION_DEFERENCE,
  CAUTION_LEVEL_LABELS,
  type Caution,
  type CautionLevel,
  type CautionScope,
} from './cautions/caution';
export { type CautionSubject, cautionsFor, isForbidden } from './cautions/cautions-for';
export type { CraterCell, CraterFit, CraterIncubation, CraterPoint, CraterSeries, SeriesThreshold } from './craters/crater';
export { craterFit } from './craters/crater-fit';
export type { CraterGround } from './craters/read-crater';
export { parameterClassOf, type SettingItem, type ShopClasses, settingItemLabel } from './diff/parameter-class';
export { sameValue } from './diff/same-value';
export { type ChangeSide, type ChangeSize, type SettingChange, settingDiff } from './diff/setting-diff';
export { hasEssentialChange, type StepChange, stepsDiff } from './diff/steps-diff';
export { cellAddress, findCell, rowLetters } from './grid/cell-address';
export { type CrossedGrid, cellsOfGrid, type GridCell, type GridFactor } from './grid/cells-of-grid';
export { LEVEL_SPACING_LABELS, type LevelRequest, type LevelSpacing, type Levels, levels, MAX_LEVELS } from './grid/levels';
export { runOrder } from './grid/run-order';
export {
  type ChainFault,
  type ChainHead,
  firstFault,
  GENESIS_HASH,
  type LedgerBody,
  type LinkedEvent,
  linkEvent,
  type Sha256,
} from './ledger/ledger-chain';
export { type ClosedRange, isAbove, isWithinRange, largestPulseEnergyMj, machineRange } from './numbers/machine-limits';
export { type AreaMm, markAreaOf, type TimedAreaMm } from './numbers/mark-area';
export { markOfSetting, type NumberedSetting } from './numbers/mark-of-setting';
export type { Optics } from './numbers/optics';
export type { SettingNumber } from './numbers/setting-number';
export {
  type DoseCaution,
  type NumbersGround,
  type SettingNumbers,
  type StepNumbers,
  settingNumbers,
  stepNumbers,
} from './numbers/setting-numbers';
export { type SettingRemark, settingRemarks } from './numbers/setting-remarks';
export { type TypedMachine, type TypedStep, typedSetting } from './numbers/typed-setting';
export { emptyPanelFor } from './panel/empty-panel';
export { acceptEntered, type Entry, type EntryContext, type EntryRefusal, enterValue } from './panel/enter-value';
export { neededKeys } from './panel/needed-keys';
export type { Panel, PanelField } from './panel/panel';
export { type PanelProblem, panelProblems } from './panel/panel-problems';
export { showNumber } from './panel/show-number';
export { type ShownValue, showValue } from './panel/show-value';
export { isShowable, nearestShowable, roundToPanel } from './panel/showable';
export {
  type EnteredLength,
  type EnteredPart,
  FOCUS_ALLOWANCE_LABELS,
  FOCUS_ALLOWANCES,
  FOCUS_PLACE_LABELS,
  FOCUS_PLACES,
  type FocusAllowance,
  type FocusPlace,
  LENGTH_UNITS,
  LENGTHS_OF_SHAPE,
  type LengthUnit,
  PART_SHAPE_LABELS,
  PART_SHAPES,
  PART_SIDE_LABELS,
  PART_SIDES,
  type PartField,
  type PartGround,
  type PartLength,
  type PartProblem,
  type PartShape,
  type PartSide,
} from './part/entered-part';
export { type PartOpticsFacts, partGround } from './part/part-ground';
export { lengthIn, lengthMm, lengthWords } from './part/part-lengths';
export { type PartNumber, type PartResults, partResults } from './part/part-results';
export { PART_INSIDE_NOT_CHECKED, PART_NOT_CHECKED, type PartSetUp, partSetUp } from './part/part-set-up';
export { type DatedCalibration, type PowerShift, type PowerShiftInput, powerShift } from './power/power-shift';
export { CALIBRATION_FREQUENCY_TOLERANCE, type MeasuredCalibration, type WorkPowerInput, workPower } from './power/work-power';
export { matchesWords, wordsOf } from './search/matches-words';
export type { ShippedCaution } from './starter-content/shipped-caution';
export { SHIPPED_CAUTIONS } from './starter-content/shipped-cautions';
export { SHIPPED_EFFECTS, type ShippedEffect } from './starter-content/shipped-effects';
export {
  COUPON_ACTION_LABELS,
  COUPON_STATE_LABELS,
  type CouponAction,
  type CouponState,
  isCitable,
  nextCouponState,
} from './states/coupon-state';
export type { Moved } from './states/moves';
export {
  isEditable,
  nextRevisionState,
  REVISION_ACTION_LABELS,
  REVISION_STATE_LABELS,
  type RevisionAction,
  type RevisionState,
} from './states/revision-state';
export { type ClockedMark, overheadsFromMarks } from './time/clocked-mark';
export { type HeadDelays, type HeadOverheads, headOverheads } from './time/head-overheads';
export { type MarkTime, markTime, pausesOf, settingTime, type TimeGround } from './time/mark-time';
export { type MarkedArea, type MarkedAreas, markedAreas } from './time/marked-area';
export type {
  FrequencyBand,
  FrequencyInterval,
  KeptNumber,
  TransferCalibration,
  TransferChoice,
  TransferInput,
  TransferNumbers,
  TransferOutcome,
  TransferPlace,
  TransferProposal,
  TransferReason,
  TransferResult,
  TransferStep,
} from './transfer/transfer-ground';
export { isDraftable, transferSetting } from './transfer/transfer-setting';
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
export { LIMITS_OF_QUANTITY, METHODS_OF_QUANTITY, type QuantityLimits, quantityProblem } from './vocabulary/measurement-rules';
export {
  MEASUREMENT_METHODS,
  MEASUREMENT_QUANTITIES,
  METHOD_LABELS,
  type MeasurementMethod,
  type MeasurementQuantity,
  QUANTITIES,
  type QuantityMeaning,
} from './vocabulary/measurements';
export { criterionText, meetsCriterion } from './vocabulary/meets-criterion';
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
export { rangesOverlap, scopesOverlap } from './vocabulary/scopes-overlap';
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
