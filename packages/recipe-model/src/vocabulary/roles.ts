import type { Labels } from './labelled';

export type Role = 'trainee' | 'operator' | 'lead' | 'owner';

export const ROLE_LABELS: Labels<Role> = { trainee: 'Trainee', operator: 'Operator', lead: 'Process lead', owner: 'Owner' };

/** From the fewest rights to the most: each role may do what the ones before it may. */
export const ROLES: readonly Role[] = ['trainee', 'operator', 'lead', 'owner'];

/** True if the role has at least the rights of the other one. */
export function roleAtLeast(role: Role, least: Role): boolean {
  return ROLES.indexOf(role) >= ROLES.indexOf(least);
}
