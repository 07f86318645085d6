import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../../lib/api';
import { revalidate, useRead } from '../../../lib/swr';
import { COUPONS } from '../coupons.api';

type Schemas = components['schemas'];
export type CraterFit = Schemas['CraterFitDto'];
export type CraterPoint = Schemas['CraterPointDto'];
export type CraterLine = Schemas['CraterLineDto'];
export type CraterSpot = Schemas['CraterSpotDto'];
export type CraterPlace = Schemas['CraterPlaceDto'];
export type CraterIncubation = Schemas['CraterIncubationDto'];

const MACHINES = '/api/machines';
export const craterFitPath = (couponId: string) => `${COUPONS}/${encodeURIComponent(couponId)}/crater-fit`;

export function useCraterFit(couponId: string): SWRResponse<CraterFit, ProblemError> {
  return useRead<CraterFit>(craterFitPath(couponId), undefined, { keepPreviousData: false });
}

/** The server works the spot out again; what was shown is sent so that nobody saves another number than the one that was read. */
export async function saveCraterSpot(
  couponId: string,
  { spot, place }: { readonly spot: CraterSpot; readonly place: CraterPlace },
  idempotencyKey: string,
): Promise<void> {
  const body = { shownSpotUm: spot.diameterUm };
  await request('post', `${craterFitPath(couponId)}/measured-spot`, { body, version: place.version, idempotencyKey });
  await readSpotsAgain(couponId);
}

/** Numbers of coupons rest on the spot too. */
export async function readSpotsAgain(couponId: string): Promise<void> {
  await revalidate(craterFitPath(couponId), MACHINES, COUPONS);
}
