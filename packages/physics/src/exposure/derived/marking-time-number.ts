import { type FilledRectangle, filledRectangleTime } from '../filled-rectangle-time';
import { absent, type DerivedNumber, derive } from './derived-number';
import { OUTLINE } from './effective-parameters';
import type { MarkParameters, Quantity } from './mark-parameters';

const DESCRIBED = {
  key: 'markingTime',
  unit: 's',
  formula: 'lines, jumps, delays and pauses of the filled rectangle, all passes',
  source: 'docs/science/marking-time.md',
};

/** Time of the rectangle given, with the overheads of the scan head. */
export function markingTimeNumber(mark: MarkParameters): DerivedNumber {
  const { area, fill, speedMmPerS, lineSpacingUm, passes } = mark;
  if (fill === 'outline') return absent(DESCRIBED, OUTLINE);
  if (area === undefined) return absent(DESCRIBED, { unknownBecause: 'the size of the filled area is not given' });
  const inputs: Record<Exclude<keyof FilledRectangle, 'fill' | 'scanOverheadMs'>, Quantity> = {
    widthMm: area.widthMm,
    heightMm: area.heightMm,
    jumpSpeedMmPerS: area.jumpSpeedMmPerS,
    lineOverheadMs: area.lineOverheadMs,
    jumpSettleMs: area.jumpSettleMs,
    pauseBetweenMs: area.pauseBetweenMs,
    speedMmPerS,
    lineSpacingUm,
    passes,
  };
  const { scanOverheadMs } = area;
  if (scanOverheadMs === undefined)
    return derive(DESCRIBED, inputs, { compute: (known) => filledRectangleTime({ ...known, fill }).totalS });
  return derive(DESCRIBED, { ...inputs, scanOverheadMs }, { compute: (known) => filledRectangleTime({ ...known, fill }).totalS });
}
