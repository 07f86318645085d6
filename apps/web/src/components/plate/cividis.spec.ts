import { cividis, cividisStops, inkOn, relativeLuminance } from './cividis';

describe('the colour map', () => {
  it('starts and ends at the published colours', () => {
    expect(cividis(0)).toBe('#00224e');
    expect(cividis(1)).toBe('#fee838');
  });

  it('stays at its ends outside 0 to 1', () => {
    expect(cividis(-3)).toBe(cividis(0));
    expect(cividis(7)).toBe(cividis(1));
  });

  it('grows lighter from tint to tint, so that it reads in grey and without red-green sight', () => {
    // Neighbours of the 256 may tie or dip by the rounding to 8 bits; sixty-four tints are finer than any legend.
    const lightness = cividisStops(64).map(relativeLuminance);
    expect(lightness.every((value, index) => index === 0 || value > (lightness[index - 1] ?? 1))).toBe(true);
  });

  it('carries digits with a contrast of at least 4.5 on every step', () => {
    const contrasts = cividisStops(256).map((ground) => contrast(ground, inkOn(ground)));
    expect(Math.min(...contrasts)).toBeGreaterThanOrEqual(4.5);
  });
});

function contrast(one: string, other: string): number {
  const [dark = 0, bright = 0] = [relativeLuminance(one), relativeLuminance(other)].sort((a, b) => a - b);
  return (bright + 0.05) / (dark + 0.05);
}
