import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type ApprovalChecks = Schemas['ApprovalChecksDto'];
export type ApprovalCheck = Schemas['ApprovalCheckDto'];
export type SignOffQueue = Schemas['SignOffQueueDto'];
export type QueuedRevision = Schemas['QueuedRevisionDto'];
export type Revision = Schemas['RecipeRevisionDto'];
export type EvidenceCell = Schemas['EvidenceCellDto'];

const REVISIONS = '/api/revisions';
const QUEUE = '/api/sign-offs/queue';
const MOST_WAITING = 100;

export function useSignOffQueue(): SWRResponse<SignOffQueue, ProblemError> {
  return useRead<SignOffQueue>(QUEUE, { limit: MOST_WAITING });
}

export function useRevision(id: string | undefined): SWRResponse<Revision, ProblemError> {
  return useRead<Revision>(id === undefined ? null : `${REVISIONS}/${id}`, undefined, { keepPreviousData: false });
}

export function useApprovalChecks(revisionId: string): SWRResponse<ApprovalChecks, ProblemError> {
  return useRead<ApprovalChecks>(`${REVISIONS}/${revisionId}/checks`, undefined, { keepPreviousData: false });
}

export async function submitRevision(id: string, body: Schemas['SubmitRevisionDto'], { idempotencyKey, version }: Act): Promise<Revision> {
  return await act(id, 'submit', body, { idempotencyKey, version });
}

export async function recallRevision(id: string, body: Schemas['RecallRevisionDto'], how: Act): Promise<Revision> {
  return await act(id, 'recall', body, how);
}

export async function returnRevision(id: string, body: Schemas['ReturnRevisionDto'], how: Act): Promise<Revision> {
  return await act(id, 'return', body, how);
}

export async function approveRevision(id: string, body: Schemas['ApproveRevisionDto'], how: Act): Promise<Revision> {
  return await act(id, 'approve', body, how);
}

export async function withdrawRevision(id: string, body: Schemas['WithdrawRevisionDto'], how: Act): Promise<Revision> {
  return await act(id, 'withdraw', body, how);
}

/** `idempotencyKey`: the same form sent twice signs once. `version`: of the record as it was shown, where the act asks for it. */
export type Act = { idempotencyKey: string; version?: number | undefined };

async function act(id: string, name: string, body: unknown, { idempotencyKey, version }: Act): Promise<Revision> {
  const revision = await request<Revision>('post', `${REVISIONS}/${id}/${name}`, { body, idempotencyKey, version });
  await revalidate('/api/recipes', REVISIONS, '/api/sign-offs');
  return revision;
}

export type Comparison = Schemas['ComparisonDto'];
export type ComparisonRow = Schemas['ComparisonRowDto'];

/** The proposed revision beside the one that it would supersede. */
export function useProposedChange(currentId: string | undefined, proposedId: string): SWRResponse<Comparison, ProblemError> {
  return useRead<Comparison>(currentId === undefined ? null : `${REVISIONS}/compare`, {
    ids: `${currentId},${proposedId}`,
    referenceId: currentId,
  });
}
