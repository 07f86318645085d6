import type { Fill } from '@proofplate/physics';
import { codesOf, type Labels } from './labelled';

/** Closed lists of the records, each code with its words. */

export type SourceKind = 'fibre-q-switched' | 'fibre-mopa' | 'co2' | 'uv' | 'green' | 'diode' | 'ultrafast';
export const SOURCE_KIND_LABELS: Labels<SourceKind> = {
  'fibre-q-switched': 'Fibre, Q-switched',
  'fibre-mopa': 'Fibre, pulse width settable (MOPA)',
  co2: 'CO₂',
  uv: 'UV, frequency-tripled',
  green: 'Green, frequency-doubled',
  diode: 'Diode',
  ultrafast: 'Ultrafast (picosecond, femtosecond)',
};

export const FILL_LABELS: Labels<Fill> = {
  'one direction': 'One direction',
  'both directions': 'Both directions',
  crossed: 'Crossed (two scans a pass)',
  outline: 'Outline only',
};

export type Assist = 'none' | 'air' | 'nitrogen' | 'argon' | 'oxygen' | 'water-film' | 'marking-spray' | 'masking-tape';
export const ASSIST_LABELS: Labels<Assist> = {
  none: 'None',
  air: 'Air',
  nitrogen: 'Nitrogen',
  argon: 'Argon',
  oxygen: 'Oxygen',
  'water-film': 'Water film',
  'marking-spray': 'Marking spray or paste',
  'masking-tape': 'Masking tape',
};

export type StepPurpose =
  | 'rough'
  | 'clean-up'
  | 'fill'
  | 'outline'
  | 'anneal'
  | 'bleach'
  | 'engrave'
  | 'remove-coating'
  | 'polish'
  | 'frost'
  | 'cut'
  | 'other';
export const STEP_PURPOSE_LABELS: Labels<StepPurpose> = {
  rough: 'Rough',
  'clean-up': 'Clean up',
  fill: 'Fill',
  outline: 'Outline',
  anneal: 'Anneal',
  bleach: 'Bleach',
  engrave: 'Engrave',
  'remove-coating': 'Remove coating',
  polish: 'Polish',
  frost: 'Frost',
  cut: 'Cut',
  other: 'Other',
};

export type Outcome =
  | 'no-mark'
  | 'faint'
  | 'uneven'
  | 'banded'
  | 'good'
  | 'wrong-colour'
  | 'overburnt'
  | 'charred'
  | 'burr'
  | 'halo'
  | 'melted'
  | 'cracked'
  | 'warped'
  | 'peeled';
export const OUTCOME_LABELS: Labels<Outcome> = {
  'no-mark': 'No mark',
  faint: 'Faint',
  uneven: 'Uneven',
  banded: 'Banded',
  good: 'Good',
  'wrong-colour': 'Wrong colour',
  overburnt: 'Overburnt',
  charred: 'Charred',
  burr: 'Burr',
  halo: 'Halo',
  melted: 'Melted',
  cracked: 'Cracked',
  warped: 'Warped',
  peeled: 'Peeled',
};

export type Rating = 0 | 1 | 2 | 3 | 4 | 5;
export const RATING_CAPTIONS: Readonly<Record<Rating, string>> = {
  0: 'no mark',
  1: 'visible, not usable',
  2: 'poor, not usable',
  3: 'usable with remarks',
  4: 'as wanted',
  5: 'reference',
};
export const RATINGS: readonly Rating[] = [0, 1, 2, 3, 4, 5];

export type RouteKind = 'coupons' | 'earlier-experience' | 'customer-given' | 'transferred';
export const ROUTE_KIND_LABELS: Labels<RouteKind> = {
  coupons: 'Proved on coupons',
  'earlier-experience': 'Earlier experience',
  'customer-given': 'Given by the customer',
  transferred: 'Transferred from another machine',
};

export type FeatureKind = 'filled-area' | 'stroke-text' | 'single-line' | 'code';
export const FEATURE_KIND_LABELS: Labels<FeatureKind> = {
  'filled-area': 'Filled area',
  'stroke-text': 'Stroke text',
  'single-line': 'Single line',
  code: '2D code',
};

export type RunKind = 'production' | 'confirmation' | 'daily-check';
export const RUN_KIND_LABELS: Labels<RunKind> = {
  production: 'Production',
  confirmation: 'Confirmation',
  'daily-check': 'Daily check',
};

export type EffectKey =
  | 'dark-anneal'
  | 'colour-anneal'
  | 'shallow-engrave'
  | 'deep-engrave'
  | 'dye-bleaching'
  | 'coating-removal'
  | 'dark-mark'
  | 'white-mark'
  | 'foam'
  | 'frost'
  | 'polish'
  | 'ablate'
  | 'cut-mark';
/** The effects that every shop starts with; a shop may add its own under other keys. */
export const EFFECT_LABELS: Labels<EffectKey> = {
  'dark-anneal': 'Dark anneal',
  'colour-anneal': 'Colour anneal',
  'shallow-engrave': 'Shallow engrave',
  'deep-engrave': 'Deep engrave',
  'dye-bleaching': 'Dye bleaching (oxide kept)',
  'coating-removal': 'Coating removal',
  'dark-mark': 'Dark mark',
  'white-mark': 'White mark',
  foam: 'Foam',
  frost: 'Frost',
  polish: 'Polish',
  ablate: 'Ablate',
  'cut-mark': 'Cut mark',
};

export const SOURCE_KINDS = codesOf(SOURCE_KIND_LABELS);
export const FILLS = codesOf(FILL_LABELS);
export const ASSISTS = codesOf(ASSIST_LABELS);
export const STEP_PURPOSES = codesOf(STEP_PURPOSE_LABELS);
export const OUTCOMES = codesOf(OUTCOME_LABELS);
export const ROUTE_KINDS = codesOf(ROUTE_KIND_LABELS);
export const FEATURE_KINDS = codesOf(FEATURE_KIND_LABELS);
export const RUN_KINDS = codesOf(RUN_KIND_LABELS);
export const EFFECT_KEYS = codesOf(EFFECT_LABELS);
