import type { MeasuredCalibration } from '@proofplate/recipe-model';

type StoredCalibration = {
  points: readonly { percent: number; watts: number }[];
  frequencyKhz: number | null;
  pulseWidthNs: number | null;
};

/** A power table as the server gives it, as the power model reads it. */
export function measuredCalibration({ points, frequencyKhz, pulseWidthNs }: StoredCalibration): MeasuredCalibration {
  return { points: points.map(({ percent, watts }) => ({ percent, powerW: watts })), frequencyKhz, pulseWidthNs };
}
