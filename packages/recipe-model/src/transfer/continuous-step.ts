import { continuousTransfer } from '@proofplate/physics';
import { nearestByDose } from './nearest-by-dose';
import { propose, stepReasons } from './propose';
import type { StepFindings } from './pulsed-step';
import type { StepAbout } from './step-about';
import type { TargetFocus } from './target-focus';
import { isContinuousPlace, topSpeed } from './target-limits';
import type { TransferReason } from './transfer-ground';

const SAME = 1e-9;

/** A continuous step on the target. Nothing is left to choose: power, speed and spacing follow from the spot. */
export function continuousStep(about: StepAbout, focus: TargetFocus): StepFindings {
  const { numbers, target } = about;
  if (!isContinuousPlace(target))
    return { outcome: 'not equivalent', reasons: [otherMode(target.machineName)], interval: null, proposal: null };
  const speed = topSpeed(target);
  if (speed.value === undefined) return { outcome: 'not known', reasons: speed.reasons, interval: null, proposal: null };
  const lineSpacingUm = numbers.lineSpacingUm ?? numbers.spotUm;
  const { powerW, speedMmPerS, spotUm: spotDiameterUm } = numbers;
  const wanted = continuousTransfer({ powerW, speedMmPerS, lineSpacingUm, spotDiameterUm }, focus.spotUm);
  const limits = { maxPowerW: target.profile.ratedPowerW, maxSpeedMmPerS: speed.value, pulsed: null };
  const above = [
    ...exceeds('power above limit', `${shown(wanted.powerW)} W`, wanted.powerW / limits.maxPowerW, `${shown(limits.maxPowerW)} W`),
    ...exceeds('speed above limit', `${shown(wanted.speedMmPerS)} mm/s`, wanted.speedMmPerS / speed.value, `${shown(speed.value)} mm/s`),
  ];
  if (above.length > 0) {
    const nearest = nearestByDose(about, focus, limits);
    return { outcome: 'not equivalent', reasons: [...above, ...(nearest.reasons ?? [])], interval: null, proposal: nearest.value ?? null };
  }
  const spacing = numbers.lineSpacingUm === null ? null : wanted.lineSpacingUm;
  const beam = { frequencyKhz: null, pulseWidthNs: null };
  const proposed = propose({ ...beam, powerW: wanted.powerW, speedMmPerS: wanted.speedMmPerS, lineSpacingUm: spacing, focus }, about);
  if (proposed.value === undefined) return { outcome: 'not known', reasons: proposed.reasons, interval: null, proposal: null };
  const reasons = stepReasons(proposed.value, target);
  return { outcome: reasons.length === 0 ? 'equivalent' : 'not equivalent', reasons, interval: null, proposal: proposed.value };
}

function exceeds(code: TransferReason['code'], asked: string, share: number, limit: string): TransferReason[] {
  return share <= 1 + SAME ? [] : [{ code, text: `The spot asks for ${asked}; the machine gives at most ${limit}.` }];
}

const otherMode = (machineName: string): TransferReason => ({
  code: 'beam mode',
  text: `${machineName} is pulsed. A mark of a continuous beam is not carried over to it by these numbers.`,
});

const shown = (value: number) => String(Number(value.toPrecision(3)));
