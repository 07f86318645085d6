import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];
export type SettingRequest = Schemas['SettingRequestDto'];
type RequestPage = Schemas['SettingRequestPageDto'];
export type AskedSetting = { machineId?: string; lensId?: string; materialId?: string; finishId?: string; effectId?: string };
export type RequestState = SettingRequest['state'];

const REQUESTS = '/api/setting-requests';
const LARGEST_PAGE = 100;

export function useRequests(state: RequestState): SWRResponse<RequestPage, ProblemError> {
  return useRead<RequestPage>(REQUESTS, { state, limit: LARGEST_PAGE });
}

export async function askForSetting(
  body: AskedSetting & { materialId: string; jobReference: string; neededOn?: string; note: string },
  idempotencyKey: string,
): Promise<void> {
  await request<SettingRequest>('post', REQUESTS, { body, idempotencyKey });
  await revalidate(REQUESTS);
}

export async function answerRequest(
  id: string,
  body: { answer: string; state: 'answered' | 'closed' },
  idempotencyKey: string,
): Promise<void> {
  await request<SettingRequest>('post', `${REQUESTS}/${id}/answer`, { body, idempotencyKey });
  await revalidate(REQUESTS);
}
