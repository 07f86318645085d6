import { scansPerPass } from './fill';
import { type FilledRectangle, filledRectangleTime } from './filled-rectangle-time';
import { lineCount } from './line-count';

export type ScannedRectangle = Omit<FilledRectangle, 'lineOverheadMs' | 'jumpSettleMs' | 'pauseBetweenMs' | 'scanOverheadMs'>;

/** What a mark is made of before any overhead of the scan head. */
export type Scanning = { readonly beamOnS: number; readonly jumpTravelS: number; readonly lines: number; readonly scans: number };

/**
 * What all passes of a filled rectangle are made of.
 *   beam-on and jump travel: filledRectangleTime without overheads
 *   lines = p n, crossed: p (n(H) + n(W));  scans = p, crossed: 2 p
 *
 * @param mark  size mm, line spacing um, scan and jump speed mm/s, all finite, > 0; passes whole, >= 1; how the area is scanned
 * @returns beam-on time and travel of the jumps between lines, s; number of lines and of scans over the area
 * @throws RangeError naming the argument and its value, if out of range
 * Valid as filledRectangleTime.
 * Source: convention of docs/science/marking-time.md
 */
export function rectangleScanning(mark: ScannedRectangle): Scanning {
  const bare = filledRectangleTime({ ...mark, lineOverheadMs: 0, jumpSettleMs: 0, pauseBetweenMs: 0 });
  const { widthMm, heightMm, lineSpacingUm, passes, fill } = mark;
  const along = lineCount(heightMm, lineSpacingUm);
  const linesOfOnePass = fill === 'crossed' ? along + lineCount(widthMm, lineSpacingUm) : along;
  return {
    beamOnS: bare.beamOnS,
    jumpTravelS: bare.totalS - bare.beamOnS,
    lines: passes * linesOfOnePass,
    scans: passes * scansPerPass(fill),
  };
}
