import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type LensAction = 'edit' | 'archive' | 'restore';

/** What the member may do with a lens. */
export function lensActions(actor: Pick<Actor, 'role'>, lens: { archivedAt: Date | null }): LensAction[] {
  if (!roleAtLeast(actor.role, 'lead')) return [];
  return lens.archivedAt === null ? ['edit', 'archive'] : ['restore'];
}
