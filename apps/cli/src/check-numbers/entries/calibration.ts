import { pchipSlopes, pchipValue, percentForPower, powerAtPercent, powerCalibration } from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';
import type { Inputs } from '../inputs';

export const CALIBRATION: readonly FormulaEntry[] = [
  {
    formula:
      'PCHIP: interior slope = weighted harmonic mean of the two secants (w1=2h_i+h_{i-1}, w2=h_i+2h_{i-1}; 0 if signs differ), end slopes by the 3-point shape-preserving rule; Fritsch & Butland 1984 / Fritsch & Carlson 1980; same as SciPy PchipInterpolator',
    evaluate: (inputs) => (inputs.has('x') ? curve(inputs) : calibration(inputs)),
  },
];

function curve(inputs: Inputs) {
  const x = inputs.numbers('x');
  const y = inputs.numbers('y');
  const slopes = pchipSlopes(x, y);
  return { y: inputs.numbers('query').map((position) => pchipValue({ x, y, slopes }, position)), slopes };
}

function calibration(inputs: Inputs) {
  const watts = inputs.numbers('watts');
  const percent = inputs.numbers('percent');
  if (watts.length !== percent.length)
    throw new RangeError(`watts must have as many points as percent (${percent.length}), but has ${watts.length}`);
  const measured = powerCalibration(percent.map((value, index) => ({ percent: value, powerW: watts[index] ?? Number.NaN })));
  return {
    watts: inputs.numbers('query_percent').map((value) => powerAtPercent(measured, value)),
    percent_for_watts: inputs.numbers('query_watts').map((value) => percentForPower(measured, value)),
    slopes_W_per_percent: measured.slopesWPerPercent,
  };
}
