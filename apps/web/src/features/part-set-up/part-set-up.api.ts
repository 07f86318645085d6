import type { components } from '@proofplate/api-client';
import type { EnteredPart } from '@proofplate/recipe-model';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type PartGroundFacts = Schemas['PartGroundDto'];
export type SavedPart = Schemas['PartSetUpDto'];
export type RunPart = Schemas['RunPartSetUpDto'];

const ofRun = (runId: string) => `/api/runs/${encodeURIComponent(runId)}/part-set-up`;
/** A part is typed against the ground it shows, so it is not read again in the background. */
const FOR_EDITING = { revalidateOnFocus: false, revalidateOnReconnect: false } as const;

/** The part of a run as it was last saved; an empty id reads nothing. */
export function useRunPart(runId: string): SWRResponse<RunPart, ProblemError> {
  return useRead<RunPart>(runId === '' ? null : ofRun(runId), undefined, FOR_EDITING);
}

/** Beam and lens for a setting whose run does not exist yet; an empty id reads nothing. */
export function useRevisionGround(revisionId: string): SWRResponse<PartGroundFacts, ProblemError> {
  return useRead<PartGroundFacts>(
    revisionId === '' ? null : `/api/runs/part-ground/${encodeURIComponent(revisionId)}`,
    undefined,
    FOR_EDITING,
  );
}

export async function savePart(runId: string, body: EnteredPart, idempotencyKey: string): Promise<SavedPart> {
  const saved = await request<SavedPart>('post', ofRun(runId), { body, idempotencyKey });
  await revalidate(ofRun(runId));
  return saved;
}
