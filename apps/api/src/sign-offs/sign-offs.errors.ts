import { ConflictError, ForbiddenError } from '../common/errors/domain-error';
import type { ApprovalCheck } from '../recipes/approval-check';

/** What an approval needs is not all there. Carries every check that fails, never just the first. */
export class ChecksFailError extends ConflictError {
  override readonly code = 'checks-fail';
  override readonly title = 'Something that an approval needs is missing';

  constructor(failing: readonly ApprovalCheck[]) {
    const counted = failing.length === 1 ? 'One check fails' : `${failing.length} checks fail`;
    super(`${counted}: ${failing.map(({ title }) => title).join(', ')}.`, { checks: failing });
  }
}

export class SelfApprovalError extends ForbiddenError {
  override readonly code = 'self-approval';
  override readonly title = 'Nobody approves what they wrote';

  constructor() {
    super('You wrote this revision, or edited its draft. Ask another lead to sign it.');
  }
}

export class NotForThisProcessError extends ForbiddenError {
  override readonly code = 'not-your-process';
  override readonly title = 'You do not sign for this process';

  constructor(process: string) {
    super(`You are not named for ${process}. Ask a lead who is, or the owner.`);
  }
}
