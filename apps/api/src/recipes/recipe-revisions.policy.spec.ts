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
    [
      'in_review',
      OWN,
      ['recall', 'copy', 'transfer', 'start-confirmation'],
      ['recall', 'return', 'copy', 'transfer', 'start-confirmation'],
    ],
    ['in_review', OTHERS, ['copy', 'transfer', 'start-confirmation'], ['return', 'approve', 'copy', 'transfer', 'start-confirmation']],
    ['in_review', EDITED, ['copy', 'transfer', 'start-confirmation'], ['return', 'copy', 'transfer', 'start-confirmation']],
    ['approved', OTHERS, ['copy', 'transfer'], ['withdraw', 'copy', 'transfer']],
    ['scheduled', OTHERS, ['copy', 'transfer'], ['withdraw', 'copy', 'transfer']],
    ['returned', OWN, ['copy', 'transfer'], ['copy', 'transfer']],
    ['superseded', OTHERS, ['copy', 'transfer'], ['copy', 'transfer']],
    ['withdrawn', OTHERS, ['copy', 'transfer'], ['copy', 'transfer']],
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
