import { markTime } from '@proofplate/recipe-model';
import type { LoggedTimeDto } from './dto/marking-time.dto';
import type { LoggedTimeView } from './logged-times.repository';
import type { MachineTimes } from './marking-overheads';

export function toLoggedTimeDto(
  { time, physicalNumber, runCode, couponCode, address, replaced }: LoggedTimeView,
  { ground, physicalNumber: present, outliers }: MachineTimes,
): LoggedTimeDto {
  const { id, areas, pausesS, seconds, counts, profileNumber, reason, loggedByName, createdAt } = time;
  return {
    ...{ id, runCode, couponCode, address, pausesS, seconds, counts, profileNumber, replaced, reason },
    areas: areas.map((area) => ({ ...area })),
    isOfPresentMachine: physicalNumber === present,
    isOutlier: outliers.has(id),
    predicted: markTime({ areas, pausesS }, ground),
    loggedBy: loggedByName,
    loggedAt: createdAt.toISOString(),
  };
}
