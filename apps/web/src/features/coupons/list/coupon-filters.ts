import type { Facet, FacetChoice } from '../../../components/facets';
import type { CouponFacets, CouponFilters } from '../coupons.api';

/** Names of the filters in the address, and what the api calls them. */
const FILTERS = [
  { key: 'state', query: 'state', title: 'State' },
  { key: 'material', query: 'materialId', title: 'Material' },
  { key: 'effect', query: 'effectId', title: 'Effect' },
  { key: 'machine', query: 'machineId', title: 'Machine' },
] as const;

export function filtersFromAddress(search: URLSearchParams): CouponFilters {
  const read = (name: string) => search.get(name) ?? undefined;
  return { ...Object.fromEntries(FILTERS.map(({ key, query }) => [query, read(key)])), q: read('q') };
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

export function addressWithWords(search: URLSearchParams, words: string): URLSearchParams {
  const next = new URLSearchParams(search);
  if (words === '') next.delete('q');
  else next.set('q', words);
  return next;
}

export function withoutFilters(search: URLSearchParams): URLSearchParams {
  return addressWithWords(addressWith(search, {}), '');
}

export function facetsOf({ states, materials, effects, machines }: CouponFacets): readonly Facet[] {
  const values = { state: states, material: materials, effect: effects, machine: machines };
  return FILTERS.map(({ key, title }) => ({ key, title, values: values[key] }));
}

export type FilterToDrop = { key: string; label: string; yields: number };

/** The filter whose removal brings back the most: a coupon has one value of each, and a filter's counts leave out its own choice. */
export function filterToDrop(facets: readonly Facet[], chosen: FacetChoice): FilterToDrop | undefined {
  const active = facets.flatMap(({ key, values }) => {
    const value = chosen[key]?.[0];
    if (value === undefined) return [];
    const label = values.find((own) => own.value === value)?.label ?? value;
    return [{ key, label, yields: values.reduce((sum, { count }) => sum + count, 0) }];
  });
  return active.filter(({ yields }) => yields > 0).sort((one, other) => other.yields - one.yields)[0];
}
