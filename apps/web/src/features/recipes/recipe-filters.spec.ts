import { addressWith, choiceFromAddress, filtersFromAddress, filterToDrop, withoutFilters } from './recipe-filters';

const facets = [
  { key: 'material', title: 'Material', values: [{ value: 'm1', label: 'brass', count: 0 }] },
  {
    key: 'machine',
    title: 'Machine',
    values: [
      { value: 'b1', label: 'Bench 1', count: 1 },
      { value: 'b2', label: 'Bench 2', count: 1 },
      { value: 'b3', label: 'Bench 3', count: 0 },
    ],
  },
];

describe('filters of the recipe list', () => {
  it('are read from the address under the names of the api', () => {
    expect(filtersFromAddress(new URLSearchParams('state=due&material=m1&q=316L'))).toEqual({
      state: 'due',
      materialId: 'm1',
      effectId: undefined,
      machineId: undefined,
      q: '316L',
    });
  });

  it('hold one value each: the one that was chosen last', () => {
    const next = addressWith(new URLSearchParams('machine=b1&q=brass'), { machine: ['b1', 'b2'] });
    expect(next.toString()).toBe('machine=b2&q=brass');
    expect(choiceFromAddress(next).machine).toEqual(['b2']);
  });

  it('are all cleared at once, the search too', () => {
    expect(withoutFilters(new URLSearchParams('machine=b1&q=brass&other=1')).toString()).toBe('other=1');
  });
});

describe('filterToDrop', () => {
  it('names the filter that brings back the most, with what is left without it', () => {
    expect(filterToDrop(facets, { material: ['m1'], machine: ['b3'] })).toEqual({ key: 'machine', label: 'Bench 3', yields: 2 });
  });

  it('names none when no single filter is to blame', () => {
    expect(filterToDrop(facets, { material: ['m1'] })).toBeUndefined();
  });
});
