import { ConflictError } from '../common/errors/domain-error';

export class LastOwnerError extends ConflictError {
  override readonly code = 'last-owner';
  override readonly title = 'A shop keeps at least one owner';

  constructor() {
    super('Make somebody else an owner first.');
  }
}

export class AlreadyMemberError extends ConflictError {
  override readonly code = 'already-member';
  override readonly title = 'This person is in the shop already';

  constructor() {
    super('Change the role of the member instead of inviting again.');
  }
}

export class InvitationNotUsableError extends ConflictError {
  override readonly code = 'invitation-not-usable';
  override readonly title = 'This invitation cannot be used';

  constructor() {
    super('It was used, taken back or has run out. Ask the shop for a new one.');
  }
}
