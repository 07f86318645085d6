import { REVISION_STATE_LABELS, type RevisionState, type RunKind } from '@proofplate/recipe-model';

/** A confirmation run proves what is not approved yet, or proves again what is. */
const USABLE: Readonly<Record<RunKind, readonly RevisionState[]>> = {
  production: ['approved'],
  'daily-check': ['approved'],
  confirmation: ['draft', 'in_review', 'scheduled', 'approved'],
};

/** Nothing more is marked with it, also where a run is under way: it was withdrawn, or a newer revision took its place. */
export const stopsRun = (state: RevisionState): boolean => state === 'withdrawn' || state === 'superseded';

/** Why this kind of run may not cite a revision in that state; undefined: it may. */
export function whyNotUsable(kind: RunKind, state: RevisionState): string | undefined {
  if (USABLE[kind].includes(state)) return undefined;
  const is = REVISION_STATE_LABELS[state].toLowerCase();
  if (state === 'withdrawn') return 'It was withdrawn. Do not mark with it; look for another recipe at the machine.';
  if (state === 'superseded') return 'A newer revision took its place. Open the recipe at the machine again.';
  if (kind === 'confirmation') return `It is ${is}. A confirmation run proves a draft, a revision in review or an approved one.`;
  return `It is ${is}. Parts are marked with approved revisions only; a draft is proved by a confirmation run.`;
}
