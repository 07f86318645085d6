import type { MarkingOverheads } from '@proofplate/physics';
import { type HeadDelays, headOverheads, overheadsFromMarks, type PhysicalProfile, type TimeGround } from '@proofplate/recipe-model';
import type { LoggedTimeView } from './logged-times.repository';

export type MachineTimes = {
  readonly ground: TimeGround;
  readonly physicalNumber: number;
  /** Ids of logged times that stand apart from the others. */
  readonly outliers: ReadonlySet<string>;
};

/** Overheads that hold for a machine, from its profile in force and the times that count. */
export function machineTimes(
  { physical, physicalNumber }: { physical: PhysicalProfile; physicalNumber: number },
  logged: readonly LoggedTimeView[],
): MachineTimes {
  const counted = logged.filter((view) => view.time.counts && view.physicalNumber === physicalNumber).map(({ time }) => time);
  const fit = overheadsFromMarks(counted, physical.jumpSpeedMmPerS);
  return {
    ground: { physical: delaysOf(physical), overheads: headOverheads(physical, fit) },
    physicalNumber,
    outliers: new Set(counted.filter((_, index) => isOutlier(fit, index)).map(({ id }) => id)),
  };
}

const isOutlier = (fit: MarkingOverheads, index: number) => fit.kind === 'fitted' && fit.marks[index]?.isOutlier === true;

function delaysOf({ accelerationMmPerS2, laserOnDelayUs, laserOffDelayUs, jumpSettleMs }: PhysicalProfile): HeadDelays {
  const given = Object.entries({ accelerationMmPerS2, laserOnDelayUs, laserOffDelayUs, jumpSettleMs }).filter(
    ([, value]) => value !== undefined,
  );
  return Object.fromEntries(given);
}
