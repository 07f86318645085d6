import { powerAtPercent, powerCalibration } from '@proofplate/physics';
import type { Calibration } from '../machines.api';

/** Readings that can be compared: power depends on frequency and pulse width, and a meter on its wavelength. */
export type ReadingGroup = { key: string; readings: readonly Calibration[] };
export type AgeingPoint = { id: string; measuredOn: string; watts: number };

/** Groups of the same conditions, the one with most readings first; each oldest first. */
export function readingGroups(calibrations: readonly Calibration[]): ReadingGroup[] {
  const groups = new Map<string, Calibration[]>();
  for (const calibration of [...calibrations].reverse()) {
    const key = [calibration.wavelengthNm, calibration.frequencyKhz, calibration.pulseWidthNs].join(' ');
    groups.set(key, [...(groups.get(key) ?? []), calibration]);
  }
  return [...groups].map(([key, readings]) => ({ key, readings })).sort((one, other) => other.readings.length - one.readings.length);
}

/** Percentages that somebody read and that every reading of the group reaches, highest first: nothing is guessed beyond one. */
export function sharedPercents({ readings }: ReadingGroup): number[] {
  const lowest = Math.max(...readings.map(({ points }) => points[0]?.percent ?? 100));
  const highest = Math.min(...readings.map(({ points }) => points.at(-1)?.percent ?? 0));
  const read = new Set(readings.flatMap(({ points }) => points.map(({ percent }) => percent)));
  return [...read].filter((percent) => percent >= lowest && percent <= highest && percent > 0).sort((one, other) => other - one);
}

/** Watts at one percentage over the days of the readings. */
export function wattsOverTime({ readings }: ReadingGroup, percent: number): AgeingPoint[] {
  return readings.map(({ id, measuredOn, points }) => {
    const curve = powerCalibration(points.map((point) => ({ percent: point.percent, powerW: point.watts })));
    return { id, measuredOn, watts: powerAtPercent(curve, percent) };
  });
}
