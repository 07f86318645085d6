import type { Fill, PanelUnit } from '@proofplate/physics';
import type { Assist, StepPurpose } from './lists';
import type { ParameterKey } from './parameters';

/** Exactly what the person typed in the panel's unit; this is what is signed, and it is never recomputed. */
export type EnteredValue = { value: number; unit: PanelUnit };

/** A typed value beside the physical one, which is in the parameter's own unit. */
export type SetValue = { entered: EnteredValue; physical: number };

export type ParameterValues = Partial<Record<ParameterKey, SetValue>>;

/** Watts at the work, with where they come from; absent with the reason, never zero instead. */
export type WorkPower = { watts: number; basis: 'calibration' | 'not calibrated' } | { watts: null; reason: string };

/** Delays of the scan head in microseconds. */
export type DelaysUs = { laserOn?: number; laserOff?: number; jump?: number; corner?: number };

export type ParameterSet = {
  values: ParameterValues;
  fill: Fill;
  assist: Assist;
  delaysUs?: DelaysUs;
  power: WorkPower;
};

export type MarkStep = { purpose: StepPurpose; parameters: ParameterSet; pauseAfterS: number };

export type SetUpStep = { text: string; caution?: string; photoId?: string; mustTick: boolean };
