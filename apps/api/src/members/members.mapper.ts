import { type Role, SOURCE_KINDS, type SourceKind } from '@proofplate/recipe-model';
import type { InvitationDto } from './dto/invitation.dto';
import type { MemberDto, SigningProcessDto } from './dto/member.dto';
import { allowedInvitationActions, allowedMemberActions } from './members.policy';

type Process = { readonly effectId: string; readonly sourceKind: string };
type Member = {
  readonly id: string;
  readonly printedName: string;
  readonly role: string;
  readonly signsFor: readonly Process[] | null;
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
/** What belongs to members but stands in other tables: addresses by member, names by effect. */
export type Directory = { readonly addresses: ReadonlyMap<string, string>; readonly effectNames: ReadonlyMap<string, string> };

export const toMemberDto = (member: Member, { addresses, effectNames }: Directory, caller: Caller): MemberDto => ({
  id: member.id,
  printedName: member.printedName,
  email: member.state === 'active' ? (addresses.get(member.id) ?? null) : null,
  role: roleOf(member.role),
  signsFor: member.signsFor?.flatMap((process) => toSigningProcess(process, effectNames)) ?? null,
  state: member.state,
  createdAt: member.createdAt.toISOString(),
  removedAt: member.removedAt?.toISOString() ?? null,
  version: member.version,
  allowedActions: allowedMemberActions(caller, member),
});

/** Stored processes name an effect of the shop and a kind of source of the closed list, as they did when they were chosen. */
function toSigningProcess({ effectId, sourceKind }: Process, effectNames: ReadonlyMap<string, string>): SigningProcessDto[] {
  const [effectName, kind] = [effectNames.get(effectId), SOURCE_KINDS.find((own): own is SourceKind => own === sourceKind)];
  return effectName === undefined || kind === undefined ? [] : [{ effectId, effectName, sourceKind: kind }];
}

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
