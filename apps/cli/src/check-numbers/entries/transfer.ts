import { continuousTransfer, doseTransfer, pulsedTransfer } from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

const KW_PER_CM2_PER_W_PER_MM2 = 0.1;

export const TRANSFER: readonly FormulaEntry[] = [
  {
    formula:
      'keep peak fluence, pulse overlap and line overlap: r=d2/d1; E2=E1*r^2; pitch2=pitch1*r; h2=h1*r (areal dose P/(v*h) is then kept by itself); feasible f2 in [f_min, min(f_max, P_max/E2, v_max/pitch2)] with E2<=E_max; choose the f2 nearest f1; P2=E2*f2; v2=pitch2*f2; otherwise no solution',
    evaluate: pulsed,
  },
  {
    formula: 'v2=n2*P2/(dose*h2)',
    evaluate: (inputs) => {
      const { arealDoseJPerMm2, speedMmPerS } = doseTransfer(
        {
          powerW: inputs.number('P1_W'),
          speedMmPerS: inputs.number('v1_mm_s'),
          lineSpacingUm: inputs.number('h1_um'),
          scans: inputs.number('passes1'),
        },
        { powerW: inputs.number('P2_W'), lineSpacingUm: inputs.number('h2_um'), scans: inputs.number('passes2') },
      );
      return { dose_J_mm2: arealDoseJPerMm2, v2_mm_s: speedMmPerS };
    },
  },
  {
    formula: 'r=d2/d1; P2=P1*r^2; v2=v1*r; h2=h1*r (dose kept)',
    evaluate: (inputs) => {
      const found = continuousTransfer(
        {
          powerW: inputs.number('P1_W'),
          speedMmPerS: inputs.number('v1_mm_s'),
          lineSpacingUm: inputs.number('h1_um'),
          spotDiameterUm: inputs.number('d1_um'),
        },
        inputs.number('d2_um'),
      );
      return {
        P2_W: found.powerW,
        v2_mm_s: found.speedMmPerS,
        h2_um: found.lineSpacingUm,
        irradiance_avg_kW_cm2: found.averageIrradianceWPerMm2 * KW_PER_CM2_PER_W_PER_MM2,
        interaction_time_us: found.interactionTimeUs,
        dose_J_mm2: found.arealDoseJPerMm2,
      };
    },
  },
];

function pulsed(inputs: Inputs) {
  const from = inputs.object('source');
  const to = inputs.object('target');
  const found = pulsedTransfer(
    {
      powerW: from.number('P_W'),
      frequencyKhz: from.number('f_kHz'),
      speedMmPerS: from.number('v_mm_s'),
      spotDiameterUm: from.number('d_um'),
      lineSpacingUm: from.number('h_um'),
    },
    {
      spotDiameterUm: to.number('d_um'),
      maxPowerW: to.number('P_max_W'),
      maxPulseEnergyMj: to.number('E_max_mJ'),
      minFrequencyKhz: to.number('f_min_kHz'),
      maxFrequencyKhz: to.number('f_max_kHz'),
      maxSpeedMmPerS: to.number('v_max_mm_s'),
    },
  );
  const kept = {
    ratio: found.spotRatio,
    pulse_energy_mJ: found.pulseEnergyMj,
    pitch_um: found.pitchUm,
    h_um: found.lineSpacingUm,
    peak_fluence_J_cm2: found.peakFluenceJPerCm2,
    areal_dose_J_mm2: found.arealDoseJPerMm2,
    f_low_kHz: found.lowestFrequencyKhz,
    f_high_kHz: found.highestFrequencyKhz,
    solvable: found.solvable,
  };
  if (!found.solvable) return { ...kept, reason: found.reason };
  return {
    ...kept,
    reason: '',
    f_kHz: found.frequencyKhz,
    P_W: found.powerW,
    v_mm_s: found.speedMmPerS,
    area_rate_mm2_s: found.areaRateMm2PerS,
    time_ratio: found.timeRatio,
  };
}
