import { ConflictError, ForbiddenError, InvalidError, NotFoundError, StaleError } from '../common/errors/domain-error';

export class RecipeNotFoundError extends NotFoundError {
  constructor() {
    super('This recipe is not in the shop. Go back to Recipes and choose again.');
  }
}

export class RevisionNotFoundError extends NotFoundError {
  constructor() {
    super('This revision is not in the shop, or its draft was discarded. Go back to Recipes and choose again.');
  }
}

/** An act that the state of the revision does not allow; carries the present state. */
export class RevisionStateError extends ConflictError {
  override readonly code = 'revision-state';
  override readonly title = 'The revision is not in the state for this';

  constructor(detail: string, current?: unknown) {
    super(detail, current === undefined ? {} : { current });
  }
}

/** Somebody signs what is no longer the record. */
export class StaleRevisionError extends StaleError {
  override readonly code: string = 'stale-revision';
  override readonly title: string = 'The revision is not what was shown';

  constructor(current: unknown) {
    super(current, 'Nothing was signed. Look at the revision as it is now, then decide again.');
  }
}

/** One open draft per recipe and author; carries the one that is there. */
export class DraftOpenError extends ConflictError {
  override readonly code = 'draft-open';
  override readonly title = 'You have an open draft of this recipe';

  constructor(revisionId: string) {
    super('Go on with the open draft, or discard it first.', { revisionId });
  }
}

export class DraftCitedError extends ConflictError {
  override readonly code = 'still-in-use';
  override readonly title = 'Something else refers to this';

  constructor() {
    super('A coupon or a run was made to prove this draft, so it stays. Change it, or submit another one.');
  }
}

export class NotYourDraftError extends ForbiddenError {
  constructor(act: string) {
    super(`Only the author ${act}. Ask the author, or propose a change of your own.`);
  }
}

/** The scope is part of what was signed. */
export class ScopeSignedError extends ConflictError {
  override readonly code = 'scope-signed';
  override readonly title = 'The scope is part of what was submitted';

  constructor() {
    super('Propose a change and set the scope in its draft: it is signed together with the setting.');
  }
}

export class CouponNotMarkedError extends ConflictError {
  override readonly code = 'coupon-state';
  override readonly title = 'The coupon is past this, or not there yet';

  constructor(detail: string) {
    super(detail);
  }
}

/** The recipe does not answer the same question as the coupon. */
export class OtherKeysError extends InvalidError {
  constructor() {
    super('The recipe is for another material, finish, effect, machine or lens.', [
      { pointer: '#/recipeId', detail: 'Choose a recipe with the same five, or leave this out to begin a new one.' },
    ]);
  }
}
