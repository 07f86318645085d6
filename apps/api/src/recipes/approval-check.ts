/** One thing that an approval needs, with what was found. */
export type ApprovalCheck = {
  readonly key: string;
  readonly passes: boolean;
  readonly title: string;
  readonly detail: string;
  /** Shown, but blocks nothing. */
  readonly isAdvisory: boolean;
  /** The act that it blocks first. */
  readonly blocks: 'submit' | 'approve';
};

/** A check with the words for both outcomes. */
export function check(
  key: string,
  title: string,
  outcome: { passes: boolean; found: string; wayOut?: string; isAdvisory?: boolean; blocks?: ApprovalCheck['blocks'] },
): ApprovalCheck {
  const { passes, found, wayOut = '', isAdvisory = false, blocks = 'submit' } = outcome;
  const detail = passes || wayOut === '' ? found : `${found} ${wayOut}`;
  return { key, passes, title, detail, isAdvisory, blocks };
}

export const blocksSubmit = ({ passes, isAdvisory, blocks }: ApprovalCheck) => !passes && !isAdvisory && blocks === 'submit';
export const blocksApproval = ({ passes, isAdvisory }: ApprovalCheck) => !passes && !isAdvisory;

/** Failing checks first, then those that only advise, each in the order of the rules. */
export function inReadingOrder(checks: readonly ApprovalCheck[]): ApprovalCheck[] {
  const weight = (item: ApprovalCheck) => (item.passes ? 2 : item.isAdvisory ? 1 : 0);
  return [...checks].sort((one, other) => weight(one) - weight(other));
}
