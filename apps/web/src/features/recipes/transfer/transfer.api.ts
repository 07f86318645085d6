import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../../lib/api';
import { revalidate, useRead } from '../../../lib/swr';
import type { Revision } from '../recipes.api';

type Schemas = components['schemas'];

export type TransferGround = Schemas['TransferGroundDto'];
export type TransferPlaceRecord = Schemas['TransferPlaceDto'];
export type TransferTarget = Schemas['TransferTargetDto'];
export type NewTransfer = Omit<Schemas['CreateTransferDto'], 'acceptNotEquivalent'> & { acceptNotEquivalent?: boolean };

/** What a transfer is worked out from; the same functions work it out here and on the server. */
export function useTransferGround(revisionId: string): SWRResponse<TransferGround, ProblemError> {
  return useRead<TransferGround>(`/api/revisions/${encodeURIComponent(revisionId)}/transfers/targets`, undefined, {
    keepPreviousData: false,
  });
}

export async function createTransfer(revisionId: string, body: NewTransfer, idempotencyKey: string): Promise<Revision> {
  const draft = await request<Revision>('post', `/api/revisions/${encodeURIComponent(revisionId)}/transfers`, { body, idempotencyKey });
  await revalidate('/api/recipes', '/api/revisions/');
  return draft;
}
