import type { components } from '@proofplate/api-client';
import type { SWRResponse } from 'swr';
import type { ProblemError } from '../../lib/api';
import { useRead } from '../../lib/swr';

type Schemas = components['schemas'];

export type FinderResult = Schemas['FinderDto'];
export type FinderAnswer = Schemas['FinderAnswerDto'];
export type FinderRecipe = Schemas['FinderRecipeDto'];
export type FinderCaution = Schemas['FinderCautionDto'];
export type NearMiss = Schemas['NearMissDto'];
export type ReferenceCell = Schemas['ReferenceCellDto'];
export type WithdrawnRecipe = Schemas['WithdrawnRecipeDto'];
export type SlotView = Schemas['SlotDto'];
export type SlotOption = Schemas['SlotOptionDto'];
export type SheetCode = Schemas['SheetCodeDto'];

export const SLOTS = ['machine', 'lens', 'material', 'finish', 'effect'] as const;
export type SlotKey = (typeof SLOTS)[number];
export type Choice = Partial<Record<SlotKey, string>> & { words?: string; recipe?: string };

/** A withdrawal or a hold reaches whoever stands at the machine within this time, without a touch. */
const LOOK_AGAIN_MS = 20_000;

export function useFinder(choice: Choice | undefined): SWRResponse<FinderResult, ProblemError> {
  const query = choice === undefined ? undefined : queryOf(choice);
  return useRead<FinderResult>(query === undefined ? null : '/api/finder', query, { refreshInterval: LOOK_AGAIN_MS });
}

export function useSheetCode(recipeId: string): SWRResponse<SheetCode, ProblemError> {
  return useRead<SheetCode>('/api/finder/sheet-code', { recipeId });
}

function queryOf({ machine, lens, material, finish, effect, words, recipe }: Choice) {
  return { machineId: machine, lensId: lens, materialId: material, finishId: finish, effectId: effect, words, recipeId: recipe };
}
