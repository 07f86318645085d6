import { expectReferences } from '../../test/expect-reference';
import { liuFit } from './liu-fit';

type Inputs = { readonly E_uJ: readonly number[]; readonly D_um: readonly number[] };

describe('liuFit', () => {
  for (const name of ['Liu fit, exact synthetic data (w0=15 um, Eth=3 uJ)', 'Liu fit, data with scatter', 'Liu fit, data with scatter 2']) {
    expectReferences<Inputs>(name, ({ E_uJ, D_um }) => {
      const fit = liuFit(E_uJ, D_um);
      return {
        w0_um: fit.spotRadiusUm,
        Eth_uJ: fit.thresholdEnergyUj,
        Fth_peak_J_cm2: fit.thresholdPeakFluenceJPerCm2,
        slope_um2: fit.slopeUm2,
        intercept_um2: fit.interceptUm2,
        r2: fit.rSquared,
        se_slope_um2: fit.slopeStandardErrorUm2,
      };
    });
  }

  it('gives the standard errors that a nonlinear fit of the same craters gives', () => {
    const energiesUj = [4, 5, 6.5, 8, 10, 13, 18, 25];
    const diametersUm = [12.1, 17.4, 22, 25.3, 28.9, 32.2, 37.1, 41];
    const fit = liuFit(energiesUj, diametersUm);
    // a nonlinear fit by scipy 1.17: packages/physics/test/reference/liu-errors.py
    expect(fit.spotRadiusStandardErrorUm).toBeCloseTo(0.30607, 5);
    expect(fit.thresholdEnergyStandardErrorUj).toBeCloseTo(0.1209, 5);
    expect(fit.thresholdPeakFluenceStandardErrorJPerCm2).toBeCloseTo(0.00955, 5);
  });

  it('knows exact craters without any error', () => {
    const energiesUj = [4, 5, 6.5, 8, 10];
    const fit = liuFit(
      energiesUj,
      energiesUj.map((energyUj) => Math.sqrt(450 * Math.log(energyUj / 3))),
    );
    expect(fit.spotRadiusStandardErrorUm).toBeCloseTo(0, 9);
    expect(fit.thresholdEnergyStandardErrorUj).toBeCloseTo(0, 9);
    expect(fit.thresholdPeakFluenceStandardErrorJPerCm2).toBeCloseTo(0, 9);
  });

  it('refuses craters that shrink, four points and an energy of zero', () => {
    expect(() => liuFit([1, 2, 3, 4, 5], [9, 8, 7, 6, 5])).toThrow('the craters must grow with the pulse energy');
    expect(() => liuFit([1, 2, 3, 4], [1, 2, 3, 4])).toThrow('pulseEnergiesUj must have at least 5 values, but has 4');
    expect(() => liuFit([0, 2, 3, 4, 5], [1, 2, 3, 4, 5])).toThrow('pulseEnergiesUj[0] must be a finite number above 0, but is 0');
  });
});
