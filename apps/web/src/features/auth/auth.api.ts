import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { closeSession, openSession, REQUESTED_BY, type SessionAnswer } from '../../lib/session';
import { forgetAllReads, revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type SignUp = Schemas['SignUpDto'];
export type OpenSession = Schemas['OpenSessionDto'];
export type InvitationPreview = Schemas['InvitationPreviewDto'];

export async function signUp(body: SignUp, idempotencyKey: string): Promise<void> {
  await enter(await request<SessionAnswer>('post', '/api/auth/sign-up', { body, idempotencyKey, headers: REQUESTED_BY }));
}

export async function signIn(body: { email: string; password: string; shopId?: string }): Promise<void> {
  await enter(await request<SessionAnswer>('post', '/api/auth/sign-in', { body, headers: REQUESTED_BY }));
}

export async function signOut(): Promise<void> {
  await request<void>('post', '/api/auth/sign-out', { headers: REQUESTED_BY });
  await leave();
}

export async function signOutEverywhere(): Promise<void> {
  await request<void>('post', '/api/auth/sign-out-everywhere', { headers: REQUESTED_BY });
  await leave();
}

export async function requestPasswordReset(email: string): Promise<void> {
  await request<void>('post', '/api/auth/forgot-password', { body: { email } });
}

export async function resetPassword(body: { token: string; password: string }): Promise<void> {
  await request<void>('post', '/api/auth/reset-password', { body });
}

/** A POST, so that the token of the invitation stands in no log of addresses. */
export function previewInvitation(token: string): Promise<InvitationPreview> {
  return request<InvitationPreview>('post', '/api/auth/invitation-preview', { body: { token } });
}

export async function acceptInvitation(body: { token: string; name?: string; password: string }): Promise<void> {
  await enter(await request<SessionAnswer>('post', '/api/auth/accept-invitation', { body, headers: REQUESTED_BY }));
}

const SESSIONS = '/api/auth/sessions';

export async function changePassword(body: { password: string; newPassword: string }): Promise<void> {
  await request<void>('post', '/api/auth/change-password', { body });
  await revalidate(SESSIONS);
}

/** Devices the person is signed in on. */
export function useOpenSessions(): SWRResponse<Schemas['OpenSessionListDto'], ProblemError> {
  return useRead<Schemas['OpenSessionListDto']>(SESSIONS);
}

export async function endSession({ id }: OpenSession): Promise<void> {
  await request<void>('delete', `${SESSIONS}/${encodeURIComponent(id)}`);
  await revalidate(SESSIONS);
}

/** Whoever comes in sees nothing that was read for whoever was here before. */
async function enter(answer: SessionAnswer): Promise<void> {
  await forgetAllReads();
  openSession(answer);
}

async function leave(): Promise<void> {
  closeSession('left');
  await forgetAllReads();
}
