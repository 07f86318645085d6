import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];
export type Deviation = Schemas['DeviationDto'];
export type DeviationPage = Schemas['DeviationPageDto'];
export type GrantDeviation = Schemas['GrantDeviationDto'];

const DEVIATIONS = '/api/deviations';
const MOST_SHOWN = 50;

/** Of one revision, newest first, also those that have ended. */
export function useDeviations(revisionId: string): SWRResponse<DeviationPage, ProblemError> {
  return useRead<DeviationPage>(DEVIATIONS, { revisionId, limit: MOST_SHOWN });
}

export async function grantDeviation(body: GrantDeviation, idempotencyKey: string): Promise<void> {
  await request<Deviation>('post', DEVIATIONS, { body, idempotencyKey });
  await revalidate(DEVIATIONS, '/api/runs');
}
