import { addressWith, choiceFromAddress, filtersFromAddress, filterToDrop, withoutFilters } from './coupon-filters';

describe('filters of the coupons in the address', () => {
  const search = new URLSearchParams('state=marked&material=m-1&q=blue&keep=1');

  it('are read as the api asks for them', () => {
    expect(filtersFromAddress(search)).toEqual({
      state: 'marked',
      materialId: 'm-1',
      effectId: undefined,
      machineId: undefined,
      q: 'blue',
    });
  });

  it('hold one value each, the one that was chosen last, and leave the rest of the address alone', () => {
    expect(addressWith(search, { state: ['marked', 'sealed'], material: [] }).toString()).toBe('state=sealed&q=blue&keep=1');
    expect(withoutFilters(search).toString()).toBe('keep=1');
    expect(choiceFromAddress(search)).toEqual({ state: ['marked'], material: ['m-1'], effect: [], machine: [] });
  });

  it('name the filter to drop that brings back the most', () => {
    const values = (...counts: number[]) => counts.map((count, index) => ({ value: `v${index}`, label: `Value ${index}`, count }));
    const facets = [
      { key: 'state', title: 'State', values: values(0, 2) },
      { key: 'material', title: 'Material', values: values(0, 3, 4) },
    ];
    expect(filterToDrop(facets, { state: ['v0'], material: ['v0'] })).toEqual({ key: 'material', label: 'Value 0', yields: 7 });
    expect(filterToDrop(facets, {})).toBeUndefined();
  });
});
