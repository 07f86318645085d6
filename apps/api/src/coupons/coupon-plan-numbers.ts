import { filledRectangleTime } from '@proofplate/physics';
import {
  markAreaOf,
  type Optics,
  type ParameterSet,
  type PhysicalProfile,
  type SettingNumber,
  stepNumbers,
} from '@proofplate/recipe-model';
import type { MarkingTimeDto } from './dto/coupon-preview.dto';

/** The numbers that follow from one cell, by key. */
export function numbersOf(parameters: ParameterSet, optics: Optics): Map<string, SettingNumber> {
  return new Map(stepNumbers(parameters, { optics }).numbers.map((derived) => [derived.key, derived]));
}

/** Time of all cells. Where the scan head is not described, the reason stands in its place. */
export function markingTimeOf(cells: readonly { parameters: ParameterSet }[], cellMm: number, physical: PhysicalProfile): MarkingTimeDto {
  let totalS = 0;
  let beamOnS = 0;
  for (const { parameters } of cells) {
    const time = cellTime(parameters, cellMm, physical);
    if ('missingBecause' in time) return { totalS: null, beamOnS: null, missingBecause: time.missingBecause };
    totalS += time.totalS;
    beamOnS += time.beamOnS;
  }
  return { totalS, beamOnS, missingBecause: null };
}

function cellTime(parameters: ParameterSet, cellMm: number, physical: PhysicalProfile) {
  const { values, fill } = parameters;
  const speedMmPerS = values.speedMmPerS?.physical;
  const lineSpacingUm = values.lineSpacingUm?.physical;
  if (fill === 'outline') return { missingBecause: 'Outline only: no area is filled.' };
  if (speedMmPerS === undefined || lineSpacingUm === undefined) return { missingBecause: 'Scan speed and line spacing are not both set.' };
  const { jumpSpeedMmPerS, lineOverheadMs, jumpSettleMs } = markAreaOf(parameters, physical, { widthMm: cellMm, heightMm: cellMm });
  if (typeof jumpSpeedMmPerS !== 'number') return { missingBecause: 'The machine’s jump speed is not known. Add it to the machine.' };
  return filledRectangleTime({
    widthMm: cellMm,
    heightMm: cellMm,
    lineSpacingUm,
    speedMmPerS,
    jumpSpeedMmPerS,
    lineOverheadMs,
    jumpSettleMs,
    pauseBetweenMs: 0,
    passes: values.passes?.physical ?? 1,
    fill,
  });
}
