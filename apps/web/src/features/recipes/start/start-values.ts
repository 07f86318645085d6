import { ROUTE_KIND_LABELS } from '@proofplate/recipe-model';
import { emptyStep, type StepValues } from '../draft/draft-values';
import type { NewRecipe } from '../recipes.api';

export type StartValues = {
  machineId: string;
  lensId: string;
  materialId: string;
  finishId: string;
  effectId: string;
  route: NewRecipe['route'];
  title: string;
  reason: string;
  /** One to begin with; the draft takes more. */
  steps: [StepValues];
};

export const START_LABELS = {
  machineId: 'Machine',
  lensId: 'Lens',
  materialId: 'Material',
  finishId: 'Finish',
  effectId: 'Effect wanted',
  route: 'How the setting was come by',
  reason: 'Where the setting comes from',
  title: 'Title',
} as const;

const OTHER_ROUTES = ['earlier-experience', 'customer-given', 'transferred'] as const;
export const ROUTE_OPTIONS = OTHER_ROUTES.map((value) => ({ value, label: ROUTE_KIND_LABELS[value] }));

export function emptyStart(): StartValues {
  const ground = { machineId: '', lensId: '', materialId: '', finishId: '', effectId: '' };
  return { ...ground, route: 'earlier-experience', title: '', reason: '', steps: [emptyStep([])] };
}
