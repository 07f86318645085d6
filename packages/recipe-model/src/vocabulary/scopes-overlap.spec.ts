import fc from 'fast-check';
import { rangesOverlap, scopesOverlap } from './scopes-overlap';

describe('scopesOverlap', () => {
  it('takes what is left open as everything', () => {
    expect(scopesOverlap({}, {})).toBe(true);
    expect(scopesOverlap({}, { thicknessMm: { from: 1, to: 2 }, featureKind: 'code' })).toBe(true);
  });

  it('is kept apart by one statement', () => {
    expect(scopesOverlap({ featureKind: 'code' }, { featureKind: 'filled-area' })).toBe(false);
    expect(scopesOverlap({ thicknessMm: { to: 1 } }, { thicknessMm: { from: 1.5 } })).toBe(false);
    expect(scopesOverlap({ partDiameterMm: { from: 10, to: 20 } }, { partDiameterMm: { from: 20.5 } })).toBe(false);
    expect(scopesOverlap({ featureSizeMm: { to: 2 } }, { featureSizeMm: { from: 3 } })).toBe(false);
    expect(scopesOverlap({ customerSpecification: 'S-12' }, {})).toBe(false);
  });

  it('counts the ends of ranges as inside', () => {
    expect(scopesOverlap({ thicknessMm: { from: 1, to: 2 } }, { thicknessMm: { from: 2, to: 3 } })).toBe(true);
  });
});

describe('rangesOverlap', () => {
  it('agrees with a search for a common value, either way round', () => {
    const range = fc.tuple(fc.nat(20), fc.nat(20)).map(([a, b]) => ({ from: Math.min(a, b), to: Math.max(a, b) }));
    fc.assert(
      fc.property(range, range, (a, b) => {
        const common = Array.from({ length: 21 }, (_, value) => value).some(
          (value) => value >= a.from && value <= a.to && value >= b.from && value <= b.to,
        );
        expect(rangesOverlap(a, b)).toBe(common);
        expect(rangesOverlap(b, a)).toBe(common);
      }),
    );
  });
});
