import { type MarkArea, runIn } from '@proofplate/physics';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { ParameterSet } from '../vocabulary/setting';

export type AreaMm = { readonly widthMm: number; readonly heightMm: number };

/** Overheads are always known: a delay that nobody gives is none. */
export type OwnArea = MarkArea & { readonly lineOverheadMs: number; readonly jumpSettleMs: number; readonly pauseBetweenMs: number };

const US_PER_MS = 1000;

/**
 * A filled rectangle with what the scan head needs beside the lines: delays as set in the step, else as the machine has them.
 *
 * @param setting   delays of the step in µs, scan speed for the run-in
 * @param physical  jump speed mm/s, acceleration mm/s², delays; a missing jump speed stays a reason in words
 * @param areaMm    width and height in mm
 * @returns the area with its overheads in ms
 */
export function markAreaOf(
  { values, delaysUs }: Pick<ParameterSet, 'values' | 'delaysUs'>,
  physical: PhysicalProfile,
  areaMm: AreaMm,
): OwnArea {
  const { jumpSpeedMmPerS, accelerationMmPerS2, laserOnDelayUs = 0, laserOffDelayUs = 0, jumpSettleMs = 0 } = physical;
  const speedMmPerS = values.speedMmPerS?.physical ?? 0;
  const rampMs = accelerationMmPerS2 === undefined || speedMmPerS <= 0 ? 0 : 2 * runIn(speedMmPerS, accelerationMmPerS2).timeMs;
  const delaysMs = ((delaysUs?.laserOn ?? laserOnDelayUs) + (delaysUs?.laserOff ?? laserOffDelayUs)) / US_PER_MS;
  return {
    ...areaMm,
    jumpSpeedMmPerS: jumpSpeedMmPerS ?? { unknownBecause: 'the machine’s page gives no jump speed' },
    lineOverheadMs: Math.max(0, delaysMs) + rampMs,
    jumpSettleMs: Math.max(0, delaysUs?.jump === undefined ? jumpSettleMs : delaysUs.jump / US_PER_MS),
    pauseBetweenMs: 0,
  };
}
