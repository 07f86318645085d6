import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import type { Role } from '../../lib/session';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type Member = Schemas['MemberDto'];
export type Invitation = Schemas['InvitationDto'];
type MemberPage = Schemas['MemberPageDto'];
type InvitationPage = Schemas['InvitationPageDto'];

const MEMBERS = '/api/members';
const INVITATIONS = '/api/invitations';
const MOST_PEOPLE_AT_ONCE = 100;

export function useMembers(): SWRResponse<MemberPage, ProblemError> {
  return useRead<MemberPage>(MEMBERS, { limit: MOST_PEOPLE_AT_ONCE });
}

export function useInvitations(): SWRResponse<InvitationPage, ProblemError> {
  return useRead<InvitationPage>(INVITATIONS, { limit: MOST_PEOPLE_AT_ONCE });
}

export async function invite(body: { email: string; role: Role }, idempotencyKey: string): Promise<void> {
  await request<Invitation>('post', INVITATIONS, { body, idempotencyKey });
  await revalidate(INVITATIONS);
}

export async function revokeInvitation(id: string): Promise<void> {
  await request<void>('delete', `${INVITATIONS}/${id}`);
  await revalidate(INVITATIONS);
}

export async function changeRole({ id, version }: Member, role: Role): Promise<void> {
  await request<Member>('patch', `${MEMBERS}/${id}`, { body: { role }, version });
  await revalidate(MEMBERS);
}

export async function removeMember({ id }: Member): Promise<void> {
  await request<void>('delete', `${MEMBERS}/${id}`);
  await revalidate(MEMBERS);
}
