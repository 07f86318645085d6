import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

export type Lens = {
  id: string;
  name: string;
  focalLengthMm: number;
  fieldSizeMm: number;
  notes: string;
  archivedAt: string | null;
  version: number;
  allowedActions: readonly string[];
};
export type LensBody = Pick<Lens, 'name' | 'focalLengthMm' | 'fieldSizeMm' | 'notes'>;

type Page<T> = { items: readonly T[]; nextCursor: string | null };

const LENSES = '/api/lenses';
const MOST_AT_ONCE = 100;
const one = (id: string) => `${LENSES}/${encodeURIComponent(id)}`;
/** Machines show names of lenses, so they are read anew too. */
const TOUCHED = [LENSES, '/api/machines'] as const;

export function useLenses(isArchived = false): SWRResponse<Page<Lens>, ProblemError> {
  return useRead<Page<Lens>>(LENSES, { limit: MOST_AT_ONCE, archived: isArchived });
}

export async function createLens(body: LensBody, idempotencyKey: string): Promise<void> {
  await request<Lens>('post', LENSES, { body, idempotencyKey });
  await revalidate(...TOUCHED);
}

export async function changeLens({ id, version }: Lens, body: LensBody): Promise<void> {
  await request<Lens>('patch', one(id), { body, version });
  await revalidate(...TOUCHED);
}

/** Takes the lens out of the choices, or back. */
export async function setLensArchived({ id, version }: Pick<Lens, 'id' | 'version'>, isArchived: boolean): Promise<Lens> {
  const lens = await request<Lens>('post', `${one(id)}/${isArchived ? 'archive' : 'restore'}`, { version });
  await revalidate(...TOUCHED);
  return lens;
}
