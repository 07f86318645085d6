import { ABLATION } from './entries/ablation';
import { BEAM } from './entries/beam';
import { CALIBRATION } from './entries/calibration';
import { CAUSTIC } from './entries/caustic';
import { COLOUR } from './entries/colour';
import { MARK_QUALITY } from './entries/mark-quality';
import { PULSES } from './entries/pulses';
import { ROUND_PARTS } from './entries/round-parts';
import { SCANNING } from './entries/scanning';
import { THERMAL } from './entries/thermal';
import { TRANSFER } from './entries/transfer';
import { UNITS } from './entries/units';
import type { FormulaEntry } from './formula-entry';

/** Every formula that the packages can be checked against. */
export const FORMULAS: readonly FormulaEntry[] = [
  ...BEAM,
  ...CAUSTIC,
  ...PULSES,
  ...SCANNING,
  ...ABLATION,
  ...THERMAL,
  ...ROUND_PARTS,
  ...TRANSFER,
  ...CALIBRATION,
  ...UNITS,
  ...COLOUR,
  ...MARK_QUALITY,
];
