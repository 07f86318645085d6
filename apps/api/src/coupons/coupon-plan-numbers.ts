import {
  type MarkTime,
  markedAreas,
  markTime,
  type Optics,
  type ParameterSet,
  type SettingNumber,
  stepNumbers,
  type TimeGround,
} from '@proofplate/recipe-model';
import type { PlanTimeDto } from './dto/coupon-preview.dto';

/** The numbers that follow from one cell, by key. */
export function numbersOf(parameters: ParameterSet, optics: Optics): Map<string, SettingNumber> {
  return new Map(stepNumbers(parameters, { optics }).numbers.map((derived) => [derived.key, derived]));
}

/** Time of all cells and of one. Where it cannot be worked out, the reason stands in its place. */
export function markingTimeOf(cells: readonly { parameters: ParameterSet }[], cellMm: number, ground: TimeGround): PlanTimeDto {
  const whole = timeOf(cells, cellMm, ground);
  const each = cells.map((cell) => timeOf([cell], cellMm, ground).totalS).filter((totalS) => totalS !== null);
  const { overheads } = ground;
  if (whole.totalS === null) return { ...whole, quickestCellS: null, slowestCellS: null, overheads };
  return { ...whole, quickestCellS: Math.min(...each), slowestCellS: Math.max(...each), overheads };
}

function timeOf(cells: readonly { parameters: ParameterSet }[], cellMm: number, ground: TimeGround): MarkTime {
  const marked = markedAreas(cells.map(({ parameters }) => ({ parameters, areaMm: { widthMm: cellMm, heightMm: cellMm } })));
  if ('areas' in marked) return markTime({ areas: marked.areas, pausesS: 0 }, ground);
  return { totalS: null, beamOnS: null, errorS: null, missingBecause: marked.unknownBecause };
}
