import type { Recipe } from '../recipes.api';

export const FEWEST_COMPARED = 2;
export const MOST_COMPARED = 4;

export type CompareChoice = { ids: readonly string[]; referenceId: string | undefined; showsAll: boolean };

/** What is compared stands in the address; without it the approved revision and the newest beside it. */
export function choiceFromAddress(search: URLSearchParams, recipe: Pick<Recipe, 'revisions' | 'current'>): CompareChoice {
  const asked = (search.get('ids') ?? '').split(',').filter((id) => id !== '');
  const ids = asked.length >= FEWEST_COMPARED ? [...new Set(asked)].slice(0, MOST_COMPARED) : usualPair(recipe);
  const reference = search.get('reference') ?? undefined;
  return { ids, referenceId: reference !== undefined && ids.includes(reference) ? reference : undefined, showsAll: search.has('all') };
}

function usualPair({ revisions, current }: Pick<Recipe, 'revisions' | 'current'>): string[] {
  const [newest, second] = revisions;
  if (newest === undefined || second === undefined) return [];
  const other = newest.id === current?.id ? second : newest;
  return current === null ? [second.id, newest.id] : [current.id, other.id];
}

export function addressOf({ ids, referenceId, showsAll }: CompareChoice): URLSearchParams {
  return new URLSearchParams({
    ids: ids.join(','),
    ...(referenceId === undefined ? {} : { reference: referenceId }),
    ...(showsAll ? { all: '1' } : {}),
  });
}
