import { expectReference } from '../../test/expect-reference';
import { areaRate } from './area-rate';

describe('areaRate', () => {
  expectReference('scan numbers (pitch, overlaps, line energy, areal dose)', 'area_rate_mm2_s', ({ v_mm_s, h_um }) =>
    areaRate(v_mm_s, h_um),
  );

  it('doubles with the speed', () => {
    expect(areaRate(400, 25)).toBe(2 * areaRate(200, 25));
  });

  it('refuses a negative spacing', () => {
    expect(() => areaRate(200, -25)).toThrow('lineSpacingUm must be a finite number above 0, but is -25');
  });
});
