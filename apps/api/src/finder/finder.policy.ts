import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type FinderAction = 'start-run' | 'place-hold' | 'release-hold' | 'grant-deviation';

/** What the member may do with the setting in front of them. */
export function answerActions(
  actor: Pick<Actor, 'role'>,
  answer: { readonly isBlocked: boolean; readonly isHeld: boolean },
): FinderAction[] {
  const everybody: FinderAction[] = answer.isBlocked ? [] : ['start-run'];
  if (!roleAtLeast(actor.role, 'lead')) return everybody;
  return [...everybody, 'place-hold', ...(answer.isHeld ? (['release-hold'] as const) : []), 'grant-deviation'];
}

/** Kinds of record that the command palette finds for the member. */
export function findableKinds(actor: Pick<Actor, 'role'>): readonly ('recipe' | 'coupon' | 'material' | 'machine')[] {
  return roleAtLeast(actor.role, 'operator') ? ['recipe', 'coupon', 'material', 'machine'] : ['recipe'];
}
