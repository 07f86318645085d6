import type { components } from '@proofplate/api-client';
import { useCallback } from 'react';
import useSWR, { type SWRResponse } from 'swr';
import useSWRInfinite from 'swr/infinite';
import { api, type ProblemError, type Query, request } from '../../lib/api';
import { saveTextFile } from '../../lib/save-file';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type Coupon = Schemas['CouponDto'];
export type CouponCell = Schemas['CouponCellDto'];
export type TestGrid = Schemas['TestGridDto'];
export type CouponSummary = Schemas['CouponSummaryDto'];
export type CouponFace = Schemas['CouponFaceDto'];
export type CouponFacets = Schemas['CouponFacetsDto'];
export type CouponPreview = Schemas['CouponPreviewDto'];
export type PlanBody = Schemas['PlanCouponDto'];
export type ConfirmBody = Schemas['ConfirmRevisionDto'];
export type ImportBody = Schemas['ImportCouponDto'];
export type ImportPreview = Schemas['ImportPreviewDto'];
export type MarkBody = Schemas['MarkCellDto'];
export type MarkedCell = Schemas['MarkedCellDto'];
export type ParameterSet = Schemas['ParameterSetDto'];
export type Polarity = 'dark on bright' | 'bright on dark';
export type ShopCaution = Schemas['CautionDto'];
type CouponPage = Schemas['CouponPageDto'];

export type CouponFilters = {
  state?: string | undefined;
  materialId?: string | undefined;
  effectId?: string | undefined;
  machineId?: string | undefined;
  q?: string | undefined;
};

export const COUPONS = '/api/coupons';
const PAGE_SIZE = 25;
/** At the machine they stand below the finder, so a few are enough. */
const WAITING_SHOWN = 5;
const one = (idOrCode: string) => `${COUPONS}/${encodeURIComponent(idOrCode)}`;

/** The list in pages that are added one after the other. */
export function useCoupons(filters: CouponFilters) {
  const {
    data,
    error,
    isLoading,
    isValidating,
    mutate: again,
    size,
    setSize,
  } = useSWRInfinite<CouponPage, ProblemError>(
    (index: number, before: CouponPage | null) => {
      if (before?.nextCursor === null) return null;
      return [COUPONS, { ...filters, limit: PAGE_SIZE, cursor: index === 0 ? undefined : before?.nextCursor }];
    },
    ([path, query]: [string, Query]) => request<CouponPage>('get', path, { query }),
    { revalidateAll: true },
  );
  const showMore = useCallback(() => void setSize(size + 1), [setSize, size]);
  return { pages: data, error, isLoading, isValidating, retry: () => void again(), showMore, hasMore: data?.at(-1)?.nextCursor !== null };
}

export function useCouponFacets(filters: CouponFilters | null): SWRResponse<CouponFacets, ProblemError> {
  return useRead<CouponFacets>(filters === null ? null : `${COUPONS}/facets`, filters ?? undefined);
}

/** The newest coupons that wait to be marked on a machine. */
export function useWaitingCoupons(machineId: string): SWRResponse<CouponPage, ProblemError> {
  return useRead<CouponPage>(COUPONS, { state: 'planned', machineId, limit: WAITING_SHOWN }, { keepPreviousData: false });
}

/** One coupon by its id or by the code on the plate. */
export function useCoupon(idOrCode: string | undefined): SWRResponse<Coupon, ProblemError> {
  return useRead<Coupon>(idOrCode === undefined ? null : one(idOrCode), undefined, { keepPreviousData: false });
}

/** What a plan would give; asked again whenever the body differs, and the last answer stays until the next is there. */
export function useCouponPreview(body: PlanBody | undefined): SWRResponse<CouponPreview, ProblemError> {
  return useSWR<CouponPreview, ProblemError>(
    body === undefined ? null : [`${COUPONS}/preview`, JSON.stringify(body)],
    () => request<CouponPreview>('post', `${COUPONS}/preview`, { body }),
    { keepPreviousData: true, revalidateOnFocus: false, shouldRetryOnError: false },
  );
}

export async function planCoupon(body: PlanBody, idempotencyKey: string): Promise<Coupon> {
  return stored(await request<Coupon>('post', COUPONS, { body, idempotencyKey }));
}

/** A coupon of equal cells that is to prove a draft. */
export async function planConfirmation(body: ConfirmBody, idempotencyKey: string): Promise<Coupon> {
  return stored(await request<Coupon>('post', `${COUPONS}/confirmation`, { body, idempotencyKey }));
}

export async function previewImport(body: ImportBody): Promise<ImportPreview> {
  return request<ImportPreview>('post', `${COUPONS}/import/preview`, { body });
}

