import { couponLayout, type RectMm } from './coupon-layout';
import { couponMarks } from './coupon-marks';

const layout = couponLayout({ rows: 3, columns: 6, reference: 'C-0042' });
const checkered = Array.from({ length: 12 }, (_, row) => Array.from({ length: 12 }, (_, column) => (row + column) % 2 === 0));
const area = (rects: readonly RectMm[]) => rects.reduce((sum, rect) => sum + rect.widthMm * rect.heightMm, 0);
const marksOf = (polarity: 'dark on bright' | 'bright on dark') =>
  couponMarks({ layout, code: 'C-0042', dataMatrixModules: checkered, polarity });

describe('couponMarks', () => {
  it('burns either the dark modules or all the rest of the place, never both', () => {
    const dark = marksOf('dark on bright');
    const bright = marksOf('bright on dark');
    expect(area(dark.dataMatrix) + area(bright.dataMatrix)).toBeCloseTo(9.6 * 9.6, 2);
    for (const corner of [0, 1, 2, 3]) {
      expect(area(dark.cornerMarks[corner]) + area(bright.cornerMarks[corner])).toBeCloseTo(9.6 * 9.6, 2);
    }
    expect(area(dark.dataMatrix)).toBeCloseTo(72 * (9.6 / 14) ** 2, 2);
  });

  it('keeps a bare quiet zone around dark marks', () => {
    const [first] = marksOf('dark on bright').cornerMarks;
    expect(Math.min(...first.map((rect) => rect.xMm))).toBe(layout.fiducials[0].rect.xMm);
    expect(Math.max(...first.map((rect) => rect.yMm + rect.heightMm))).toBeCloseTo(layout.fiducials[0].rect.yMm + 7.2, 4);
  });

  it('shrinks a long code until it fits its place', () => {
    const { codePlace } = layout;
    const points = couponMarks({
      layout,
      code: 'C-0042-LONG-CODE-12',
      dataMatrixModules: checkered,
      polarity: 'dark on bright',
    }).code.flat();
    for (const point of points) {
      expect(point.xMm).toBeGreaterThanOrEqual(codePlace.xMm);
      expect(point.xMm).toBeLessThanOrEqual(codePlace.xMm + codePlace.widthMm + 1e-4);
      expect(point.yMm).toBeGreaterThanOrEqual(codePlace.yMm);
      expect(point.yMm).toBeLessThanOrEqual(codePlace.yMm + codePlace.heightMm + 1e-4);
    }
  });

  it.each([[[]], [[[true]]], [[...checkered, [true]]], [checkered.map((row) => row.slice(1))]])(
    'refuses a Data Matrix that is not square',
    (modules) => {
      expect(() => couponMarks({ layout, code: 'C-0042', dataMatrixModules: modules, polarity: 'dark on bright' })).toThrow(
        /dataMatrixModules/,
      );
    },
  );
});
