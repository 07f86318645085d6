import type { Facet, FacetChoice } from '../../components/facets';
import type { RecipeFacets, RecipeFilters } from './recipes.api';
import { recipeStateWord } from './revision-words';

/** Names of the filters in the address, and what the api calls them. */
const FILTERS = [
  { key: 'state', query: 'state', title: 'State' },
  { key: 'material', query: 'materialId', title: 'Material' },
  { key: 'effect', query: 'effectId', title: 'Effect' },
  { key: 'machine', query: 'machineId', title: 'Machine' },
] as const;

type FilterKey = (typeof FILTERS)[number]['key'];

export function filtersFromAddress(search: URLSearchParams): RecipeFilters {
  const read = (name: string) => search.get(name) ?? undefined;
  return {
    ...Object.fromEntries(FILTERS.map(({ key, query }) => [query, read(key)])),
    q: read('q'),
  };
}

export function choiceFromAddress(search: URLSearchParams): FacetChoice {
  return Object.fromEntries(FILTERS.map(({ key }) => [key, search.getAll(key).slice(0, 1)]));
}

/** The address with other choices: one value for each filter, the one that was chosen last. */
export function addressWith(search: URLSearchParams, chosen: FacetChoice): URLSearchParams {
  const next = new URLSearchParams(search);
  for (const { key } of FILTERS) {
    const value = chosen[key]?.at(-1);
    if (value === undefined) next.delete(key);
    else next.set(key, value);
  }
  return next;
}

export function withoutFilters(search: URLSearchParams): URLSearchParams {
  const next = new URLSearchParams(search);
  for (const { key } of FILTERS) next.delete(key);
  next.delete('q');
  return next;
}

export function facetsOf(facets: RecipeFacets): readonly Facet[] {
  const values: Record<FilterKey, RecipeFacets['states']> = {
    state: facets.states,
    material: facets.materials,
    effect: facets.effects,
    machine: facets.machines,
  };
  return FILTERS.map(({ key, title }) => ({
    key,
    title,
    values: key === 'state' ? values.state.map((value) => ({ ...value, label: stateLabel(value.value, value.label) })) : values[key],
  })).filter((facet) => facet.values.length > 0);
}

function stateLabel(value: string, fallback: string): string {
  const states = ['approved', 'due', 'scheduled', 'in_review', 'draft', 'returned', 'withdrawn'] as const;
  const state = states.find((own) => own === value);
  return state === undefined ? fallback : recipeStateWord(state);
}

export type FilterToDrop = { key: string; label: string; yields: number };

/**
 * The filter whose removal brings back the most. Every count of a filter leaves out its own choice and a recipe has one value of each,
 * so that the sum of a filter's counts is what is left without it.
 */
export function filterToDrop(facets: readonly Facet[], chosen: FacetChoice): FilterToDrop | undefined {
  const active = facets.flatMap(({ key, values }) => {
    const value = chosen[key]?.[0];
    if (value === undefined) return [];
    const label = values.find((own) => own.value === value)?.label ?? value;
    return [{ key, label, yields: values.reduce((sum, { count }) => sum + count, 0) }];
  });
  return active.filter(({ yields }) => yields > 0).sort((one, other) => other.yields - one.yields)[0];
}

export function countChosen(chosen: FacetChoice): number {
  return Object.values(chosen).reduce((sum, values) => sum + values.length, 0);
}
