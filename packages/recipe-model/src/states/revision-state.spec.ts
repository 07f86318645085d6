import fc from 'fast-check';
import { codesOf } from '../vocabulary/labelled';
import {
  isEditable,
  nextRevisionState,
  REVISION_ACTION_LABELS,
  REVISION_STATE_LABELS,
  type RevisionAction,
  type RevisionState,
} from './revision-state';

/** Every jump that exists, written down apart from the code. */
const JUMPS: readonly [RevisionState, RevisionAction, RevisionState][] = [
  ['draft', 'submit', 'in_review'],
  ['in_review', 'approve', 'approved'],
  ['in_review', 'approveLater', 'scheduled'],
  ['in_review', 'returnToAuthor', 'returned'],
  ['in_review', 'recall', 'returned'],
  ['scheduled', 'takeEffect', 'approved'],
  ['scheduled', 'withdraw', 'withdrawn'],
  ['approved', 'supersede', 'superseded'],
  ['approved', 'withdraw', 'withdrawn'],
];
const STATES = codesOf(REVISION_STATE_LABELS);
const ACTIONS = codesOf(REVISION_ACTION_LABELS);

describe('nextRevisionState', () => {
  it.each(JUMPS)('leads from %s by %s to %s', (from, action, to) => {
    expect(nextRevisionState(from, action)).toEqual({ kind: 'moved', state: to });
  });

  it('knows no other jump and says so in words', () => {
    const others = STATES.flatMap((state) => ACTIONS.map((action) => [state, action] as const)).filter(
      ([state, action]) => !JUMPS.some(([from, by]) => from === state && by === action),
    );
    expect(others).toHaveLength(STATES.length * ACTIONS.length - JUMPS.length);
    for (const [state, action] of others) expect(nextRevisionState(state, action).kind).toBe('refused');
    expect(nextRevisionState('superseded', 'approve')).toEqual({
      kind: 'refused',
      message: '“Approve” is not possible for a revision that is in the state “Superseded”.',
    });
  });

  it('in any sequence of actions never becomes a draft again, never leaves an end, and is approved only after review', () => {
    fc.assert(
      fc.property(fc.array(fc.constantFrom(...ACTIONS), { maxLength: 40 }), (actions) => {
        let state: RevisionState = 'draft';
        const seen: RevisionState[] = [state];
        for (const action of actions) {
          const moved = nextRevisionState(state, action);
          if (moved.kind === 'refused') continue;
          expect(JUMPS).toContainEqual([state, action, moved.state]);
          expect(['returned', 'superseded', 'withdrawn']).not.toContain(state);
          expect(seen).not.toContain(moved.state);
          state = moved.state;
          seen.push(state);
        }
        if (seen.includes('approved')) expect(seen.slice(0, 2)).toEqual(['draft', 'in_review']);
      }),
    );
  });

  it('reaches every state from a draft', () => {
    const reached = new Set<RevisionState>(['draft']);
    for (const state of reached) {
      for (const action of ACTIONS) {
        const moved = nextRevisionState(state, action);
        if (moved.kind === 'moved') reached.add(moved.state);
      }
    }
    expect([...reached].sort()).toEqual([...STATES].sort());
  });
});

describe('isEditable', () => {
  it('lets only a draft be edited', () => {
    expect(STATES.filter(isEditable)).toEqual(['draft']);
  });
});
