import type { Role } from '@proofplate/recipe-model';
import type { InvitationDto } from './dto/invitation.dto';
import type { MemberDto } from './dto/member.dto';
import { allowedInvitationActions, allowedMemberActions } from './members.policy';

type Member = {
  readonly id: string;
  readonly printedName: string;
  readonly role: string;
  readonly state: string;
  readonly createdAt: Date;
  readonly removedAt: Date | null;
  readonly version: number;
};
type Invitation = {
  readonly id: string;
  readonly email: string;
  readonly role: string;
  readonly state: string;
  readonly createdAt: Date;
  readonly expiresAt: Date;
  readonly acceptedAt: Date | null;
};
type Caller = { readonly role: Role };

export const toMemberDto = (member: Member, email: string | undefined, caller: Caller): MemberDto => ({
  id: member.id,
  printedName: member.printedName,
  email: member.state === 'active' ? (email ?? null) : null,
  role: roleOf(member.role),
  state: member.state,
  createdAt: member.createdAt.toISOString(),
  removedAt: member.removedAt?.toISOString() ?? null,
  version: member.version,
  allowedActions: allowedMemberActions(caller, member),
});

export function toInvitationDto(invitation: Invitation, more: { invitedBy: string; isExpired: boolean }, caller: Caller): InvitationDto {
  const state = invitation.state === 'open' && more.isExpired ? 'expired' : invitation.state;
  return {
    id: invitation.id,
    email: invitation.email,
    role: roleOf(invitation.role),
    state,
    invitedBy: more.invitedBy,
    createdAt: invitation.createdAt.toISOString(),
    expiresAt: invitation.expiresAt.toISOString(),
    acceptedAt: invitation.acceptedAt?.toISOString() ?? null,
    allowedActions: allowedInvitationActions(caller, { state }),
  };
}

/** The columns hold one of the four, by their CHECK; anything else gets the fewest rights. */
export const roleOf = (text: string): Role => (text === 'owner' || text === 'lead' || text === 'operator' ? text : 'trainee');
