import {
  ASSIST_LABELS,
  COUPON_STATE_LABELS,
  FEATURE_KIND_LABELS,
  FILL_LABELS,
  REVISION_STATE_LABELS,
  ROLE_LABELS,
  ROUTE_KIND_LABELS,
  RUN_KIND_LABELS,
  SOURCE_KIND_LABELS,
  STEP_PURPOSE_LABELS,
} from '@proofplate/recipe-model';

const WORDS: ReadonlyMap<string, string> = new Map(
  [
    RUN_KIND_LABELS,
    ASSIST_LABELS,
    FEATURE_KIND_LABELS,
    FILL_LABELS,
    ROLE_LABELS,
    ROUTE_KIND_LABELS,
    SOURCE_KIND_LABELS,
    STEP_PURPOSE_LABELS,
    COUPON_STATE_LABELS,
    REVISION_STATE_LABELS,
  ].flatMap((labels) => Object.entries(labels).map(([code, label]) => [code, label.toLowerCase()] as const)),
);

/** A stored code such as `in_review` in words; undefined for what is no code of the vocabulary. */
export const codeWords = (code: string): string | undefined => WORDS.get(code);
