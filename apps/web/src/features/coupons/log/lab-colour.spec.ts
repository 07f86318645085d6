import { labColour } from './lab-colour';

describe('a measured colour on the screen', () => {
  // sRGB primaries and greys in CIELAB under D65, as tabulated for IEC 61966-2-1
  it.each([
    [{ l: 100, a: 0, b: 0 }, '#ffffff'],
    [{ l: 0, a: 0, b: 0 }, '#000000'],
    [{ l: 53.585, a: 0, b: 0 }, '#808080'],
    [{ l: 53.2408, a: 80.0925, b: 67.2032 }, '#ff0000'],
    [{ l: 87.7347, a: -86.1827, b: 83.1793 }, '#00ff00'],
    [{ l: 32.297, a: 79.1875, b: -107.8602 }, '#0000ff'],
  ])('%j is %s', (lab, colour) => {
    expect(labColour(lab)).toBe(colour);
  });

  it('stays within the screen’s range', () => {
    expect(labColour({ l: 60, a: 120, b: -120 })).toMatch(/^#[0-9a-f]{6}$/);
  });
});
