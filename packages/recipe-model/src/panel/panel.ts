import type { PanelUnit } from '@proofplate/physics';
import type { ParameterKey } from '../vocabulary/parameters';

/** One field of a machine's own control. Limits, step and choices are in the panel's unit, the range is in the parameter's physical unit. */
export type PanelField = {
  parameter: ParameterKey;
  label: string;
  unit: PanelUnit;
  minimum?: number;
  maximum?: number;
  /** The smallest change that the field shows, counted from zero. */
  step?: number;
  /** The only values that the field offers, where it is a list. */
  choices?: number[];
  /** Ends of the physical range that a percent is a share of; for watts rangeHigh is the power at 100 %. */
  rangeLow?: number;
  rangeHigh?: number;
};

/** The fields in the order of the panel. */
export type Panel = { fields: PanelField[] };
