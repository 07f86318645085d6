import { type CalibrationPoint, powerAtPercent, powerCalibration, sourceLimitPower } from '@proofplate/physics';
import { largestPulseEnergyMj } from '../numbers/machine-limits';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { ParameterValues, WorkPower } from '../vocabulary/setting';

/** A dated table of a power meter with the source's settings at the time; null where the source has no such setting. */
export type MeasuredCalibration = { points: readonly CalibrationPoint[]; frequencyKhz: number | null; pulseWidthNs: number | null };

/** A calibration counts only near the frequency that it was measured at: the average power of a source depends on it. */
export const CALIBRATION_FREQUENCY_TOLERANCE = 0.1;

const SAME = 1e-9;

export type WorkPowerInput = {
  profile: PhysicalProfile;
  calibration?: MeasuredCalibration;
  parameters: ParameterValues;
};

/**
 * Average power of a setting.     calibration at its pulse width and within 10 % of its frequency;
 *                                 else p/100 min(rated W, maximum pulse energy mJ x frequency kHz), "not calibrated"
 *
 * @param input.profile      rated power W, maximum pulse energy mJ per pulse width ns
 * @param input.calibration  measured percent to watts, with the frequency kHz and pulse width ns of the measurement
 * @param input.parameters   powerPercent %, frequencyKhz (absent: continuous), pulseWidthNs
 * @returns watts with their basis, or null with the reason in words; never zero in place of unknown
 * @throws RangeError if the calibration's points are too few or not in order
 * Valid for sources that are linear in their percent where not calibrated.
 * Source: own definition; docs/science/work-power.md
 */
export function workPower({ profile, calibration, parameters }: WorkPowerInput): WorkPower {
  const percent = parameters.powerPercent?.physical;
  if (percent === undefined) return { watts: null, reason: 'No power is set.' };
  const frequencyKhz = parameters.frequencyKhz?.physical ?? null;
  const pulseWidthNs = parameters.pulseWidthNs?.physical ?? null;
  if (calibration !== undefined && isMeasuredThere(calibration, frequencyKhz, pulseWidthNs)) {
    const curve = powerCalibration(calibration.points);
    if (isBetweenEnds(curve.percent, percent)) return { watts: powerAtPercent(curve, percent), basis: 'calibration' };
  }
  if (frequencyKhz === null) return { watts: (percent / 100) * profile.ratedPowerW, basis: 'not calibrated' };
  const energyMj = largestPulseEnergyMj(profile, pulseWidthNs);
  if (energyMj === null) return { watts: null, reason: missingEnergy(profile, pulseWidthNs) };
  return { watts: (percent / 100) * sourceLimitPower(profile.ratedPowerW, energyMj, frequencyKhz), basis: 'not calibrated' };
}

/** Nothing is extrapolated: outside of the measured points the setting counts as not calibrated. */
function isBetweenEnds(measured: readonly number[], percent: number): boolean {
  return percent >= measured[0] && percent <= measured[measured.length - 1];
}

/** True if a table was measured at this pulse width and near enough to this frequency; null where the source has no such setting. */
export function isMeasuredThere(calibration: MeasuredCalibration, frequencyKhz: number | null, pulseWidthNs: number | null): boolean {
  if (!isWithin(calibration.pulseWidthNs, pulseWidthNs, SAME)) return false;
  return isWithin(calibration.frequencyKhz, frequencyKhz, CALIBRATION_FREQUENCY_TOLERANCE + SAME);
}

function isWithin(measured: number | null, set: number | null, share: number): boolean {
  if (measured === null || set === null) return measured === set;
  return Math.abs(set - measured) <= share * Math.abs(measured);
}

function missingEnergy({ maxPulseEnergyMj: limits = [] }: PhysicalProfile, pulseWidthNs: number | null): string {
  const way = 'Add a power calibration, or the largest pulse energy to the machine.';
  if (limits.length === 0) return `No calibration fits, and the machine’s largest pulse energy is not known. ${way}`;
  const width = pulseWidthNs === null ? 'without a pulse width' : `at ${pulseWidthNs} ns`;
  return `No calibration fits, and the machine’s largest pulse energy is not known ${width}. ${way}`;
}
