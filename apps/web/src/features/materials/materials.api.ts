import type { CautionLevel, MaterialFamily } from '@proofplate/recipe-model';
import type { SWRResponse } from 'swr';
import { type ProblemError, request } from '../../lib/api';
import { revalidate, useRead } from '../../lib/swr';

export type Property = { value: number; unit?: string; source: string };
export type PropertyKey = 'thermalConductivityWPerMK' | 'densityKgPerM3' | 'heatCapacityJPerKgK';
export type Properties = Partial<Record<PropertyKey, Property>>;

export type Material = {
  id: string;
  name: string;
  family: MaterialFamily;
  familyLabel: string;
  grade: string;
  standardDesignation: string;
  supplier: string;
  thicknessMm: number | null;
  properties: Properties;
  notes: string;
  cautions: readonly { id: string; level: CautionLevel; subject: string }[];
  archivedAt: string | null;
  version: number;
  allowedActions: readonly string[];
};
export type MaterialBody = Pick<Material, 'name' | 'grade' | 'standardDesignation' | 'supplier' | 'thicknessMm' | 'notes'> & {
  family: string;
  properties: Partial<Record<PropertyKey, { value: number; source: string }>>;
};
export type MaterialFacets = { families: readonly { family: MaterialFamily; label: string; count: number }[] };
export type MaterialFilter = { family?: readonly string[]; q?: string; archived?: boolean };

export type Finish = {
  id: string;
  name: string;
  preparation: string;
  treatment: string;
  archivedAt: string | null;
  version: number;
  allowedActions: readonly string[];
};
export type FinishBody = Pick<Finish, 'name' | 'preparation' | 'treatment'>;

export type MaterialGroup = {
  id: string;
  name: string;
  materials: readonly { id: string; name: string }[];
  version: number;
  allowedActions: readonly string[];
};
export type MaterialGroupBody = { name: string; materialIds: readonly string[] };

type Page<T> = { items: readonly T[]; nextCursor: string | null };

const MATERIALS = '/api/materials';
const FINISHES = '/api/finishes';
const GROUPS = '/api/material-groups';
const MOST_AT_ONCE = 100;
// A form must start from the version it shows, so what is edited is not read again in the background.
const FOR_EDITING = { revalidateOnFocus: false, revalidateOnReconnect: false } as const;
const under = (path: string, id: string) => `${path}/${encodeURIComponent(id)}`;

export function useMaterials(filter: MaterialFilter = {}): SWRResponse<Page<Material>, ProblemError> {
  return useRead<Page<Material>>(MATERIALS, { limit: MOST_AT_ONCE, ...filter });
}

export function useMaterialFacets(): SWRResponse<MaterialFacets, ProblemError> {
  return useRead<MaterialFacets>(`${MATERIALS}/facets`);
}

export function useMaterial(id: string): SWRResponse<Material, ProblemError> {
  return useRead<Material>(under(MATERIALS, id), undefined, FOR_EDITING);
}

export function useFinishes(isArchived = false): SWRResponse<Page<Finish>, ProblemError> {
  return useRead<Page<Finish>>(FINISHES, { limit: MOST_AT_ONCE, archived: isArchived }, FOR_EDITING);
}

export function useMaterialGroups(): SWRResponse<Page<MaterialGroup>, ProblemError> {
  return useRead<Page<MaterialGroup>>(GROUPS, { limit: MOST_AT_ONCE }, FOR_EDITING);
}

export async function createMaterial(body: MaterialBody, idempotencyKey: string): Promise<Material> {
  const material = await request<Material>('post', MATERIALS, { body, idempotencyKey });
  await revalidate(MATERIALS);
  return material;
}

export async function changeMaterial({ id, version }: Material, body: MaterialBody): Promise<Material> {
  const material = await request<Material>('patch', under(MATERIALS, id), { body, version });
  await revalidate(MATERIALS, GROUPS);
  return material;
}

/** Takes the material out of the choices, or back. */
export async function setMaterialArchived({ id, version }: Pick<Material, 'id' | 'version'>, isArchived: boolean): Promise<Material> {
  const material = await request<Material>('post', `${under(MATERIALS, id)}/${isArchived ? 'archive' : 'restore'}`, { version });
  await revalidate(MATERIALS);
  return material;
}

export async function createFinish(body: FinishBody, idempotencyKey: string): Promise<void> {
  await request<Finish>('post', FINISHES, { body, idempotencyKey });
  await revalidate(FINISHES);
}

export async function changeFinish({ id, version }: Finish, body: FinishBody): Promise<void> {
  await request<Finish>('patch', under(FINISHES, id), { body, version });
  await revalidate(FINISHES);
}

export async function setFinishArchived({ id, version }: Pick<Finish, 'id' | 'version'>, isArchived: boolean): Promise<Finish> {
  const finish = await request<Finish>('post', `${under(FINISHES, id)}/${isArchived ? 'archive' : 'restore'}`, { version });
  await revalidate(FINISHES);
  return finish;
}

export async function createMaterialGroup(body: MaterialGroupBody, idempotencyKey: string): Promise<void> {
  await request<MaterialGroup>('post', GROUPS, { body, idempotencyKey });
  await revalidate(GROUPS);
}

export async function changeMaterialGroup({ id, version }: MaterialGroup, body: MaterialGroupBody): Promise<void> {
  await request<MaterialGroup>('patch', under(GROUPS, id), { body, version });
  await revalidate(GROUPS);
}
