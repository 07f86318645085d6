import { type Role, roleAtLeast } from '@proofplate/recipe-model';

type Caller = { readonly role: Role };
type Target = { readonly state: string };

/** Only an owner changes people; removed members stay as they are, for the record. */
export function allowedMemberActions(caller: Caller, member: Target): string[] {
  return roleAtLeast(caller.role, 'owner') && member.state === 'active' ? ['edit', 'remove'] : [];
}

/** An open invitation can be taken back by an owner. */
export function allowedInvitationActions(caller: Caller, invitation: Target): string[] {
  return roleAtLeast(caller.role, 'owner') && invitation.state === 'open' ? ['revoke'] : [];
}
