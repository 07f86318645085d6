import type { components } from '@proofplate/api-client';
import type { Outcome } from '@proofplate/recipe-model';
import { useMemo } from 'react';
import { type SWRResponse, useSWRConfig } from 'swr';
import { type ProblemError, request } from '../../../lib/api';
import { revalidate, useRead } from '../../../lib/swr';
import { COUPONS } from '../coupons.api';
import { craterFitPath } from '../craters/craters.api';

type Schemas = components['schemas'];
export type Inspection = Schemas['InspectionDto'];
export type CellRating = Schemas['CellRatingDto'];
export type Measurement = Schemas['MeasurementDto'];
export type NewMeasurement = Schemas['NewMeasurementDto'];
export type MeasurementConditions = Schemas['MeasurementConditionsDto'];
export type CellVerdict = Schemas['CellVerdictDto'];
export type Criterion = Schemas['StoredCriterionDto'];
export type MissingItem = Schemas['MissingItemDto'];
export type Correction = Schemas['CorrectionDto'];
export type Photo = Schemas['PhotoDto'];
export type PhotoCorner = Schemas['CornerDto'];
type RecipeRevision = Schemas['RecipeRevisionDto'];

/** One person’s judgement of a cell. */
export type OwnRating = { rating: number | null; outcome: Outcome | null; tags: readonly string[]; note: string };
export type SentRating = OwnRating & { cellId: string; seenVersion: number | null };

const POLL_MS = 1500;
const MOST_PHOTOS = 100;

const couponPath = (key: string) => `${COUPONS}/${encodeURIComponent(key)}`;
export const photosPath = (couponId: string) => `${couponPath(couponId)}/photos`;
const inspectionPath = (couponId: string) => `${couponPath(couponId)}/inspection`;

export function useInspection(couponId: string): SWRResponse<Inspection, ProblemError> {
  return useRead<Inspection>(inspectionPath(couponId), undefined, { keepPreviousData: false });
}

/** Asked again as long as one of them is still being processed. */
export function usePhotos(couponId: string): SWRResponse<{ items: readonly Photo[] }, ProblemError> {
  return useRead<{ items: readonly Photo[] }>(
    photosPath(couponId),
    { limit: MOST_PHOTOS },
    {
      keepPreviousData: false,
      refreshInterval: (latest) =>
        latest?.items.some(({ state }) => state === 'processing' || state === 'uploading') === true ? POLL_MS : 0,
    },
  );
}

export async function saveRatings(couponId: string, ratings: readonly SentRating[]): Promise<readonly CellRating[]> {
  const answer = await request<Schemas['SavedRatingsDto']>('put', `${couponPath(couponId)}/ratings`, { body: { ratings } });
  return answer.ratings;
}

/** What was read of a coupon’s inspection, to be changed in place and read again. */
export function useInspectionCache(couponId: string) {
  const { mutate } = useSWRConfig();
  return useMemo(() => {
    const key = [inspectionPath(couponId), undefined];
    return {
      /** Puts saved ratings into it; the verdicts that follow from them come with the next read. */
      takeOver: async (saved: readonly CellRating[]): Promise<void> => {
        const ids = new Set(saved.map(({ id }) => id));
        const merged = (before: Inspection | undefined) =>
          before === undefined ? undefined : { ...before, ratings: [...before.ratings.filter(({ id }) => !ids.has(id)), ...saved] };
        await mutate<Inspection>(key, merged, { revalidate: false });
      },
      readAgain: async (): Promise<void> => {
        await mutate(key);
      },
    };
  }, [couponId, mutate]);
}

export async function addMeasurements(couponId: string, measurements: readonly NewMeasurement[], idempotencyKey: string): Promise<void> {
  await request('post', `${couponPath(couponId)}/measurements`, { body: { measurements }, idempotencyKey });
  await revalidate(inspectionPath(couponId), craterFitPath(couponId));
}

export async function recordCriteria(couponId: string, version: number, criteria: readonly Partial<Criterion>[]): Promise<void> {
  await request('put', `${couponPath(couponId)}/criteria`, { body: { criteria }, version });
  await readCouponAgain();
}

export type UnratedCell = { cellId: string; reason: string };

export async function finishInspection(
  couponId: string,
  version: number,
  { unratedCells, idempotencyKey }: { unratedCells: readonly UnratedCell[]; idempotencyKey: string },
): Promise<void> {
  await request('post', `${couponPath(couponId)}/inspect`, { body: { unratedCells }, version, idempotencyKey });
  await readCouponAgain();
}

export async function sealCoupon(couponId: string, version: number, idempotencyKey: string): Promise<void> {
  await request('post', `${couponPath(couponId)}/seal`, { version, idempotencyKey });
  await readCouponAgain();
}

export type NewCorrection = { cellId?: string | undefined; text: string; reason: string };

export async function correctCoupon(couponId: string, correction: NewCorrection, idempotencyKey: string): Promise<void> {
  await request('post', `${couponPath(couponId)}/corrections`, { body: correction, idempotencyKey });
  await revalidate(inspectionPath(couponId));
}

export async function setCorners({ id, couponId, version }: Photo, corners: readonly PhotoCorner[]): Promise<void> {
  await request('put', `/api/photos/${id}/corners`, { body: { corners, foundBy: 'hand' }, version });
  await readPhotosAgain(couponId);
}

export async function retryPhoto({ id, couponId }: Photo): Promise<void> {
  await request('post', `/api/photos/${id}/retry`);
  await readPhotosAgain(couponId);
}

/** Photos decide about sealing, so what is missing is read again with them. */
export function readPhotosAgain(couponId: string): Promise<void> {
  return revalidate(photosPath(couponId), inspectionPath(couponId));
}

/** A draft that rests on one cell. */
export async function draftFromCell(couponId: string, cellId: string, idempotencyKey: string): Promise<RecipeRevision> {
  return request<RecipeRevision>('post', '/api/recipes/from-cell', { body: { couponId, cellId }, idempotencyKey });
}

function readCouponAgain(): Promise<void> {
  return revalidate(COUPONS);
}
