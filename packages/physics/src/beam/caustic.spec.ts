import { expectReferences } from '../../test/expect-reference';
import type { Caustic } from './caustic';
import { causticByParabola } from './caustic-by-parabola';
import { causticByWidths } from './caustic-by-widths';

type Inputs = { readonly z_mm: readonly number[]; readonly d_um: readonly number[]; readonly lambda_nm: number };

const measured = ({ z_mm, d_um, lambda_nm }: Inputs) => ({ positionsMm: z_mm, diametersUm: d_um, wavelengthNm: lambda_nm });
const keyed = (caustic: Caustic) => ({
  d0_um: caustic.waistDiameterUm,
  z0_mm: caustic.waistPositionMm,
  theta_full_mrad: caustic.fullDivergenceMrad,
  zR_mm: caustic.rayleighLengthMm,
  M2: caustic.m2,
});
const positionsMm = [-8, -6, -4, -2, -1, 0, 1, 2, 4, 6, 8];
const perfect = { positionsMm, diametersUm: positionsMm.map((z) => Math.hypot(60, ((4 * 1064) / (Math.PI * 60)) * z)), wavelengthNm: 1064 };

describe('causticByParabola', () => {
  expectReferences<Inputs>('M2 from a measured caustic, axis x, parabola in d^2 (unweighted)', (inputs) =>
    keyed(causticByParabola(measured(inputs))),
  );
  expectReferences<Inputs>('M2 from an exact synthetic caustic', (inputs) => keyed(causticByParabola(measured(inputs))));

  it('gives an M² of 1 for a perfect beam', () => {
    expect(causticByParabola(perfect).m2).toBeCloseTo(1, 9);
  });

  it('does not depend on where the axis begins', () => {
    const moved = { ...perfect, positionsMm: positionsMm.map((z) => z + 1000) };
    expect(causticByParabola(moved).waistPositionMm).toBeCloseTo(1000, 7);
    expect(causticByParabola(moved).waistDiameterUm).toBeCloseTo(60, 7);
  });

  it('refuses nine positions, widths that form no caustic, and an M² below 1', () => {
    const nine = { ...perfect, positionsMm: positionsMm.slice(2), diametersUm: perfect.diametersUm.slice(2) };
    expect(() => causticByParabola(nine)).toThrow('positionsMm must have at least 10 positions, but has 9');
    expect(() => causticByParabola({ ...perfect, diametersUm: positionsMm.map((z) => 100 - z ** 2) })).toThrow('form no caustic');
    expect(() => causticByParabola({ ...perfect, wavelengthNm: 2000 })).toThrow('the fitted M² must be at least 1');
    expect(() => causticByParabola({ ...perfect, diametersUm: positionsMm.map(() => -1) })).toThrow('diametersUm[0]');
  });
});

describe('causticByWidths', () => {
  expectReferences<Inputs>('M2 from a measured caustic, axis x, non-linear least squares in d', (inputs) =>
    keyed(causticByWidths(measured(inputs)).value),
  );
  expectReferences<Inputs>('M2 from an exact synthetic caustic', (inputs) => keyed(causticByWidths(measured(inputs)).value));

  it('settles within a few steps and says so', () => {
    const { converged, iterations } = causticByWidths(perfect);
    expect(converged).toBe(true);
    expect(iterations).toBeLessThan(20);
  });
});
