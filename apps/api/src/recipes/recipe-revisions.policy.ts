import { type RevisionState, roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type RevisionActionName =
  | 'edit'
  | 'discard'
  | 'submit'
  | 'recall'
  | 'return'
  | 'approve'
  | 'withdraw'
  | 'copy'
  | 'transfer'
  | 'start-confirmation';

export type Writers = { readonly createdBy: string; readonly editorIds: readonly string[] };
export type RevisionFacts = Writers & { readonly state: RevisionState };
type Caller = Pick<Actor, 'role' | 'memberId'>;

/** A draft belongs to its author; a lead may help. */
export const mayEditDraft = (caller: Caller, { createdBy }: Pick<RevisionFacts, 'createdBy'>) =>
  roleAtLeast(caller.role, 'lead') || (roleAtLeast(caller.role, 'operator') && createdBy === caller.memberId);

/** Submitting and recalling are acts of the author alone. */
export const isAuthor = (caller: Caller, { createdBy }: Pick<RevisionFacts, 'createdBy'>) => createdBy === caller.memberId;

/** Nobody approves what they wrote, as its author or by editing somebody's draft. */
export const hasWritten = ({ memberId }: Pick<Caller, 'memberId'>, { createdBy, editorIds }: Writers) =>
  createdBy === memberId || editorIds.includes(memberId);

/** What the member may do with a revision. */
export function revisionActions(caller: Caller, revision: RevisionFacts, authorMaySign: boolean): RevisionActionName[] {
  if (!roleAtLeast(caller.role, 'operator')) return [];
  const own = isAuthor(caller, revision);
  const leads = roleAtLeast(caller.role, 'lead');
  const { state } = revision;
  const allowed: readonly [RevisionActionName, boolean][] = [
    ['edit', state === 'draft' && mayEditDraft(caller, revision)],
    ['discard', state === 'draft' && mayEditDraft(caller, revision)],
    ['submit', state === 'draft' && own],
    ['recall', state === 'in_review' && own],
    ['return', state === 'in_review' && leads],
    ['approve', state === 'in_review' && leads && (!hasWritten(caller, revision) || authorMaySign)],
    ['withdraw', (state === 'approved' || state === 'scheduled') && leads],
    ['copy', state !== 'draft'],
    // a draft may still change under what was worked out from it
    ['transfer', state !== 'draft'],
    ['start-confirmation', state === 'draft' || state === 'in_review'],
  ];
  return allowed.filter(([, isAllowed]) => isAllowed).map(([action]) => action);
}
