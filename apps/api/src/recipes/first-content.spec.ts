import { firstContent, firstSetUpStep, purposeOf } from './first-content';

describe('firstSetUpStep()', () => {
  it('names lens, glass, extraction and focus, as far as they are known', () => {
    const text = (workingDistanceMm: number | null, focusMethod: string) =>
      firstSetUpStep({ lensName: 'F160', workingDistanceMm, focusMethod }).text;
    expect(text(182.4, 'two red dots meet')).toBe(
      'Lens F160 fitted, protective glass clean, extraction on, focus at 182.4 mm, two red dots meet.',
    );
    expect(text(182.4, '')).toBe('Lens F160 fitted, protective glass clean, extraction on, focus at 182.4 mm.');
    expect(text(null, 'by gauge block')).toBe('Lens F160 fitted, protective glass clean, extraction on, focus found: by gauge block.');
  });
});

describe('firstContent()', () => {
  it('covers filled areas, as the cells of a coupon are, unless the scope says otherwise', () => {
    const focus = { lensName: 'F160', workingDistanceMm: null, focusMethod: '' };
    expect(firstContent([], focus).scope).toEqual({ featureKind: 'filled-area' });
    expect(firstContent([], focus, { featureKind: 'code' }).scope).toEqual({ featureKind: 'code' });
  });
});

it('the purpose of a single step follows from the effect, or is a fill', () => {
  expect(['dark-anneal', 'deep-engrave', 'own-effect'].map(purposeOf)).toEqual(['anneal', 'engrave', 'fill']);
});
