import type { components } from '@proofplate/api-client';
import { useCallback } from 'react';
import { mutate, type SWRResponse } from 'swr';
import useSWRInfinite from 'swr/infinite';
import { ProblemError, type Query, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type Recipe = Schemas['RecipeDto'];
export type RecipeSummary = Schemas['RecipeSummaryDto'];
export type RecipePage = Schemas['RecipePageDto'];
export type RecipeFacets = Schemas['RecipeFacetsDto'];
export type PowerShift = Schemas['PowerShiftDto'];
export type RecipePowerShift = Schemas['RecipePowerShiftDto'];
export type RecipeFace = Schemas['RecipeFaceDto'];
export type Revision = Schemas['RecipeRevisionDto'];
export type RevisionBrief = Schemas['RevisionBriefDto'];
export type RevisionChange = Schemas['UpdateRevisionDto'];
export type SignOff = Schemas['SignOffDto'];
export type EvidenceCell = Schemas['EvidenceCellDto'];
export type EvidenceCandidates = Schemas['EvidenceCandidatesDto'];
export type DerivedNumber = Schemas['DerivedNumberDto'];
export type Comparison = Schemas['ComparisonDto'];
export type ComparisonRow = Schemas['ComparisonRowDto'];
export type ComparedValue = Schemas['ComparedValueDto'];
export type ChangeSize = Schemas['ChangeSizeDto'];
export type Calibration = Schemas['CalibrationDto'];
export type EnteredStep = Schemas['EnterStepDto'];
export type SetUpStep = Schemas['SetUpStepDto'];
export type Coupon = Schemas['CouponDto'];
export type NewRecipe = Schemas['CreateRecipeDto'];
export type Named = { id: string; name: string };

const RECIPES = '/api/recipes';
const REVISIONS = '/api/revisions';
const SIGN_OFFS = '/api/sign-offs';
const COUPONS = '/api/coupons';
const PAGE_SIZE = 50;
const LARGEST_PAGE = 100;

export type RecipeFilters = { state?: string | undefined; materialId?: string; effectId?: string; machineId?: string; q?: string };

/** The list in pages that are added one after the other. */
export function useRecipes(filters: RecipeFilters) {
  const { data, error, isLoading, isValidating, mutate, size, setSize } = useSWRInfinite<RecipePage, ProblemError>(
    (index: number, before: RecipePage | null) => {
      if (before?.nextCursor === null) return null;
      return [RECIPES, { ...filters, limit: PAGE_SIZE, cursor: index === 0 ? undefined : before?.nextCursor }];
    },
    ([path, query]: [string, Query]) => request<RecipePage>('get', path, { query }),
    { revalidateAll: true },
  );
  const showMore = useCallback(() => void setSize(size + 1), [setSize, size]);
  const hasMore = data?.at(-1)?.nextCursor !== null;
  return { pages: data, error, isLoading, isValidating, retry: () => void mutate(), showMore, hasMore };
}

/** Approved settings of a machine with what later readings of the power meter say of them. */
export function usePowerShifts(machineId: string): SWRResponse<Schemas['RecipePowerShiftPageDto'], ProblemError> {
  return useRead<Schemas['RecipePowerShiftPageDto']>(`${RECIPES}/power-shifts`, { machineId, limit: LARGEST_PAGE });
}

/** Every row that fits, for a file: all pages, one after the other. */
export async function listAllRecipes(filters: RecipeFilters): Promise<readonly RecipeSummary[]> {
  const rows: RecipeSummary[] = [];
  let cursor: string | null | undefined;
  do {
    const page: RecipePage = await request<RecipePage>('get', RECIPES, { query: { ...filters, limit: LARGEST_PAGE, cursor } });
    rows.push(...page.items);
    cursor = page.nextCursor;
  } while (cursor !== null);
  return rows;
}

/** How many recipes fit, without their rows. */
export function useRecipeCount(filters: RecipeFilters | null): number | undefined {
  return useRead<RecipePage>(filters === null ? null : RECIPES, { ...filters, limit: 1 }).data?.facets.matchCount;
}

const NOT_HERE = new ProblemError({
  type: '/problems/not-found',
  status: 404,
  code: 'not-found',
  title: 'There is no such thing here',
  detail: 'No recipe of this shop has that code.',
  errors: [],
});

/** A recipe by the code that people read and that stands in the address. */
export function useRecipe(code: string): Pick<SWRResponse<Recipe, ProblemError>, 'data' | 'error' | 'isLoading' | 'mutate'> {
  const found = useRead<RecipePage>(RECIPES, { q: code, limit: LARGEST_PAGE });
  const id = found.data?.items.find((recipe) => recipe.code === code)?.id;
  const { data, error, isLoading, mutate } = useRead<Recipe>(id === undefined ? null : `${RECIPES}/${id}`);
  const isMissing = found.data !== undefined && id === undefined && !found.isValidating;
  return {
    data: data?.code === code ? data : undefined,
    error: found.error ?? error ?? (isMissing ? NOT_HERE : undefined),
    isLoading: found.isLoading || isLoading,
    mutate,
  };
}

export function useRevision(id: string | undefined): SWRResponse<Revision, ProblemError> {
  // Never in the background: a form must start from the version it shows, or a save would hide somebody else's change.
  return useRead<Revision>(id === undefined ? null : `${REVISIONS}/${id}`, undefined, {
    revalidateOnFocus: false,
    revalidateOnReconnect: false,
    keepPreviousData: false,
  });
}

export function useEvidenceCandidates(revisionId: string): SWRResponse<EvidenceCandidates, ProblemError> {
  return useRead<EvidenceCandidates>(`${REVISIONS}/${revisionId}/evidence/candidates`);
}

export function useComparison(ids: readonly string[], referenceId: string | undefined): SWRResponse<Comparison, ProblemError> {
  return useRead<Comparison>(ids.length < 2 ? null : `${REVISIONS}/compare`, { ids: ids.join(','), referenceId });
}

/** Newest first. */
export function useCalibrations(machineId: string): SWRResponse<{ items: readonly Calibration[] }, ProblemError> {
  return useRead(machineId === '' ? null : `/api/machines/${machineId}/calibrations`, { limit: LARGEST_PAGE });
}

/** A recipe whose first setting does not come from a coupon, as a draft. */
export async function startRecipe(body: NewRecipe, idempotencyKey: string): Promise<Revision> {
  const draft = await request<Revision>('post', RECIPES, { body, idempotencyKey });
  await revalidate(RECIPES);
  return draft;
}

type NewDraft = { basedOnRevisionId: string | undefined; reason: string };

export async function startDraft(recipeId: string, body: NewDraft, idempotencyKey: string): Promise<Revision> {
  const draft = await request<Revision>('post', `${RECIPES}/${recipeId}/drafts`, { body, idempotencyKey });
  await revalidate(RECIPES);
  return draft;
}

/** Saves against the version that was read; the answer is the whole draft as it now stands. */
export async function saveDraft(id: string, version: number, body: RevisionChange): Promise<Revision> {
  return await keepAnswer(await request<Revision>('patch', `${REVISIONS}/${id}`, { body, version }));
}

export async function readRevision(id: string): Promise<Revision> {
  return await request<Revision>('get', `${REVISIONS}/${id}`);
}

export type EvidenceChoice = { basisCellIds: readonly string[]; confirmationCellIds: readonly string[] };

export async function setEvidence(id: string, version: number, body: EvidenceChoice): Promise<Revision> {
  return await keepAnswer(await request<Revision>('put', `${REVISIONS}/${id}/evidence`, { body, version }));
}

/** Takes over a draft as the server answered it, and reads again what is worked out from it. */
export async function keepAnswer(revision: Revision): Promise<Revision> {
  await mutate([`${REVISIONS}/${revision.id}`, undefined], revision, { revalidate: false });
  void revalidate(`${REVISIONS}/${revision.id}/`);
  return revision;
}

export async function discardDraft({ id, version }: Pick<Revision, 'id' | 'version'>): Promise<void> {
  await request<void>('delete', `${REVISIONS}/${id}`, { version });
  await revalidate(RECIPES, SIGN_OFFS);
}

/** A coupon of n equal cells with exactly the setting of the draft. */
export async function planConfirmationCoupon(body: Schemas['ConfirmRevisionDto'], idempotencyKey: string): Promise<Coupon> {
  const coupon = await request<Coupon>('post', `${COUPONS}/confirmation`, { body, idempotencyKey });
  await revalidate(COUPONS, REVISIONS);
  return coupon;
}

// What a new recipe is for. Machines and materials are domains of their own; a recipe only picks from them.

type Choices<T> = { items: readonly T[] };
const ALL = { limit: LARGEST_PAGE };

export function useMachineChoices(): SWRResponse<Choices<Schemas['MachineDto']>, ProblemError> {
  return useRead('/api/machines', ALL);
}

export function useLensChoices(machineId: string): SWRResponse<Choices<Schemas['MachineLensDto']>, ProblemError> {
  return useRead(machineId === '' ? null : `/api/machines/${encodeURIComponent(machineId)}/lenses`, undefined, { keepPreviousData: false });
}

export function useGroundChoices() {
  const materials = useRead<Choices<Named>>('/api/materials', ALL);
  const finishes = useRead<Choices<Named>>('/api/finishes', ALL);
  const effects = useRead<Choices<Named>>('/api/effects', ALL);
  return { materials: materials.data?.items, finishes: finishes.data?.items, effects: effects.data?.items };
}
