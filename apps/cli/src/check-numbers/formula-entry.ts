import type { Inputs } from './inputs';
import type { JsonObject } from './number-record';

/** Maps the keys of a formula's records to functions of the packages and back. */
export type FormulaEntry = {
  /** Written exactly as in the records. */
  readonly formula: string;
  readonly evaluate: (inputs: Inputs) => JsonObject;
};
