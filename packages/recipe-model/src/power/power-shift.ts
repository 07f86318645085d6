import type { PhysicalProfile } from '../vocabulary/profile';
import type { MarkStep } from '../vocabulary/setting';
import { type MeasuredCalibration, workPower } from './work-power';

/** A table of a power meter with its day, such as 2026-03-31. */
export type DatedCalibration = MeasuredCalibration & { readonly measuredOn: string };

export type PowerShift = {
  /** Place of the mark step from 0. */
  readonly stepIndex: number;
  /** Watts by the reading that the setting was proved with. */
  readonly beforeW: number;
  /** Watts by the newest reading that holds for the step. */
  readonly afterW: number;
  /** (after - before) / before x 100; below zero: the source gives less than it did. */
  readonly shiftPercent: number;
  readonly measuredOn: string;
};

export type PowerShiftInput = {
  readonly profile: PhysicalProfile;
  readonly steps: readonly Pick<MarkStep, 'parameters'>[];
  /** The reading that the setting was proved with. */
  readonly cited: MeasuredCalibration | null;
  /** Later readings of the same machine, newest first. */
  readonly newer: readonly DatedCalibration[];
};

/**
 * How far a source has moved under a setting since it was proved.     100 (P_new - P_cited) / P_cited, the step that moved most
 *
 * @param input.profile  rated power W, maximum pulse energy mJ per pulse width ns
 * @param input.steps    mark steps with powerPercent %, frequencyKhz, pulseWidthNs
 * @param input.cited    percent to watts at the time of proof; null: none, and then nothing is compared
 * @param input.newer    later tables, newest first; each step takes the newest one that was measured at its pulse width and within 10 %
 *                       of its frequency
 * @returns watts before and after and their shift in percent with its sign, or null where no later reading holds for any step
 * @throws RangeError if a calibration's points are too few or not in order
 * Valid as workPower: nothing is guessed beyond a table's readings.
 * Source: own definition; docs/science/work-power.md
 */
export function powerShift({ profile, steps, cited, newer }: PowerShiftInput): PowerShift | null {
  if (cited === null) return null;
  const shifts = steps.flatMap(({ parameters: { values: parameters } }, stepIndex) => {
    const before = calibratedWatts({ profile, calibration: cited, parameters });
    if (before === null || before <= 0) return [];
    for (const calibration of newer) {
      const after = calibratedWatts({ profile, calibration, parameters });
      if (after === null) continue;
      const shiftPercent = ((after - before) / before) * 100;
      return [{ stepIndex, beforeW: before, afterW: after, shiftPercent, measuredOn: calibration.measuredOn }];
    }
    return [];
  });
  return shifts.reduce<PowerShift | null>((most, shift) => (most === null || sizeOf(shift) > sizeOf(most) ? shift : most), null);
}

const sizeOf = ({ shiftPercent }: PowerShift) => Math.abs(shiftPercent);

/** Watts by this reading, or null where it says nothing about the setting. */
function calibratedWatts(input: Parameters<typeof workPower>[0]): number | null {
  const power = workPower(input);
  return power.watts !== null && power.basis === 'calibration' ? power.watts : null;
}
