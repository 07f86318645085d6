import { ablationPerPulse, incubationFit, incubationThreshold, liuFit, optimumFluence } from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

export const ABLATION: readonly FormulaEntry[] = [
  {
    formula:
      'D^2=2*w0^2*ln(E/Eth) (=2*w0^2*ln(F0/Fth)); regress D^2 on ln E: w0=sqrt(slope/2); Eth=exp(-intercept/slope); Fth=2*Eth/(pi*w0^2)',
    evaluate: (inputs) => {
      const fit = liuFit(inputs.numbers('E_uJ'), inputs.numbers('D_um'));
      return {
        w0_um: fit.spotRadiusUm,
        Eth_uJ: fit.thresholdEnergyUj,
        Fth_peak_J_cm2: fit.thresholdPeakFluenceJPerCm2,
        slope_um2: fit.slopeUm2,
        intercept_um2: fit.interceptUm2,
        r2: fit.rSquared,
        se_slope_um2: fit.slopeStandardErrorUm2,
      };
    },
  },
  { formula: 'Fth(N)=Fth(1)*N^(S-1)', evaluate: (inputs) => thresholds(inputs, 0) },
  { formula: 'Fth(N)=Finf+(F1-Finf)*N^(S-1)', evaluate: (inputs) => thresholds(inputs, inputs.number('Finf_J_cm2')) },
  {
    formula: 'ln F = ln F1 + (S-1) ln N',
    evaluate: (inputs) => {
      const { incubationCoefficient, singlePulseThresholdJPerCm2 } = incubationFit(inputs.numbers('N'), inputs.numbers('F_J_cm2'));
      return { S: incubationCoefficient, F1_J_cm2: singlePulseThresholdJPerCm2 };
    },
  },
  {
    formula:
      'z=delta*ln(F0/Fth); D=w0*sqrt(2 ln(F0/Fth)); V=(pi/4)*w0^2*delta*ln^2(F0/Fth); E=pi*w0^2*F0/2; V/E=delta*ln^2(F0/Fth)/(2 F0); below threshold all zero',
    evaluate: (inputs) => {
      const removed = ablationPerPulse({
        peakFluenceJPerCm2: inputs.number('F0_peak_J_cm2'),
        thresholdJPerCm2: inputs.number('Fth_J_cm2'),
        penetrationDepthNm: inputs.number('delta_nm'),
        spotRadiusUm: inputs.number('w0_um'),
      });
      return {
        depth_nm: removed.depthNm,
        crater_diameter_um: removed.craterDiameterUm,
        volume_um3: removed.volumeUm3,
        pulse_energy_uJ: removed.pulseEnergyUj,
        volume_per_energy_um3_uJ: removed.volumePerEnergyUm3PerUj,
      };
    },
  },
  {
    formula:
      'Fopt=e^2*Fth=7.389056*Fth; depth there=2*delta; (V/E)max=2*delta/(e^2*Fth)=0.2706706*delta/Fth; as a rate (mm^3/min)/W multiply um^3/uJ by 0.06; flat-top: e*Fth and delta/(e*Fth)',
    evaluate: (inputs) => {
      const best = optimumFluence(inputs.number('Fth_J_cm2'), inputs.number('delta_nm'));
      return {
        F_opt_J_cm2: best.peakFluenceJPerCm2,
        depth_at_opt_nm: best.depthNm,
        max_um3_per_uJ: best.volumePerEnergyUm3PerUj,
        max_mm3_min_W: best.removalRateMm3PerMinW,
        flat_top_F_opt_J_cm2: best.flatTopFluenceJPerCm2,
      };
    },
  },
];

function thresholds(inputs: Inputs, saturatedThresholdJPerCm2: number) {
  const incubation = {
    singlePulseThresholdJPerCm2: inputs.number('F1_J_cm2'),
    incubationCoefficient: inputs.number('S'),
    saturatedThresholdJPerCm2,
  };
  return { Fth_J_cm2: inputs.numbers('N').map((pulses) => incubationThreshold(incubation, pulses)) };
}
