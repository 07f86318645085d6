import { type AreaMm, type MarkTime, markTime } from '@proofplate/recipe-model';
import { readNumber } from '../../lib/read-number';
import { headOverheadsOf } from '../../lib/time-words';
import type { SettingTiming } from './marking-time.api';

const SIDE = { unit: 'mm', least: 0.01, most: 5000 };
export const readWidth = (text: string, locale: string) => readNumber(text, { what: 'The width', ...SIDE }, locale);
export const readHeight = (text: string, locale: string) => readNumber(text, { what: 'The height', ...SIDE }, locale);

/** The area in two fields; undefined while one of them cannot be read. */
export function readArea(width: string, height: string, locale: string): AreaMm | undefined {
  const [widthMm, heightMm] = [readWidth(width, locale), readHeight(height, locale)];
  return 'value' in widthMm && 'value' in heightMm ? { widthMm: widthMm.value, heightMm: heightMm.value } : undefined;
}

/** Time of a part whose mark steps all fill this area. */
export function areaTime({ steps, pausesS, missingBecause, ground }: SettingTiming, areaMm: AreaMm): MarkTime {
  if (missingBecause !== null) return { totalS: null, beamOnS: null, errorS: null, missingBecause };
  const areas = steps.map((step) => ({ ...step, ...areaMm, count: 1 }));
  return markTime({ areas, pausesS }, { physical: ground.physical, overheads: headOverheadsOf(ground.overheads) });
}
