import { type MarkingOverheads, runIn } from '@proofplate/physics';
import type { PhysicalProfile } from '../vocabulary/profile';
import type { DelaysUs } from '../vocabulary/setting';

/** Which overheads of the scan head hold for a machine: fitted from clocked marks, else typed in its profile, else none. */
export type HeadOverheads =
  | {
      readonly basis: 'fitted';
      readonly jumpSpeedMmPerS: number;
      readonly n: number;
      readonly lineMs: number;
      readonly lineStandardErrorMs: number;
      /** null: the lines carry it. */
      readonly scanMs: number | null;
      readonly scanStandardErrorMs: number | null;
      readonly scanMissingBecause: string | null;
      readonly spreadS: number;
    }
  | { readonly basis: 'profile'; readonly jumpSpeedMmPerS: number; readonly notFittedBecause: string }
  | { readonly basis: 'not known'; readonly because: string };

export const NO_JUMP_SPEED = 'the machine’s page gives no jump speed';
const US_PER_MS = 1000;

/**
 * The one place that decides which overheads hold.
 *
 * @param physical  jump speed mm/s, without which no time is worked out
 * @param fit       of the machine's clocked marks; absent: nobody has looked
 * @returns the fitted overheads, else those of the profile with the reason why none are fitted, else the reason why there are none
 * Source: own rule; docs/science/marking-time.md
 */
export function headOverheads({ jumpSpeedMmPerS }: Pick<PhysicalProfile, 'jumpSpeedMmPerS'>, fit: MarkingOverheads): HeadOverheads {
  if (jumpSpeedMmPerS === undefined) return { basis: 'not known', because: NO_JUMP_SPEED };
  if (fit.kind === 'not known') return { basis: 'profile', jumpSpeedMmPerS, notFittedBecause: fit.because };
  const { n, lineMs, lineStandardErrorMs, scanMs, scanStandardErrorMs, scanMissingBecause, spreadS } = fit;
  return {
    ...{ basis: 'fitted', jumpSpeedMmPerS, n, spreadS },
    ...{ lineMs, lineStandardErrorMs, scanMs, scanStandardErrorMs, scanMissingBecause },
  };
}

export type LineOverheads = {
  readonly lineOverheadMs: number;
  readonly jumpSettleMs: number;
  readonly pauseBetweenMs: number;
  readonly scanOverheadMs?: number;
};

/** What a profile says of the time beside the lines. */
export type HeadDelays = Pick<PhysicalProfile, 'accelerationMmPerS2' | 'laserOnDelayUs' | 'laserOffDelayUs' | 'jumpSettleMs'>;

/** Overheads of a line at a speed: the fitted ones hold whatever the step's own delays, else delays of the step before the machine's. */
export function lineOverheads(
  physical: HeadDelays,
  { speedMmPerS, delaysUs, overheads }: { speedMmPerS: number; delaysUs?: DelaysUs | undefined; overheads?: HeadOverheads | undefined },
): LineOverheads {
  if (overheads?.basis === 'fitted')
    return { lineOverheadMs: overheads.lineMs, jumpSettleMs: 0, pauseBetweenMs: 0, scanOverheadMs: overheads.scanMs ?? 0 };
  const { accelerationMmPerS2, laserOnDelayUs = 0, laserOffDelayUs = 0, jumpSettleMs = 0 } = physical;
  const rampMs = accelerationMmPerS2 === undefined || speedMmPerS <= 0 ? 0 : 2 * runIn(speedMmPerS, accelerationMmPerS2).timeMs;
  const delaysMs = ((delaysUs?.laserOn ?? laserOnDelayUs) + (delaysUs?.laserOff ?? laserOffDelayUs)) / US_PER_MS;
  return {
    lineOverheadMs: Math.max(0, delaysMs) + rampMs,
    jumpSettleMs: Math.max(0, delaysUs?.jump === undefined ? jumpSettleMs : delaysUs.jump / US_PER_MS),
    pauseBetweenMs: 0,
  };
}
