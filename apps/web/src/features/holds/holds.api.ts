import type { components } from '@proofplate/api-client';
import { request } from '../../lib/api';
import { revalidate } from '../../lib/swr';

export type Hold = components['schemas']['HoldDto'];
export type HoldSubject = { recipeId: string } | { machineId: string };
/** A hold as it stands beside a recipe, a run or an answer. */
export type OpenHold = { id: string; subject: 'recipe' | 'machine'; reason: string; placedBy: string; placedAt?: string };

const TOUCHED = ['/api/finder', '/api/runs', '/api/holds', '/api/recipes'];

export async function placeHold(subject: HoldSubject, reason: string, idempotencyKey: string): Promise<void> {
  await request<Hold>('post', '/api/holds', { body: { ...subject, reason }, idempotencyKey });
  await revalidate(...TOUCHED);
}

export async function releaseHold(id: string, reason: string, idempotencyKey: string): Promise<void> {
  await request<Hold>('post', `/api/holds/${id}/release`, { body: { reason }, idempotencyKey });
  await revalidate(...TOUCHED);
}
