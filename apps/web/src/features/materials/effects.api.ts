import type { Criterion } from '@proofplate/recipe-model';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

export type Effect = {
  id: string;
  key: string;
  isShipped: boolean;
  name: string;
  criteria: readonly Criterion[];
  notes: string;
  archivedAt: string | null;
  version: number;
  allowedActions: readonly string[];
};
export type EffectBody = { name: string; criteria: readonly Criterion[]; notes: string };

type Page<T> = { items: readonly T[]; nextCursor: string | null };

const EFFECTS = '/api/effects';
const MOST_AT_ONCE = 100;
const one = (id: string) => `${EFFECTS}/${encodeURIComponent(id)}`;

export function useEffects(isArchived = false): SWRResponse<Page<Effect>, ProblemError> {
  return useRead<Page<Effect>>(
    EFFECTS,
    { limit: MOST_AT_ONCE, archived: isArchived },
    { revalidateOnFocus: false, revalidateOnReconnect: false },
  );
}

export async function createEffect(body: EffectBody, idempotencyKey: string): Promise<void> {
  await request<Effect>('post', EFFECTS, { body, idempotencyKey });
  await revalidate(EFFECTS);
}

export async function changeEffect({ id, version }: Effect, body: EffectBody): Promise<void> {
  await request<Effect>('patch', one(id), { body, version });
  await revalidate(EFFECTS);
}

export async function setEffectArchived({ id, version }: Pick<Effect, 'id' | 'version'>, isArchived: boolean): Promise<Effect> {
  const effect = await request<Effect>('post', `${one(id)}/${isArchived ? 'archive' : 'restore'}`, { version });
  await revalidate(EFFECTS);
  return effect;
}
