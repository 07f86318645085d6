import { type LoggedMark, type MarkingOverheads, markingOverheadFit, rectangleScanning } from '@proofplate/physics';
import { NO_JUMP_SPEED } from './head-overheads';
import type { MarkedArea } from './marked-area';

/** A mark and the time that somebody clocked for it. */
export type ClockedMark = { readonly areas: readonly MarkedArea[]; readonly pausesS: number; readonly seconds: number };

/**
 * The overheads of a scan head from the marks that somebody clocked on it.
 *
 * @param marks            clocked on one machine with one physical profile; seconds above their pauses
 * @param jumpSpeedMmPerS  of the machine, mm/s; absent: nothing can be fitted
 * @returns as markingOverheadFit(), its marks in the order given
 * @throws RangeError if a value is impossible in itself
 * Source: docs/science/marking-time.md
 */
export function overheadsFromMarks(marks: readonly ClockedMark[], jumpSpeedMmPerS: number | undefined): MarkingOverheads {
  if (jumpSpeedMmPerS === undefined) return { kind: 'not known', n: marks.length, because: NO_JUMP_SPEED };
  return markingOverheadFit(marks.map((mark) => loggedMark(mark, jumpSpeedMmPerS)));
}

function loggedMark({ areas, pausesS, seconds }: ClockedMark, jumpSpeedMmPerS: number): LoggedMark {
  const sum = { beamOnS: 0, jumpTravelS: 0, lines: 0, scans: 0 };
  for (const { count, ...area } of areas) {
    const { beamOnS, jumpTravelS, lines, scans } = rectangleScanning({ ...area, jumpSpeedMmPerS });
    sum.beamOnS += count * beamOnS;
    sum.jumpTravelS += count * jumpTravelS;
    sum.lines += count * lines;
    sum.scans += count * scans;
  }
  return { ...sum, loggedS: seconds - pausesS };
}
