import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

export type Hold = components['schemas']['HoldDto'];
export type HoldSubject = { recipeId: string } | { machineId: string };
/** A hold as it stands beside a recipe, a run or an answer. */
export type OpenHold = { id: string; subject: 'recipe' | 'machine'; reason: string; placedBy: string; placedAt?: string };

/** Where a hold can be placed, as people call it: of a recipe the code alone is enough on a button. */
export type HoldSubjects = { recipe?: { id: string; code: string; title: string }; machine?: { id: string; name: string } };
const MOST_OPEN = 100;

/** Every hold of the shop that nobody has released yet. */
export function useOpenHolds(): SWRResponse<{ items: Hold[] }, ProblemError> {
  return useRead<{ items: Hold[] }>('/api/holds', { state: 'open', limit: MOST_OPEN });
}

export function subjectName({ recipe, machine }: HoldSubjects, kind: OpenHold['subject']): string {
  if (kind === 'machine') return machine?.name ?? 'This machine';
  return recipe === undefined ? 'This recipe' : `${recipe.code} ${recipe.title}`;
}

const TOUCHED = ['/api/finder', '/api/runs', '/api/holds', '/api/recipes'];

export async function placeHold(subject: HoldSubject, reason: string, idempotencyKey: string): Promise<void> {
  await request<Hold>('post', '/api/holds', { body: { ...subject, reason }, idempotencyKey });
  await revalidate(...TOUCHED);
}

export async function releaseHold(id: string, reason: string, idempotencyKey: string): Promise<void> {
  await request<Hold>('post', `/api/holds/${id}/release`, { body: { reason }, idempotencyKey });
  await revalidate(...TOUCHED);
}
