import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type CatalogueAction = 'edit' | 'archive' | 'restore';
export type CautionAction = 'tighten' | 'reword';

/** What the member may do with a material, finish or effect. */
export function catalogueActions(actor: Pick<Actor, 'role'>, thing: { archivedAt: Date | null }): CatalogueAction[] {
  if (!roleAtLeast(actor.role, 'lead')) return [];
  return thing.archivedAt === null ? ['edit', 'archive'] : ['restore'];
}

/** A group has nothing to archive: it is emptied instead. */
export function groupActions(actor: Pick<Actor, 'role'>): 'edit'[] {
  return roleAtLeast(actor.role, 'lead') ? ['edit'] : [];
}

/** Nobody loosens or removes a caution; the words of a shipped one stay. */
export function cautionActions(actor: Pick<Actor, 'role'>, caution: { shippedKey: string | null }): CautionAction[] {
  if (!roleAtLeast(actor.role, 'lead')) return [];
  return caution.shippedKey === null ? ['tighten', 'reword'] : ['tighten'];
}
