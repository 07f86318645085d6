import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type RecipeActionName = 'propose-change' | 'edit' | 'withdraw' | 'hold';
type Caller = Pick<Actor, 'role' | 'memberId'>;

/** The title and, before anything was submitted, the scope: whoever began the recipe, or a lead. */
export const mayEditRecipe = (caller: Caller, { createdBy }: { readonly createdBy: string }) =>
  roleAtLeast(caller.role, 'lead') || (roleAtLeast(caller.role, 'operator') && createdBy === caller.memberId);

/** What the member may do with a recipe. `hasSigned`: one of its revisions is approved, now or for a day to come. */
export function recipeActions(caller: Caller, recipe: { readonly createdBy: string; readonly hasSigned: boolean }): RecipeActionName[] {
  if (!roleAtLeast(caller.role, 'operator')) return [];
  const leads = roleAtLeast(caller.role, 'lead');
  return [
    'propose-change',
    ...(mayEditRecipe(caller, recipe) ? (['edit'] as const) : []),
    ...(leads && recipe.hasSigned ? (['withdraw'] as const) : []),
    ...(leads ? (['hold'] as const) : []),
  ];
}
