import type { Fill } from '@proofplate/physics';
import type { Entry, EntryContext } from '../panel/enter-value';
import { neededKeys } from '../panel/needed-keys';
import type { Panel, PanelField } from '../panel/panel';
import { type MeasuredCalibration, workPower } from '../power/work-power';
import { PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { DelaysUs, ParameterValues } from '../vocabulary/setting';
import type { NumberedSetting } from './mark-of-setting';

export type TypedMachine = {
  readonly panel: Panel;
  readonly physical: PhysicalProfile;
  /** The calibration that the watts are read from; absent: not calibrated. */
  readonly calibration?: MeasuredCalibration;
};

export type TypedStep = {
  readonly fill: Fill;
  readonly delaysUs?: DelaysUs;
  /** What stands in a field of the panel; undefined: nothing is typed there. */
  readonly read: (field: PanelField, context: EntryContext) => Entry | undefined;
  /** Values that stand on no field of this panel. */
  readonly beside?: ParameterValues;
};

/**
 * A setting as it is being typed. What cannot be read, and what is still missing, is carried as a reason, so that every number that
 * rests on it says why it is not known.
 *
 * @param machine  panel, source and calibration
 * @param step     fill, and how each field of the panel reads
 * @returns the setting for settingNumbers()
 */
export function typedSetting(machine: TypedMachine, { fill, delaysUs, read, beside = {} }: TypedStep): NumberedSetting {
  const { panel, physical, calibration } = machine;
  const values: ParameterValues = { ...beside };
  const unknownBecause: Partial<Record<ParameterKey, string>> = {};
  const needed = neededKeys(machine, fill);
  for (const field of speedFirst(panel)) {
    const { parameter } = field;
    const speedMmPerS = values.speedMmPerS?.physical;
    const entry = read(field, speedMmPerS === undefined ? {} : { speedMmPerS });
    if (entry?.kind === 'accepted') values[parameter] = entry.value;
    else if (entry !== undefined) unknownBecause[parameter] = entry.message;
    else if (needed.includes(parameter)) unknownBecause[parameter] = `no ${PARAMETERS[parameter].label.toLowerCase()} is set`;
  }
  const unread = unknownBecause.frequencyKhz ?? unknownBecause.pulseWidthNs;
  const power = workPower({ profile: physical, parameters: values, ...(calibration === undefined ? {} : { calibration }) });
  // the watts rest on frequency and pulse width too: without them they would be those of another setting
  const reason = unknownBecause.powerPercent ?? unread;
  return {
    values,
    fill,
    ...(delaysUs === undefined ? {} : { delaysUs }),
    power: reason === undefined ? power : { watts: null, reason },
    unknownBecause,
  };
}

/** Pulses per inch need the speed. */
function speedFirst({ fields }: Panel): PanelField[] {
  return [...fields].sort((one, other) => Number(other.parameter === 'speedMmPerS') - Number(one.parameter === 'speedMmPerS'));
}
