import type { Labels } from '../vocabulary/labelled';
import { type Moved, type Moves, move } from './moves';

export type RevisionState = 'draft' | 'in_review' | 'returned' | 'scheduled' | 'approved' | 'superseded' | 'withdrawn';

/** approveLater: approved with an effective date that is still to come; takeEffect: that date has come; supersede: a newer one became current. */
export type RevisionAction = 'submit' | 'recall' | 'returnToAuthor' | 'approve' | 'approveLater' | 'takeEffect' | 'supersede' | 'withdraw';

export const REVISION_STATE_LABELS: Labels<RevisionState> = {
  draft: 'Draft',
  in_review: 'In review',
  returned: 'Returned',
  scheduled: 'Approved, not yet in effect',
  approved: 'Approved',
  superseded: 'Superseded',
  withdrawn: 'Withdrawn',
};

export const REVISION_ACTION_LABELS: Labels<RevisionAction> = {
  submit: 'Submit for review',
  recall: 'Recall',
  returnToAuthor: 'Return to the author',
  approve: 'Approve',
  approveLater: 'Approve from a later date',
  takeEffect: 'Take effect',
  supersede: 'Supersede',
  withdraw: 'Withdraw',
};

const MOVES: Moves<RevisionState, RevisionAction> = {
  draft: { submit: 'in_review' },
  in_review: { approve: 'approved', approveLater: 'scheduled', returnToAuthor: 'returned', recall: 'returned' },
  scheduled: { takeEffect: 'approved', withdraw: 'withdrawn' },
  approved: { supersede: 'superseded', withdraw: 'withdrawn' },
  returned: {},
  superseded: {},
  withdrawn: {},
};

/** The state after an action, or a refusal in words: no other jump exists. */
export function nextRevisionState(state: RevisionState, action: RevisionAction): Moved<RevisionState> {
  return move(MOVES, state, action, {
    thing: 'revision',
    stateLabel: REVISION_STATE_LABELS[state],
    actionLabel: REVISION_ACTION_LABELS[action],
  });
}

/** Only a draft may be edited; a submitted revision never changes again. */
export function isEditable(state: RevisionState): boolean {
  return state === 'draft';
}
