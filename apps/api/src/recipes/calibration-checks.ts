import { type MeasuredCalibration, type PowerShift, powerShift } from '@proofplate/recipe-model';
import { type ApprovalCheck, check } from './approval-check';
import { type ApprovalFacts, provesOnCoupons } from './approval-facts';
import type { RevisionCalibration, RevisionHead } from './stored-revision';

const MS_PER_DAY = 24 * 60 * 60 * 1000;

/** Only where a setting was proved on coupons do its watts carry the proof; elsewhere an old or missing calibration is shown. */
export function calibrationCheck({ record, policy, now }: ApprovalFacts): ApprovalCheck {
  const { calibration } = record;
  const isAdvisory = !provesOnCoupons(record.revision.route);
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
export function powerShiftCheck({ record, readings, policy }: ApprovalFacts): ApprovalCheck[] {
  const shift = shiftSinceProof(record, readings);
  if (shift === null) return [];
  const { shiftPercent, measuredOn } = shift;
  return [
    check('power-shift', 'Power since the calibration', {
      passes: Math.abs(shiftPercent) <= policy.powerShiftPercent,
      isAdvisory: true,
      found: `The reading of ${measuredOn} moves the watts by ${shiftPercent.toFixed(1)} %, limit ${policy.powerShiftPercent} %.`,
      wayOut: 'Check the recipe on the machine.',
    }),
  ];
}

/** How far the source has moved under a revision since the reading that it cites; readings newest first. */
export function shiftSinceProof(
  { profile, revision, calibration }: Pick<RevisionHead, 'profile' | 'revision' | 'calibration'>,
  readings: readonly RevisionCalibration[],
): PowerShift | null {
  if (calibration === null) return null;
  const cited = readings.findIndex(({ id }) => id === calibration.id);
  return powerShift({
    profile: profile.physical,
    steps: revision.content.steps,
    cited: asMeasured(calibration),
    newer: readings.slice(0, Math.max(0, cited)).map((reading) => ({ ...asMeasured(reading), measuredOn: reading.measuredOn })),
  });
}

/** A stored reading as the model takes it. */
export function asMeasured({
  points,
  frequencyKhz,
  pulseWidthNs,
}: Pick<RevisionCalibration, 'points' | 'frequencyKhz' | 'pulseWidthNs'>): MeasuredCalibration {
  return { points: points.map(({ percent, watts }) => ({ percent, powerW: watts })), frequencyKhz, pulseWidthNs };
}

/** Whole days between the day of the reading and now. */
const ageInDays = ({ measuredOn }: RevisionCalibration, now: Date) =>
  Math.max(0, Math.floor((now.getTime() - new Date(`${measuredOn}T00:00:00Z`).getTime()) / MS_PER_DAY));
