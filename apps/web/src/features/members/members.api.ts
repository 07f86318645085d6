import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import type { Role } from '../../lib/session';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type Member = Schemas['MemberDto'];
export type Invitation = Schemas['InvitationDto'];
export type TrainingRecord = Schemas['TrainingRecordDto'];
export type NewTraining = Schemas['CreateTrainingRecordDto'];
export type Process = Schemas['ProcessDto'];
export type UndeliveredLetter = Schemas['UndeliveredLetterDto'];
type MemberPage = Schemas['MemberPageDto'];
type InvitationPage = Schemas['InvitationPageDto'];

const MEMBERS = '/api/members';
const INVITATIONS = '/api/invitations';
const one = (id: string) => `${MEMBERS}/${encodeURIComponent(id)}`;
const MOST_PEOPLE_AT_ONCE = 100;

export function useMembers(): SWRResponse<MemberPage, ProblemError> {
  return useRead<MemberPage>(MEMBERS, { limit: MOST_PEOPLE_AT_ONCE });
}

export function useMember(id: string): SWRResponse<Member, ProblemError> {
  return useRead<Member>(one(id), undefined, { keepPreviousData: false });
}

export function useTrainings(memberId: string): SWRResponse<Schemas['TrainingRecordListDto'], ProblemError> {
  return useRead<Schemas['TrainingRecordListDto']>(`${one(memberId)}/training-records`, undefined, { keepPreviousData: false });
}

/** Effects that a process can name. */
export function useEffectChoices(): SWRResponse<{ items: readonly { id: string; name: string }[] }, ProblemError> {
  return useRead('/api/effects', { limit: MOST_PEOPLE_AT_ONCE });
}

export function useUndeliveredLetters(): SWRResponse<Schemas['UndeliveredLetterListDto'], ProblemError> {
  return useRead<Schemas['UndeliveredLetterListDto']>('/api/undelivered-letters');
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

export async function removeMember({ id, version }: Member): Promise<void> {
  await request<void>('delete', `${MEMBERS}/${id}`, { version });
  await revalidate(MEMBERS);
}

/** Null: all of them. */
export async function changeProcesses({ id, version }: Member, signsFor: readonly Process[] | null): Promise<void> {
  await request<Member>('patch', one(id), { body: { signsFor }, version });
  await revalidate(MEMBERS);
}

export async function addTraining({ id }: Member, body: NewTraining, idempotencyKey: string): Promise<void> {
  await request<void>('post', `${one(id)}/training-records`, { body, idempotencyKey });
  await revalidate(one(id));
}
