import { expectReferences } from '../../test/expect-reference';
import { ablationPerPulse } from './ablation-per-pulse';
import { optimumFluence } from './optimum-fluence';

type Numbers = Readonly<Record<string, number>>;

const pulse = { peakFluenceJPerCm2: 1, thresholdJPerCm2: 0.16, penetrationDepthNm: 18, spotRadiusUm: 15 };

describe('ablationPerPulse', () => {
  expectReferences<Numbers>('depth, crater and volume per pulse', (inputs) => {
    const removed = ablationPerPulse({
      peakFluenceJPerCm2: inputs.F0_peak_J_cm2,
      thresholdJPerCm2: inputs.Fth_J_cm2,
      penetrationDepthNm: inputs.delta_nm,
      spotRadiusUm: inputs.w0_um,
    });
    return {
      depth_nm: removed.depthNm,
      crater_diameter_um: removed.craterDiameterUm,
      volume_um3: removed.volumeUm3,
      pulse_energy_uJ: removed.pulseEnergyUj,
      volume_per_energy_um3_uJ: removed.volumePerEnergyUm3PerUj,
    };
  });

  it('removes nothing at the threshold', () => {
    expect(ablationPerPulse({ ...pulse, peakFluenceJPerCm2: 0.16 })).toMatchObject({ depthNm: 0, craterDiameterUm: 0, volumeUm3: 0 });
  });

  it('refuses a threshold of zero', () => {
    expect(() => ablationPerPulse({ ...pulse, thresholdJPerCm2: 0 })).toThrow('thresholdJPerCm2 must be a finite number above 0, but is 0');
  });
});

describe('optimumFluence', () => {
  expectReferences<Numbers>('optimum peak fluence for removed volume per energy', ({ Fth_J_cm2, delta_nm }) => {
    const best = optimumFluence(Fth_J_cm2, delta_nm);
    return {
      F_opt_J_cm2: best.peakFluenceJPerCm2,
      depth_at_opt_nm: best.depthNm,
      max_um3_per_uJ: best.volumePerEnergyUm3PerUj,
      max_mm3_min_W: best.removalRateMm3PerMinW,
      flat_top_F_opt_J_cm2: best.flatTopFluenceJPerCm2,
    };
  });

  it('is a maximum: fluences to either side remove less for their energy', () => {
    const best = optimumFluence(0.16, 18);
    const rate = (factor: number) =>
      ablationPerPulse({ ...pulse, peakFluenceJPerCm2: factor * best.peakFluenceJPerCm2 }).volumePerEnergyUm3PerUj;
    expect(rate(1)).toBeCloseTo(best.volumePerEnergyUm3PerUj, 12);
    expect(rate(0.9)).toBeLessThan(rate(1));
    expect(rate(1.1)).toBeLessThan(rate(1));
  });

  it('refuses a negative depth', () => {
    expect(() => optimumFluence(0.16, -18)).toThrow('penetrationDepthNm must be a finite number above 0, but is -18');
  });
});
