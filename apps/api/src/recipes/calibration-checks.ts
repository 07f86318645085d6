import { type MeasuredCalibration, workPower } from '@proofplate/recipe-model';
import { type ApprovalCheck, check } from './approval-check';
import type { ApprovalFacts } from './approval-facts';
import type { RevisionCalibration, RevisionRecord } from './stored-revision';

const MS_PER_DAY = 24 * 60 * 60 * 1000;

/** Only where a setting was proved on coupons do its watts carry the proof; elsewhere an old or missing calibration is shown. */
export function calibrationCheck({ record, policy, now }: ApprovalFacts): ApprovalCheck {
  const { calibration } = record;
  const isAdvisory = record.revision.route !== 'coupons';
  if (calibration === null) {
    return check('calibration', 'Power calibration', {
      passes: false,
      isAdvisory,
      found: 'None is cited.',
      wayOut: 'Measure the power on the machine and cite the reading.',
    });
  }
  const ageDays = ageInDays(calibration, now);
  const passes = ageDays <= policy.calibrationAgeDays;
  return check('calibration', 'Power calibration', {
    passes,
    isAdvisory,
    found: `Read ${calibration.measuredOn}, ${ageDays} days old, limit ${policy.calibrationAgeDays}.`,
    wayOut: 'Measure the power again and cite the new reading.',
  });
}

/** A newer reading that moves the watts of a step by more than the policy allows: the recipe is due for a check. */
export function powerShiftCheck(facts: ApprovalFacts): ApprovalCheck[] {
  const { record, newestCalibration, policy } = facts;
  if (newestCalibration === null || record.calibration === null || newestCalibration.id === record.calibration.id) return [];
  const shift = largestShiftPercent(record, newestCalibration);
  if (shift === null) return [];
  return [
    check('power-shift', 'Power since the calibration', {
      passes: shift <= policy.powerShiftPercent,
      isAdvisory: true,
      found: `The reading of ${newestCalibration.measuredOn} moves the watts by ${shift.toFixed(1)} %, limit ${policy.powerShiftPercent} %.`,
      wayOut: 'Check the recipe on the machine.',
    }),
  ];
}

/** Largest change of a step's watts between the cited and the newest reading; null where a reading does not reach the setting. */
export function largestShiftPercent(
  record: Pick<RevisionRecord, 'profile' | 'revision' | 'calibration'>,
  newest: RevisionCalibration,
): number | null {
  const { profile, revision, calibration } = record;
  if (calibration === null) return null;
  const shifts = revision.content.steps.flatMap(({ parameters: { values: parameters } }) => {
    const before = workPower({ profile: profile.physical, calibration: asMeasured(calibration), parameters });
    const after = workPower({ profile: profile.physical, calibration: asMeasured(newest), parameters });
    const isComparable = before.watts !== null && after.watts !== null && before.basis === 'calibration' && after.basis === 'calibration';
    return isComparable && before.watts > 0 ? [(Math.abs(after.watts - before.watts) / before.watts) * 100] : [];
  });
  return shifts.length === 0 ? null : Math.max(...shifts);
}

/** A stored reading as the model takes it. */
export function asMeasured({ points, frequencyKhz, pulseWidthNs }: RevisionCalibration): MeasuredCalibration {
  return { points: points.map(({ percent, watts }) => ({ percent, powerW: watts })), frequencyKhz, pulseWidthNs };
}

/** Whole days between the day of the reading and now. */
const ageInDays = ({ measuredOn }: RevisionCalibration, now: Date) =>
  Math.max(0, Math.floor((now.getTime() - new Date(`${measuredOn}T00:00:00Z`).getTime()) / MS_PER_DAY));
