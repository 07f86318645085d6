import type { MarkArea } from '@proofplate/physics';
import { type HeadOverheads, type LineOverheads, lineOverheads, NO_JUMP_SPEED } from '../time/head-overheads';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { ParameterSet } from '../vocabulary/setting';

export type AreaMm = { readonly widthMm: number; readonly heightMm: number };
/** A rectangle with the overheads of its machine; without them those of the profile hold. */
export type TimedAreaMm = AreaMm & { readonly overheads?: HeadOverheads | undefined };

/** Overheads are always known: a delay that nobody gives is none. */
export type OwnArea = MarkArea & LineOverheads;

/**
 * A filled rectangle with what the scan head needs beside the lines: fitted overheads, else delays as set in the step, else as the machine
 * has them.
 *
 * @param setting   delays of the step in µs, scan speed for the run-in
 * @param physical  jump speed mm/s, acceleration mm/s², delays; a missing jump speed stays a reason in words
 * @param area      width and height in mm, and the overheads that hold for the machine
 * @returns the area with its overheads in ms
 */
export function markAreaOf(
  { values, delaysUs }: Pick<ParameterSet, 'values' | 'delaysUs'>,
  physical: PhysicalProfile,
  { overheads, widthMm, heightMm }: TimedAreaMm,
): OwnArea {
  const speedMmPerS = values.speedMmPerS?.physical ?? 0;
  return {
    ...{ widthMm, heightMm },
    jumpSpeedMmPerS: physical.jumpSpeedMmPerS ?? { unknownBecause: NO_JUMP_SPEED },
    ...lineOverheads(physical, { speedMmPerS, delaysUs, overheads }),
  };
}
