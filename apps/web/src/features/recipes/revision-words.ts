import type { MarkState } from '../../components/state-mark';
import type { RecipeSummary, RevisionBrief } from './recipes.api';

const MARK_OF: Record<RevisionBrief['state'], MarkState> = {
  draft: 'draft',
  in_review: 'inReview',
  returned: 'returned',
  scheduled: 'approved',
  approved: 'approved',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
};

const STATE_WORD: Record<RevisionBrief['state'], string> = {
  draft: 'draft',
  in_review: 'in review',
  returned: 'returned',
  scheduled: 'scheduled',
  approved: 'approved',
  superseded: 'superseded',
  withdrawn: 'withdrawn',
};

export function markOf({ state, isReviewOverdue }: Pick<RevisionBrief, 'state' | 'isReviewOverdue'>): MarkState {
  return state === 'approved' && isReviewOverdue ? 'reproveDue' : MARK_OF[state];
}

export function stateWord(state: RevisionBrief['state']): string {
  return STATE_WORD[state];
}

/** "Revision 4", or "Draft" as long as it has no number. */
export function revisionName({ number }: Pick<RevisionBrief, 'number'>): string {
  return number === null ? 'Draft' : `Revision ${number}`;
}

/** "4 in review", the second line in a list. */
export function underWayWord({ number, state }: Pick<RevisionBrief, 'number' | 'state'>): string {
  if (number === null) return `a ${stateWord(state)} under way`;
  return `${number} ${stateWord(state)}`;
}

const RECIPE_MARK: Record<RecipeSummary['state'], MarkState> = {
  approved: 'approved',
  due: 'reproveDue',
  scheduled: 'approved',
  in_review: 'inReview',
  draft: 'draft',
  returned: 'returned',
  withdrawn: 'withdrawn',
};

export function recipeMark(state: RecipeSummary['state']): MarkState {
  return RECIPE_MARK[state];
}

const RECIPE_STATE_WORD: Record<RecipeSummary['state'], string> = {
  approved: 'Approved',
  due: 'Re-prove due',
  scheduled: 'Scheduled',
  in_review: 'In review',
  draft: 'Draft',
  returned: 'Returned',
  withdrawn: 'Withdrawn',
};

export function recipeStateWord(state: RecipeSummary['state']): string {
  return RECIPE_STATE_WORD[state];
}
