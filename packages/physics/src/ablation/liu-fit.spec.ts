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

  it('refuses craters that shrink, four points and an energy of zero', () => {
    expect(() => liuFit([1, 2, 3, 4, 5], [9, 8, 7, 6, 5])).toThrow('the craters must grow with the pulse energy');
    expect(() => liuFit([1, 2, 3, 4], [1, 2, 3, 4])).toThrow('pulseEnergiesUj must have at least 5 values, but has 4');
    expect(() => liuFit([0, 2, 3, 4, 5], [1, 2, 3, 4, 5])).toThrow('pulseEnergiesUj[0] must be a finite number above 0, but is 0');
  });
});