export async function importCoupon(body: ImportBody, idempotencyKey: string): Promise<Coupon> {
  return stored(await request<Coupon>('post', `${COUPONS}/import`, { body, idempotencyKey }));
}

export async function startMarking({ id }: Coupon): Promise<Coupon> {
  return request<Coupon>('post', `${one(id)}/marking/start`, { body: {} });
}

export async function markCell({ id }: Coupon, body: MarkBody, idempotencyKey: string): Promise<MarkedCell> {
  return request<MarkedCell>('post', `${one(id)}/marking/cells`, { body, idempotencyKey });
}

export async function undoMark({ id }: Coupon, cell: CouponCell, idempotencyKey: string): Promise<MarkedCell> {
  const body = { cellId: cell.id, cellVersion: cell.version };
  return request<MarkedCell>('post', `${one(id)}/marking/undo`, { body, idempotencyKey });
}

export async function finishMarking({ id }: Coupon, body: Schemas['FinishMarkingDto'], idempotencyKey: string): Promise<Coupon> {
  return stored(await request<Coupon>('post', `${one(id)}/marking/finish`, { body, idempotencyKey }));
}

/** Plain links carry no session, so a file is fetched with it and handed to the browser. */
export async function downloadArtwork({ id, code }: Pick<Coupon, 'id' | 'code'>, polarity: Polarity): Promise<void> {
  const { data = '' } = await api.GET('/api/coupons/{couponId}/artwork.svg', {
    params: { path: { couponId: id }, query: { polarity } },
    parseAs: 'text',
  });
  saveTextFile(`${code}.svg`, data, 'image/svg+xml;charset=utf-8');
}

export async function downloadCells({ id, code }: Pick<Coupon, 'id' | 'code'>): Promise<void> {
  const { data = '' } = await api.GET('/api/coupons/{couponId}/cells.csv', { params: { path: { couponId: id } }, parseAs: 'text' });
  saveTextFile(`${code}-cells.csv`, data);
}

export async function downloadList(filters: CouponFilters): Promise<void> {
  const query = Object.fromEntries(Object.entries(filters).filter(([, value]) => value !== undefined && value !== ''));
  const { data = '' } = await api.GET('/api/coupons/export.csv', { params: { query }, parseAs: 'text' });
  saveTextFile('coupons.csv', data);
}

async function stored(coupon: Coupon): Promise<Coupon> {
  await revalidate(COUPONS);
  return coupon;
}

// The choices of a plan. Machines and materials are domains of their own; a plan only picks from them.

export type Machine = Schemas['MachineDto'];
export type MachineLens = Schemas['MachineLensDto'];
export type Choice = { id: string; name: string };
type Page<T> = { items: readonly T[] };
const ALL = { limit: 100 };

export function useMachineChoices(): SWRResponse<Page<Machine>, ProblemError> {
  return useRead<Page<Machine>>('/api/machines', ALL);
}

export function useLensChoices(machineId: string): SWRResponse<Page<MachineLens>, ProblemError> {
  return useRead<Page<MachineLens>>(machineId === '' ? null : `/api/machines/${encodeURIComponent(machineId)}/lenses`);
}

/** The power table that a plan on this machine is worked out with. */
export function useNewestCalibration(machineId: string): Schemas['CalibrationDto'] | undefined {
  const newestFirst = useRead<Page<Schemas['CalibrationDto']>>(`/api/machines/${encodeURIComponent(machineId)}/calibrations`, { limit: 1 });
  return newestFirst.data?.items[0];
}

export function useGroundChoices() {
  const materials = useRead<Page<Choice>>('/api/materials', ALL);
  const finishes = useRead<Page<Choice>>('/api/finishes', ALL);
  const effects = useRead<Page<Choice>>('/api/effects', ALL);
  return { materials: materials.data?.items, finishes: finishes.data?.items, effects: effects.data?.items };
}

/** What is known of the work; an empty id is not known yet. */
export type WorkInHand = { materialId: string; finishId: string; effectId: string; machineId: string };

/** The cautions for the work as far as it is chosen, never first; nothing before the material is. */
export function useCautionsFor({ materialId, ...rest }: WorkInHand): readonly ShopCaution[] {
  const known = Object.fromEntries(Object.entries(rest).filter(([, id]) => id !== ''));
  const path = materialId === '' ? null : '/api/cautions/for';
  // those of another material must not stand beside this one for a moment
  const read = useRead<Schemas['CautionsForDto']>(path, { materialId, ...known }, { keepPreviousData: false });
  return read.data?.items ?? [];
}
