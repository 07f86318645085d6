import { encodeSrgb, type Lab, labToLinearRgb, linearRgbToLab, luminanceOf } from './colour';

describe('colour of a photograph', () => {
  it.each<[string, Lab, [number, number, number]]>([
    ['white', [100, 0, 0], [255, 255, 255]],
    ['a skin-like brown', [64.203, 9.47, 14.68], [182, 149, 130]],
    ['a dark grey', [22.16, 0, 0], [53, 53, 53]],
  ])('turns %s into its sRGB code values', (_, lab, codes) => {
    labToLinearRgb(lab).forEach((value, channel) => {
      expect(Math.abs(encodeSrgb(value) - (codes[channel] ?? -1))).toBeLessThanOrEqual(1);
    });
  });

  it('comes back from linear light to the same L*a*b*', () => {
    for (const lab of [
      [75, 0.2, 2.6],
      [30, 3, -26],
      [21, 0, -1.2],
      [45, 22, 12],
    ] as const) {
      linearRgbToLab(labToLinearRgb(lab)).forEach((value, axis) => {
        expect(value).toBeCloseTo(lab[axis] ?? Number.NaN, 2);
      });
    }
  });

  it('calls a lightness of 50 a luminance of 18.4 percent', () => {
    expect(luminanceOf(50)).toBeCloseTo(0.1842, 4);
  });
});
