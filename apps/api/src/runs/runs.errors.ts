import { ConflictError, type FieldProblem, InvalidError, NotFoundError } from '../common/errors/domain-error';

export type OpenHold = { readonly id: string; readonly subject: 'recipe' | 'machine'; readonly reason: string; readonly placedBy: string };

export class RunNotFoundError extends NotFoundError {
  constructor() {
    super('This run is not in the shop, or it is not one of yours. Go back to Runs.');
  }
}

/** A hold is on the recipe or its machine; carries every one with its reason. */
export class OnHoldError extends ConflictError {
  override readonly code = 'on-hold';
  override readonly title = 'This is on hold';

  constructor(holds: readonly OpenHold[]) {
    const said = holds.map(({ subject, placedBy, reason }) => `${placedBy} put the ${subject} on hold: ${reason}`).join(' ');
    super(`${said} A lead can release it.`, {
      holds: holds.map(({ id, subject, reason, placedBy }) => ({ id, subject, reason, placedBy })),
    });
  }
}

/** The revision is not one that this kind of run may cite. */
export class RevisionNotUsableError extends ConflictError {
  override readonly code = 'not-approved';
  override readonly title = 'This revision is not approved';
}

export class ReviewOverdueError extends ConflictError {
  override readonly code = 'review-overdue';
  override readonly title = 'The setting has to be proved again first';

  constructor() {
    super('Its review is overdue, and the shop’s policy stops runs until it is proved again. Tell a lead.');
  }
}

/** Something that a run needs before it starts, at its field. */
export class NotReadyToStartError extends InvalidError {
  override readonly code = 'not-ready-to-start';
  override readonly title = 'The run cannot start yet';

  constructor(problems: readonly FieldProblem[]) {
    super(problems.map(({ detail }) => detail).join(' '), problems);
  }
}

export class RunFinishedError extends ConflictError {
  override readonly code = 'run-finished';
  override readonly title = 'The run is finished';

  constructor() {
    super('A finished run never changes. A bad result can still be told.');
  }
}

export class FirstPieceNotReleasedError extends ConflictError {
  override readonly code = 'first-piece-not-released';
  override readonly title = 'The first piece was not released';

  constructor() {
    super('Compare the first piece with the mark to match and release it, or count every part as scrap.');
  }
}

export class ClientIdTakenError extends ConflictError {
  override readonly code = 'already-exists';
  override readonly title = 'This exists already';

  constructor() {
    super('Another run was started under this client id. Send a new one.');
  }
}

export class DeviationOverError extends ConflictError {
  override readonly code = 'deviation-over';
  override readonly title = 'The deviation does not cover this';
}

export class HoldStateError extends ConflictError {
  override readonly code = 'hold-state';
  override readonly title = 'The hold is not in the state for this';
}

export class RequestAnsweredError extends ConflictError {
  override readonly code = 'request-answered';
  override readonly title = 'This request has its answer';

  constructor() {
    super('Load the list again: somebody answered it or took it back.');
  }
}
