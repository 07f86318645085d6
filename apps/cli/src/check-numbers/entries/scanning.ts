import {
  arealDose,
  areaRate,
  coverageRipple,
  type Fill,
  filledRectangleTime,
  interactionTime,
  lineCount,
  lineEnergy,
  lineOverlap,
  pulseOverlap,
  pulsePitch,
  pulsesPerSpot,
  pulsesPerSpotArea,
  runIn,
  scansPerSpot,
} from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

const UM_PER_MM = 1000;
const CM2_PER_MM2 = 0.01;

export const SCANNING: readonly FormulaEntry[] = [
  {
    formula: 'pitch=v/f; PO=1-v/(f*d); N=d*f/v; LO=1-h/d; Nscan=d/h; Narea=n*pi*d^2*f/(4*v*h); P/v; dose=n*P/(v*h); t=d/v; rate=v*h',
    evaluate: scanNumbers,
  },
  {
    formula: 'profile sum_k exp(-2(y-k*h)^2/w^2), w=d/2; contrast=(max-min)/(max+min) ~ 2*exp(-pi^2*w^2/(2*h^2))',
    evaluate: (inputs) => {
      const { contrast, maxOverMean, minOverMean } = coverageRipple(inputs.number('d_um'), inputs.number('h_um'));
      return { contrast, max_over_mean: maxOverMean, min_over_mean: minOverMean };
    },
  },
  {
    formula:
      'n=floor(H/h+1e-9)+1 lines (both edges marked); uni: n*(W/v+t_line)+(n-1)*(sqrt(W^2+h^2)/v_j+t_jump); bi: n*(W/v+t_line)+(n-1)*(h/v_j+t_jump); crossed: bi(W,H)+bi(H,W)+t_between; p passes: p*T+(p-1)*t_between',
    evaluate: rectangleTimes,
  },
  {
    formula: 's=v^2/(2a); t=v/a each end (per line: 2s, 2t)',
    evaluate: (inputs) => {
      const { lengthMm, timeMs } = runIn(inputs.number('v_mm_s'), inputs.number('a_mm_s2'));
      return { run_in_mm: lengthMm, t_each_end_ms: timeMs };
    },
  },
];

function scanNumbers(inputs: Inputs) {
  const powerW = inputs.number('P_W');
  const frequencyKhz = inputs.number('f_kHz');
  const speedMmPerS = inputs.number('v_mm_s');
  const spotDiameterUm = inputs.number('d_um');
  const lineSpacingUm = inputs.number('h_um');
  const scans = inputs.number('passes');
  const areal_dose_J_mm2 = arealDose({ powerW, speedMmPerS, lineSpacingUm, scans });
  return {
    pitch_um: pulsePitch(speedMmPerS, frequencyKhz),
    pulse_overlap: pulseOverlap(speedMmPerS, frequencyKhz, spotDiameterUm),
    pulses_per_spot: pulsesPerSpot(speedMmPerS, frequencyKhz, spotDiameterUm),
    line_overlap: lineOverlap(lineSpacingUm, spotDiameterUm),
    scans_per_spot: scansPerSpot(lineSpacingUm, spotDiameterUm),
    pulses_per_spot_area: pulsesPerSpotArea({ spotDiameterUm, frequencyKhz, speedMmPerS, lineSpacingUm, scans }),
    line_energy_J_mm: lineEnergy(powerW, speedMmPerS),
    areal_dose_J_mm2,
    areal_dose_J_cm2: areal_dose_J_mm2 / CM2_PER_MM2,
    interaction_time_us: interactionTime(spotDiameterUm, speedMmPerS),
    area_rate_mm2_s: areaRate(speedMmPerS, lineSpacingUm),
  };
}

function rectangleTimes(inputs: Inputs) {
  const lineSpacingUm = inputs.number('h_mm') * UM_PER_MM;
  const rectangle = {
    widthMm: inputs.number('W_mm'),
    heightMm: inputs.number('H_mm'),
    lineSpacingUm,
    speedMmPerS: inputs.number('v_mm_s'),
    jumpSpeedMmPerS: inputs.number('v_jump_mm_s'),
    lineOverheadMs: inputs.number('t_line_ms'),
    jumpSettleMs: inputs.number('t_jump_ms'),
    pauseBetweenMs: inputs.number('t_between_ms'),
    passes: inputs.number('passes'),
  };
  const timeOf = (fill: Exclude<Fill, 'outline'>) => filledRectangleTime({ ...rectangle, fill });
  const both = timeOf('both directions');
  return {
    lines: lineCount(rectangle.heightMm, lineSpacingUm),
    lines_crossed_second: lineCount(rectangle.widthMm, lineSpacingUm),
    t_unidirectional_s: timeOf('one direction').totalS,
    t_bidirectional_s: both.totalS,
    t_crossed_s: timeOf('crossed').totalS,
    beam_on_bidirectional_s: both.beamOnS,
    duty_bidirectional: both.duty,
  };
}
