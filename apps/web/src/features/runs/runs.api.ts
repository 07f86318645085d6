import type { components } from '@proofplate/api-client';
import { useCallback } from 'react';
import type { SWRResponse } from 'swr';
import useSWRInfinite from 'swr/infinite';
import { type ProblemError, type Query, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type Run = Schemas['RunDto'];
export type RunSummary = Schemas['RunSummaryDto'];
export type RunPage = Schemas['RunPageDto'];
export type StartSheet = Schemas['StartSheetDto'];
export type StartRun = Schemas['StartRunDto'];
export type Deviation = Schemas['DeviationDto'];
export type RunKind = Run['kind'];
export type BadOutcome = Schemas['TellBadResultDto']['outcome'];
export type PieceMeasurement = Schemas['MeasurePieceDto'];
export type RunFilters = { q?: string; state?: string; kind?: string; jobReference?: string; recipeId?: string };

const RUNS = '/api/runs';
const PAGE_SIZE = 50;
/** A hold reaches a run that is under way within this time, without a touch. */
const LOOK_AGAIN_MS = 20_000;

/** The list in pages that are added one after the other. */
export function useRuns(filters: RunFilters) {
  const { data, error, isLoading, mutate, size, setSize } = useSWRInfinite<RunPage, ProblemError>(
    (index: number, before: RunPage | null) => {
      if (before?.nextCursor === null) return null;
      return [RUNS, { ...filters, limit: PAGE_SIZE, cursor: index === 0 ? undefined : before?.nextCursor }];
    },
    ([path, query]: [string, Query]) => request<RunPage>('get', path, { query }),
    { revalidateAll: true },
  );
  const showMore = useCallback(() => void setSize(size + 1), [setSize, size]);
  return { pages: data, error, isLoading, retry: () => void mutate(), showMore, hasMore: data?.at(-1)?.nextCursor !== null };
}

/** By the code in the address. */
export function useRun(code: string): SWRResponse<Run, ProblemError> {
  return useRead<Run>(`${RUNS}/${encodeURIComponent(code)}`, undefined, { refreshInterval: LOOK_AGAIN_MS });
}

export function useStartSheet(revisionId: string): SWRResponse<StartSheet, ProblemError> {
  return useRead<StartSheet>(`${RUNS}/start-sheet/${encodeURIComponent(revisionId)}`, undefined, { refreshInterval: LOOK_AGAIN_MS });
}

/** Every row that fits, as the server writes it into a file. */
export async function runsCsv(filters: RunFilters): Promise<string> {
  return request<string>('get', `${RUNS}/export.csv`, { query: filters });
}

export async function startRun(body: StartRun, idempotencyKey: string): Promise<Run> {
  const run = await request<Run>('post', RUNS, { body, idempotencyKey });
  await revalidate(RUNS);
  return run;
}

export async function tickRun(run: Run, key: string, isTicked: boolean): Promise<Run> {
  const body = isTicked ? { tick: [key], untick: [] } : { tick: [], untick: [key] };
  return request<Run>('patch', `${RUNS}/${run.id}/ticks`, { body });
}

export async function judgeFirstPiece(run: Run, body: { ok: boolean; note: string }, idempotencyKey: string): Promise<Run> {
  return request<Run>('post', `${RUNS}/${run.id}/first-piece`, { body, idempotencyKey });
}

export async function finishRun(
  run: Run,
  body: { good: number; scrap: number; notes: string; measurements: PieceMeasurement[] },
  idempotencyKey: string,
): Promise<Run> {
  return request<Run>('post', `${RUNS}/${run.id}/finish`, { body, idempotencyKey });
}

export async function tellBadResult(run: Run, body: { outcome: BadOutcome; note: string }, idempotencyKey: string): Promise<Run> {
  return request<Run>('post', `${RUNS}/${run.id}/bad-result`, { body, idempotencyKey });
}
