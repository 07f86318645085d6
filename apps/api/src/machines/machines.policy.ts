import { roleAtLeast } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';

export type MachineAction = 'edit' | 'archive' | 'restore' | 'add-lens' | 'add-calibration';

/** What the member may do with a machine and its parts. */
export function machineActions(actor: Pick<Actor, 'role'>, machine: { archivedAt: Date | null }): MachineAction[] {
  if (!roleAtLeast(actor.role, 'lead')) return [];
  return machine.archivedAt === null ? ['edit', 'archive', 'add-lens', 'add-calibration'] : ['restore'];
}

/** What the member may do with a lens on a machine. */
export function machineLensActions(actor: Pick<Actor, 'role'>): 'edit'[] {
  return roleAtLeast(actor.role, 'lead') ? ['edit'] : [];
}
