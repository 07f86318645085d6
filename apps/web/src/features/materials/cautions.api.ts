import type { CautionLevel, CautionScope } from '@proofplate/recipe-model';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

export type ShopCaution = {
  id: string;
  level: CautionLevel;
  subject: string;
  text: string;
  source: string;
  appliesTo: CautionScope;
  isShipped: boolean;
  version: number;
  allowedActions: readonly string[];
};
export type CautionBody = Pick<ShopCaution, 'level' | 'subject' | 'text' | 'source' | 'appliesTo'>;
export type CautionsFor = { isForbidden: boolean; items: readonly ShopCaution[] };

type Page<T> = { items: readonly T[]; nextCursor: string | null };

const CAUTIONS = '/api/cautions';
/** Lists of materials show their cautions, so they are read anew too. */
const TOUCHED = [CAUTIONS, '/api/materials'] as const;

export function useCautions(): SWRResponse<Page<ShopCaution>, ProblemError> {
  return useRead<Page<ShopCaution>>(CAUTIONS, undefined, { revalidateOnFocus: false, revalidateOnReconnect: false });
}

/** The cautions for work on a material, never first. */
export function useCautionsFor(materialId: string): SWRResponse<CautionsFor, ProblemError> {
  return useRead<CautionsFor>(`${CAUTIONS}/for`, { materialId });
}

export async function addCaution(body: CautionBody, idempotencyKey: string): Promise<void> {
  await request<ShopCaution>('post', CAUTIONS, { body, idempotencyKey });
  await revalidate(...TOUCHED);
}

/** Towards more caution only; the server refuses the other way. */
export async function tightenCaution({ id, version }: ShopCaution, body: Partial<CautionBody>): Promise<void> {
  await request<ShopCaution>('patch', `${CAUTIONS}/${encodeURIComponent(id)}`, { body, version });
  await revalidate(...TOUCHED);
}
