import type { Fill } from '@proofplate/physics';
import type { AreaMm } from '../numbers/mark-area';
import { PARAMETERS, type ParameterKey } from '../vocabulary/parameters';
import type { ParameterSet } from '../vocabulary/setting';

/** Filled rectangles of a mark with what their time rests on, copied as physical values. `count` of them are alike. */
export type MarkedArea = AreaMm & {
  readonly lineSpacingUm: number;
  readonly speedMmPerS: number;
  readonly passes: number;
  readonly fill: Exclude<Fill, 'outline'>;
  readonly count: number;
};

export type MarkedAreas = { readonly areas: readonly MarkedArea[] } | { readonly unknownBecause: string };

type Timed = { readonly parameters: Pick<ParameterSet, 'values' | 'fill'>; readonly areaMm: AreaMm };

/**
 * What is marked, as the time of it is worked out and kept: like rectangles are counted, not repeated.
 *
 * @param marks  setting and size in mm of each filled rectangle
 * @returns the rectangles in their first order, or why they are not known: an outline, no speed, no line spacing
 */
export function markedAreas(marks: readonly Timed[]): MarkedAreas {
  const areas = new Map<string, MarkedArea>();
  for (const { parameters, areaMm } of marks) {
    const area = areaOf(parameters, areaMm);
    if ('unknownBecause' in area) return area;
    const key = JSON.stringify(area);
    areas.set(key, { ...area, count: (areas.get(key)?.count ?? 0) + 1 });
  }
  return areas.size === 0 ? { unknownBecause: 'nothing is marked' } : { areas: [...areas.values()] };
}

function areaOf(
  { values, fill }: Timed['parameters'],
  { widthMm, heightMm }: AreaMm,
): Omit<MarkedArea, 'count'> | { unknownBecause: string } {
  if (fill === 'outline') return { unknownBecause: 'outline only: no area is filled, and the length of the contour is not known' };
  const [speedMmPerS, lineSpacingUm, passes] = [values.speedMmPerS?.physical, values.lineSpacingUm?.physical, values.passes?.physical ?? 1];
  if (speedMmPerS === undefined || speedMmPerS <= 0) return notSet('speedMmPerS');
  if (lineSpacingUm === undefined || lineSpacingUm <= 0) return notSet('lineSpacingUm');
  if (!Number.isInteger(passes) || passes < 1) return { unknownBecause: 'the passes are no whole number' };
  return { widthMm, heightMm, lineSpacingUm, speedMmPerS, passes, fill };
}

const notSet = (key: ParameterKey) => ({ unknownBecause: `no ${PARAMETERS[key].label.toLowerCase()} is set` });
