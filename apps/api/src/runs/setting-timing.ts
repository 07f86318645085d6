import { type AreaMm, type MarkedAreas, type MarkStep, markedAreas, pausesOf, type TimeGround } from '@proofplate/recipe-model';
import type { SettingTimingDto } from './dto/run-times.dto';

/** Any size: what a step needs for its time does not depend on it. */
const ANY: AreaMm = { widthMm: 1, heightMm: 1 };

export const areasOfSteps = (steps: readonly MarkStep[], areaMm: AreaMm): MarkedAreas =>
  markedAreas(steps.map(({ parameters }) => ({ parameters, areaMm })));

/** Mark steps as their time needs them, each as it stands in the setting. */
export function toSettingTimingDto(steps: readonly MarkStep[], ground: TimeGround): SettingTimingDto {
  const each = steps.map((step) => areasOfSteps([step], ANY));
  const unknown = each.find((areas) => 'unknownBecause' in areas);
  const missingBecause = unknown !== undefined && 'unknownBecause' in unknown ? unknown.unknownBecause : null;
  return {
    steps: missingBecause === null ? each.flatMap((marked) => ('areas' in marked ? marked.areas.map(toTimedStep) : [])) : [],
    pausesS: pausesOf(steps),
    missingBecause,
    ground,
  };
}

type Area = Extract<MarkedAreas, { areas: unknown }>['areas'][number];
const toTimedStep = ({ lineSpacingUm, speedMmPerS, passes, fill }: Area) => ({ lineSpacingUm, speedMmPerS, passes, fill });
