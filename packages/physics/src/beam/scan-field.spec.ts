import { expectReferences } from '../../test/expect-reference';
import { scanField } from './scan-field';

describe('scanField', () => {
  expectReferences<Readonly<Record<string, number>>>('f-theta field size', ({ f_mm, theta_max_optical_deg }) => {
    const { sideMm, diagonalLimitedSideMm, plainLensSideMm } = scanField(f_mm, theta_max_optical_deg);
    return { side_axis_mm: sideMm, side_diag_mm: diagonalLimitedSideMm, plain_lens_mm: plainLensSideMm };
  });

  it('reaches the same distance from the axis in the corner as the full field does on the axis', () => {
    const { sideMm, diagonalLimitedSideMm } = scanField(160, 20);
    expect(diagonalLimitedSideMm * Math.SQRT2).toBeCloseTo(sideMm, 12);
  });

  it('takes the optical angle: twice the turn of the mirror, which is what a lens for 163 mm and 110 mm states', () => {
    const mirrorAngleDeg = 19.333 / 2;
    expect(scanField(163, 2 * mirrorAngleDeg).sideMm).toBeCloseTo(110, 2);
  });

  it('refuses a right angle', () => {
    expect(() => scanField(160, 90)).toThrow('opticalAngleDeg must be below 90, but is 90');
  });
});
