import { isAtLeastAsStrict, isAtLeastAsWide, scopeAsStored } from './caution-scope';

describe('isAtLeastAsWide', () => {
  it('holds when a list grows, a condition goes, or nothing changes', () => {
    expect(isAtLeastAsWide({ families: ['pvc'] }, { families: ['abs', 'pvc'] })).toBe(true);
    expect(isAtLeastAsWide({ families: ['pvc'], effectKeys: ['ablate'] }, { families: ['pvc'] })).toBe(true);
    expect(isAtLeastAsWide({ roundPart: true }, {})).toBe(true);
    expect(isAtLeastAsWide({ families: ['pvc'], roundPart: true }, { families: ['pvc'], roundPart: true })).toBe(true);
  });

  it('fails when a list shrinks, is exchanged, or a condition is added', () => {
    expect(isAtLeastAsWide({ families: ['pvc', 'abs'] }, { families: ['pvc'] })).toBe(false);
    expect(isAtLeastAsWide({ families: ['pvc'] }, { families: ['abs', 'wood'] })).toBe(false);
    expect(isAtLeastAsWide({}, { sourceKinds: ['co2'] })).toBe(false);
    expect(isAtLeastAsWide({ families: ['pvc'] }, { families: ['pvc'], roundPart: true })).toBe(false);
  });
});

describe('isAtLeastAsStrict', () => {
  it('lets care become never and not the other way round', () => {
    expect(isAtLeastAsStrict('care', 'never')).toBe(true);
    expect(isAtLeastAsStrict('care', 'care')).toBe(true);
    expect(isAtLeastAsStrict('never', 'never')).toBe(true);
    expect(isAtLeastAsStrict('never', 'care')).toBe(false);
  });
});

describe('scopeAsStored', () => {
  it('takes an empty list and a false for no condition', () => {
    expect(scopeAsStored({ families: [], effectKeys: ['frost'], roundPart: false })).toStrictEqual({ effectKeys: ['frost'] });
  });
});
