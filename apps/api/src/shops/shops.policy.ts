import { type Role, roleAtLeast } from '@proofplate/recipe-model';

/** What a member may do with the shop itself. */
export const allowedShopActions = (role: Role): string[] =>
  roleAtLeast(role, 'owner') ? ['edit', 'changePolicy', 'invite', 'changePeople'] : [];
