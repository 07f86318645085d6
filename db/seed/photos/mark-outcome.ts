/** What people call the result of a cell; the closed list of the coupon's log. */
export const MARK_OUTCOMES = [
  'no mark',
  'faint',
  'uneven',
  'banded',
  'good',
  'wrong colour',
  'overburnt',
  'charred',
  'burr',
  'halo',
  'melted',
  'cracked',
  'warped',
  'peeled',
] as const;
export type MarkOutcome = (typeof MARK_OUTCOMES)[number];
