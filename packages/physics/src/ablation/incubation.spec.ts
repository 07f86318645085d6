import { expectReferences } from '../../test/expect-reference';
import { incubationFit } from './incubation-fit';
import { incubationThreshold } from './incubation-threshold';

type Law = { readonly F1_J_cm2: number; readonly Finf_J_cm2?: number; readonly S: number; readonly N: readonly number[] };
type Measured = { readonly N: readonly number[]; readonly F_J_cm2: readonly number[] };

const steel = { singlePulseThresholdJPerCm2: 0.16, incubationCoefficient: 0.85, saturatedThresholdJPerCm2: 0 };
const thresholds = ({ F1_J_cm2, Finf_J_cm2 = 0, S, N }: Law) => ({
  Fth_J_cm2: N.map((pulses) =>
    incubationThreshold({ singlePulseThresholdJPerCm2: F1_J_cm2, incubationCoefficient: S, saturatedThresholdJPerCm2: Finf_J_cm2 }, pulses),
  ),
});

describe('incubationThreshold', () => {
  expectReferences<Law>('incubation threshold', thresholds);
  expectReferences<Law>('incubation threshold with saturation', thresholds);

  it('refuses half a pulse and a saturation above the first threshold', () => {
    expect(() => incubationThreshold(steel, 0.5)).toThrow('pulses must be a finite number of at least 1, but is 0.5');
    expect(() => incubationThreshold({ ...steel, saturatedThresholdJPerCm2: 1 }, 10)).toThrow(
      'saturatedThresholdJPerCm2 must be at most 0.16, but is 1',
    );
  });
});

describe('incubationFit', () => {
  expectReferences<Measured>('incubation fit by log-log regression', ({ N, F_J_cm2 }) => {
    const { incubationCoefficient, singlePulseThresholdJPerCm2 } = incubationFit(N, F_J_cm2);
    return { S: incubationCoefficient, F1_J_cm2: singlePulseThresholdJPerCm2 };
  });

  it('finds the law that made the thresholds', () => {
    const pulses = [1, 4, 30, 200];
    const fit = incubationFit(
      pulses,
      pulses.map((count) => incubationThreshold(steel, count)),
    );
    expect(fit.incubationCoefficient).toBeCloseTo(0.85, 12);
    expect(fit.singlePulseThresholdJPerCm2).toBeCloseTo(0.16, 12);
  });

  it('refuses a threshold of zero', () => {
    expect(() => incubationFit([1, 2, 3], [1, 0, 1])).toThrow('thresholdsJPerCm2[1] must be a finite number above 0, but is 0');
  });
});
