import { RUN_KIND_LABELS } from '@proofplate/recipe-model';
import type { MarkState } from '../../components/state-mark';
import type { RunKind, RunSummary } from './runs.api';

/** How a run stands, as word and shape. */
export function runMark({ state, badResult }: Pick<RunSummary, 'state' | 'badResult'>): { mark: MarkState; word: string } {
  if (badResult !== null) return { mark: 'fails', word: state === 'finished' ? 'Finished, bad result' : 'Under way, bad result' };
  return state === 'finished' ? { mark: 'passes', word: 'Finished' } : { mark: 'inReview', word: 'Under way' };
}

export const kindWord = (kind: RunKind) => RUN_KIND_LABELS[kind];

/** "R-0031 revision 3", "R-0031 draft". */
export function revisionWords({ recipe, revision }: Pick<RunSummary, 'recipe' | 'revision'>): string {
  return `${recipe.code} ${revision.number === null ? 'draft' : `revision ${revision.number}`}`;
}
