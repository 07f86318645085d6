import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';
import { requireWhole } from '../arguments/require-whole';
import type { Fill } from './fill';
import { lineCount } from './line-count';

export type FilledRectangle = {
  readonly widthMm: number;
  readonly heightMm: number;
  readonly lineSpacingUm: number;
  readonly speedMmPerS: number;
  readonly jumpSpeedMmPerS: number;
  readonly lineOverheadMs: number;
  readonly jumpSettleMs: number;
  readonly pauseBetweenMs: number;
  /** Time that each scan over the area takes beside its lines; absent: none. */
  readonly scanOverheadMs?: number;
  readonly passes: number;
  readonly fill: Exclude<Fill, 'outline'>;
};

export type MarkingTime = { readonly totalS: number; readonly beamOnS: number; readonly duty: number };

type Scan = { readonly timeS: number; readonly beamOnS: number };

const UM_PER_MM = 1000;
const MS_PER_S = 1000;

/**
 * Time to mark a filled rectangle.
 *   one direction:   n (W/v + t_line) + (n-1) (sqrt(W^2 + h^2)/v_jump + t_settle)
 *   both directions: n (W/v + t_line) + (n-1) (h/v_jump + t_settle)
 *   crossed:         both directions of W x H and of H x W, with a pause between
 *   p passes:        p T + (p-1) t_pause, and t_scan for each scan
 *
 * @param mark.widthMm          W along the lines, mm, finite, > 0
 * @param mark.heightMm         H across the lines, mm, finite, > 0
 * @param mark.lineSpacingUm    h, um, finite, > 0
 * @param mark.speedMmPerS      v, mm/s, finite, > 0
 * @param mark.jumpSpeedMmPerS  v_jump, mm/s, finite, > 0
 * @param mark.lineOverheadMs   laser-on and laser-off delay and, if used, run-in and run-out of a line, ms, finite, >= 0
 * @param mark.jumpSettleMs     settle time after a jump, ms, finite, >= 0
 * @param mark.pauseBetweenMs   pause between scans and between passes, ms, finite, >= 0
 * @param mark.scanOverheadMs   t_scan, ms, finite, >= 0; absent: none
 * @param mark.passes           passes, whole, >= 1
 * @param mark.fill             how the area is scanned
 * @returns whole time and beam-on time, s; duty is the beam-on share of the scanning time, pauses left out
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for lines parallel to an edge and lines long enough to reach full speed.
 * Source: convention of docs/science/marking-time.md
 */
export function filledRectangleTime(mark: FilledRectangle): MarkingTime {
  const { widthMm, heightMm, lineSpacingUm, speedMmPerS, jumpSpeedMmPerS, passes } = mark;
  const { lineOverheadMs, jumpSettleMs, pauseBetweenMs, scanOverheadMs = 0 } = mark;
  requirePositive({ widthMm, heightMm, lineSpacingUm, speedMmPerS, jumpSpeedMmPerS });
  requireAtLeast(0, { lineOverheadMs, jumpSettleMs, pauseBetweenMs, scanOverheadMs });
  requireWhole({ passes });
  const scans = scansOfOnePass(mark);
  const scanningS = passes * scans.reduce((sum, scan) => sum + scan.timeS + scanOverheadMs / MS_PER_S, 0);
  const beamOnS = passes * scans.reduce((sum, scan) => sum + scan.beamOnS, 0);
  const pauses = passes * scans.length - 1;
  return { totalS: scanningS + (pauses * pauseBetweenMs) / MS_PER_S, beamOnS, duty: beamOnS / scanningS };
}

function scansOfOnePass(mark: FilledRectangle): readonly Scan[] {
  const spacingMm = mark.lineSpacingUm / UM_PER_MM;
  if (mark.fill === 'one direction') return [scanOf(mark, mark.widthMm, mark.heightMm, Math.hypot(mark.widthMm, spacingMm))];
  const along = scanOf(mark, mark.widthMm, mark.heightMm, spacingMm);
  return mark.fill === 'crossed' ? [along, scanOf(mark, mark.heightMm, mark.widthMm, spacingMm)] : [along];
}

function scanOf(mark: FilledRectangle, lineMm: number, acrossMm: number, jumpMm: number): Scan {
  const lines = lineCount(acrossMm, mark.lineSpacingUm);
  const beamOnS = (lines * lineMm) / mark.speedMmPerS;
  const lineOverheadS = (lines * mark.lineOverheadMs) / MS_PER_S;
  const jumpS = jumpMm / mark.jumpSpeedMmPerS + mark.jumpSettleMs / MS_PER_S;
  return { timeS: beamOnS + lineOverheadS + (lines - 1) * jumpS, beamOnS };
}
