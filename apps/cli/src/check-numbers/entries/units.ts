import { percentOfRange, spacingUnits, speedUnits } from '@proofplate/physics';
import type { FormulaEntry } from '../formula-entry';

export const UNITS: readonly FormulaEntry[] = [
  {
    formula: 'from minimum: lo+p/100*(hi-lo); from zero: p/100*hi (declare which)',
    evaluate: (inputs) => {
      const { fromMinimum, fromZero } = percentOfRange({
        low: inputs.number('lo'),
        high: inputs.number('hi'),
        percent: inputs.number('percent'),
      });
      return { from_min: fromMinimum, from_zero: fromZero };
    },
  },
  {
    formula: 'h_in=h/25.4; lines per inch=25.4/h; lines per cm=10/h; lines per mm=1/h',
    evaluate: (inputs) => {
      const { inch, linesPerInch, linesPerCm, linesPerMm } = spacingUnits(inputs.number('h_mm'));
      return { h_inch: inch, lines_per_inch: linesPerInch, lines_per_cm: linesPerCm, lines_per_mm: linesPerMm };
    },
  },
  {
    formula: 'mm/s to m/min (x0.06), in/s (/25.4), mm/min (x60)',
    evaluate: (inputs) => {
      const { metresPerMinute, inchesPerSecond, millimetresPerMinute } = speedUnits(inputs.number('v_mm_s'));
      return { m_min: metresPerMinute, in_s: inchesPerSecond, mm_min: millimetresPerMinute };
    },
  },
];
