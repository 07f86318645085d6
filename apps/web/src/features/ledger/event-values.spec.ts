import { changedValues } from './event-values';

describe('changedValues()', () => {
  it('shows what changed and leaves out what stayed', () => {
    const before = { name: 'Fibre 1', ratedPowerW: 20, panel: { fields: [{ unit: 'mm/s' }] } };
    const after = { name: 'Fibre 1', ratedPowerW: 30, panel: { fields: [{ unit: 'in/s' }] } };
    expect(changedValues(before, after)).toEqual([
      { path: 'rated power w', before: '20', after: '30' },
      { path: 'panel › fields › 1 › unit', before: 'mm/s', after: 'in/s' },
    ]);
  });

  it('tells added and removed values from empty ones', () => {
    expect(changedValues({ lot: '', isActive: true }, { lot: '7', tags: [], until: null })).toEqual([
      { path: 'lot', before: 'empty', after: '7' },
      { path: 'is active', before: 'yes', after: '—' },
      { path: 'tags', before: '—', after: 'none' },
    ]);
  });

  it('says stored codes, parameters and their units as the product says them', () => {
    const setting = { steps: [{ purpose: 'anneal', values: { speedMmPerS: { entered: { value: 800, unit: 'mm/s' }, physical: 800 } } }] };
    expect(changedValues({ state: 'in_review' }, { state: 'approved', isByAuthor: false, content: setting })).toEqual([
      { path: 'state', before: 'in review', after: 'approved' },
      { path: 'signed by its author', before: '—', after: 'no' },
      { path: 'setting › steps › 1 › purpose', before: '—', after: 'anneal' },
      { path: 'setting › steps › 1 › values › scan speed › as entered', before: '—', after: '800 mm/s' },
      { path: 'setting › steps › 1 › values › scan speed › at the work', before: '—', after: '800' },
    ]);
  });

  it('has nothing to show of an event without values', () => expect(changedValues(null, null)).toEqual([]));
});
