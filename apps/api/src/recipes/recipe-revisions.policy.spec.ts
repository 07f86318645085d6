import { type RevisionState, ROLES } from '@proofplate/recipe-model';
import { mayEditDraft, revisionActions } from './recipe-revisions.policy';
import { recipeActions } from './recipes.policy';

const OWN = { createdBy: 'me', editorIds: [] };
const OTHERS = { createdBy: 'somebody', editorIds: [] };
const EDITED = { createdBy: 'somebody', editorIds: ['me'] };
const me = (role: (typeof ROLES)[number]) => ({ role, memberId: 'me' });

describe('revisionActions()', () => {
  it.each<[RevisionState, object, string[], string[]]>([
    ['draft', OWN, ['edit', 'discard', 'submit', 'start-confirmation'], ['edit', 'discard', 'submit', 'start-confirmation']],
    ['draft', OTHERS, ['start-confirmation'], ['edit', 'discard', 'start-confirmation']],
    ['in_review', OWN, ['recall', 'copy', 'start-confirmation'], ['recall', 'return', 'copy', 'start-confirmation']],
    ['in_review', OTHERS, ['copy', 'start-confirmation'], ['return', 'approve', 'copy', 'start-confirmation']],
    ['in_review', EDITED, ['copy', 'start-confirmation'], ['return', 'copy', 'start-confirmation']],
    ['approved', OTHERS, ['copy'], ['withdraw', 'copy']],
    ['scheduled', OTHERS, ['copy'], ['withdraw', 'copy']],
    ['returned', OWN, ['copy'], ['copy']],
    ['superseded', OTHERS, ['copy'], ['copy']],
    ['withdrawn', OTHERS, ['copy'], ['copy']],
  ])('of a revision that is %s (%j): operators %j, leads %j, trainees nothing', (state, author, operators, leads) => {
    const revision = { ...OWN, ...author, state };
    expect(revisionActions(me('operator'), revision, false)).toEqual(operators);
    expect(revisionActions(me('lead'), revision, false)).toEqual(leads);
    expect(revisionActions(me('owner'), revision, false)).toEqual(leads);
    expect(revisionActions(me('trainee'), revision, true)).toEqual([]);
  });

  it('let an author approve only where the policy allows it', () => {
    expect(revisionActions(me('lead'), { ...OWN, state: 'in_review' }, true)).toContain('approve');
    expect(revisionActions(me('operator'), { ...OWN, state: 'in_review' }, true)).not.toContain('approve');
  });
});

describe('mayEditDraft()', () => {
  it('is for the author from operator up, and for leads', () => {
    expect(ROLES.map((role) => mayEditDraft(me(role), OWN))).toEqual([false, true, true, true]);
    expect(ROLES.map((role) => mayEditDraft(me(role), OTHERS))).toEqual([false, false, true, true]);
  });
});

describe('recipeActions()', () => {
  it('offer withdrawing where something is signed, to leads', () => {
    const recipe = { ...OTHERS, hasSigned: true };
    expect(ROLES.map((role) => recipeActions(me(role), recipe))).toEqual([
      [],
      ['propose-change'],
      ['propose-change', 'edit', 'withdraw', 'hold'],
      ['propose-change', 'edit', 'withdraw', 'hold'],
    ]);
    expect(recipeActions(me('lead'), { ...OTHERS, hasSigned: false })).not.toContain('withdraw');
    expect(recipeActions(me('operator'), { ...OWN, hasSigned: false })).toEqual(['propose-change', 'edit']);
  });
});
