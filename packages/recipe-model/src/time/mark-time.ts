import { filledRectangleTime, rectangleScanning } from '@proofplate/physics';
import type { AreaMm } from '../numbers/mark-area';
import type { MarkStep } from '../vocabulary/setting';
import { type HeadDelays, type HeadOverheads, lineOverheads } from './head-overheads';
import { type MarkedArea, markedAreas } from './marked-area';

export type TimeGround = { readonly physical: HeadDelays; readonly overheads: HeadOverheads };

export type MarkTime =
  | {
      readonly totalS: number;
      readonly beamOnS: number;
      /** Standard error of the whole time where the overheads are fitted; null: nobody knows it. */
      readonly errorS: number | null;
      readonly missingBecause: null;
    }
  | { readonly totalS: null; readonly beamOnS: null; readonly errorS: null; readonly missingBecause: string };

const MS_PER_S = 1000;

/**
 * Time of a mark with the overheads that hold for its machine.
 *
 * @param areas   filled rectangles; pauses between mark steps in s
 * @param ground  machine and its overheads
 * @returns whole time and beam-on time, s, with the standard error of fitted overheads: spread of the clocked marks, and the errors of time
 *          per line and per scan taken as independent, which is never too little; or the reason why there is none
 * @throws RangeError if a value is impossible in itself
 * Valid as filledRectangleTime.
 * Source: docs/science/marking-time.md
 */
export function markTime(
  { areas, pausesS }: { readonly areas: readonly MarkedArea[]; readonly pausesS: number },
  { physical, overheads }: TimeGround,
): MarkTime {
  if (overheads.basis === 'not known') return noTime(overheads.because);
  const { jumpSpeedMmPerS } = overheads;
  const sum = { totalS: pausesS, beamOnS: 0, lines: 0, scans: 0 };
  for (const area of areas) {
    const head = lineOverheads(physical, { speedMmPerS: area.speedMmPerS, overheads });
    const time = filledRectangleTime({ ...area, jumpSpeedMmPerS, ...head });
    const { lines, scans } = rectangleScanning({ ...area, jumpSpeedMmPerS });
    sum.totalS += area.count * time.totalS;
    sum.beamOnS += area.count * time.beamOnS;
    sum.lines += area.count * lines;
    sum.scans += area.count * scans;
  }
  return { totalS: sum.totalS, beamOnS: sum.beamOnS, errorS: errorOf(sum, overheads), missingBecause: null };
}

/** Time of a part: every mark step fills the same rectangle, with the pauses between the steps. */
export function settingTime(steps: readonly MarkStep[], areaMm: AreaMm, ground: TimeGround): MarkTime {
  const marked = markedAreas(steps.map(({ parameters }) => ({ parameters, areaMm })));
  return 'unknownBecause' in marked ? noTime(marked.unknownBecause) : markTime({ ...marked, pausesS: pausesOf(steps) }, ground);
}

/** Pauses between mark steps, s; the one after the last step is no part of the mark. */
export const pausesOf = (steps: readonly Pick<MarkStep, 'pauseAfterS'>[]): number =>
  steps.slice(0, -1).reduce((sum, { pauseAfterS }) => sum + pauseAfterS, 0);

function errorOf({ lines, scans }: { lines: number; scans: number }, overheads: HeadOverheads): number | null {
  if (overheads.basis !== 'fitted') return null;
  const { spreadS, lineStandardErrorMs, scanStandardErrorMs } = overheads;
  return Math.hypot(spreadS, (lines * lineStandardErrorMs) / MS_PER_S, (scans * (scanStandardErrorMs ?? 0)) / MS_PER_S);
}

const noTime = (missingBecause: string): MarkTime => ({ totalS: null, beamOnS: null, errorS: null, missingBecause });
