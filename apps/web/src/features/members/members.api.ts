import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import type { Role } from '../../lib/session';
import { revalidate, useRead } from '../../lib/swr';

export type Member = {
  id: string;
  printedName: string;
  email: string | null;
  role: Role;
  state: 'active' | 'removed';
  createdAt: string;
  version: number;
  allowedActions: readonly string[];
};

export type Invitation = {
  id: string;
  email: string;
  role: Role;
  state: 'open' | 'expired' | 'accepted' | 'revoked';
  invitedBy: string;
  createdAt: string;
  expiresAt: string;
  allowedActions: readonly string[];
};

type Page<T> = { items: readonly T[]; nextCursor: string | null };

const MEMBERS = '/api/members';
const INVITATIONS = '/api/invitations';
const MOST_PEOPLE_AT_ONCE = 100;

export function useMembers(): SWRResponse<Page<Member>, ProblemError> {
  return useRead<Page<Member>>(MEMBERS, { limit: MOST_PEOPLE_AT_ONCE });
}

export function useInvitations(): SWRResponse<Page<Invitation>, ProblemError> {
  return useRead<Page<Invitation>>(INVITATIONS, { limit: MOST_PEOPLE_AT_ONCE });
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
