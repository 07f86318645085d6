import { type PulsedTarget, type PulsedTransfer, pulsedTransfer } from '@proofplate/physics';
import { chosenFrequency, frequencyInterval, isInside } from './frequency-interval';
import { nearestByDose } from './nearest-by-dose';
import { propose, stepReasons } from './propose';
import type { StepAbout } from './step-about';
import type { TargetFocus } from './target-focus';
import { isContinuousPlace, nearestWidthNs, pulsedLimits, widthOnPlace } from './target-limits';
import type { FrequencyInterval, TransferReason, TransferStep } from './transfer-ground';

export type StepFindings = Omit<TransferStep, 'step' | 'source'>;

const nothing = { interval: null, proposal: null };

/** A pulsed step on the target: the interval of frequencies, the proposal in it, or why there is none and what comes nearest. */
export function pulsedStep(about: StepAbout, focus: TargetFocus, frequencyKhz: number, pulseWidthNs: number): StepFindings {
  const { target, numbers } = about;
  if (isContinuousPlace(target)) return { ...nothing, outcome: 'not equivalent', reasons: [otherMode(target.machineName)] };
  const width = widthOnPlace(target, pulseWidthNs);
  if (width.value === undefined) return { ...nothing, outcome: 'not known', reasons: width.reasons };
  if (!width.value) return otherWidth(about, focus, pulseWidthNs);
  const found = pulsedLimits(target, pulseWidthNs);
  if (found.value === undefined) return { ...nothing, outcome: 'not known', reasons: found.reasons };
  const limits: PulsedTarget = { ...found.value, spotDiameterUm: focus.spotUm };
  // an outline has no lines beside each other: any spacing serves, and nothing of it is used
  const lineSpacingUm = numbers.lineSpacingUm ?? numbers.spotUm;
  const { powerW, speedMmPerS, spotUm } = numbers;
  const transfer = pulsedTransfer({ powerW, frequencyKhz, speedMmPerS, spotDiameterUm: spotUm, lineSpacingUm }, limits);
  const setsWidth = target.panel.fields.some(({ parameter }) => parameter === 'pulseWidthNs');
  const interval = frequencyInterval(transfer, limits, {
    sourceKhz: frequencyKhz,
    target,
    pulseWidthNs: setsWidth ? pulseWidthNs : null,
  });
  if (!transfer.solvable) {
    const nearest = nearestByDose(about, focus, { ...limits, pulsed: { ...limits, pulseWidthNs } });
    const reasons = [whyNone({ transfer, limits, interval, machineName: target.machineName }), ...(nearest.reasons ?? [])];
    return { outcome: 'not equivalent', reasons, interval, proposal: nearest.value ?? null };
  }
  return inInterval(about, focus, { transfer, interval, pulseWidthNs });
}

function inInterval(
  about: StepAbout,
  focus: TargetFocus,
  { transfer, interval, pulseWidthNs }: { transfer: PulsedTransfer; interval: FrequencyInterval; pulseWidthNs: number },
): StepFindings {
  const { numbers, target, choice } = about;
  const { lowestKhz: fromKhz, highestKhz: toKhz, sourceKhz } = interval;
  const { frequencyKhz: chosen } = choice;
  if (chosen !== undefined && !isInside(chosen, fromKhz, toKhz)) {
    const text = `${shown(chosen)} kHz lies outside of ${shown(fromKhz)} to ${shown(toKhz)} kHz. Choose a frequency inside.`;
    return { outcome: 'not known', reasons: [{ code: 'frequency outside interval', text }], interval, proposal: null };
  }
  const bands = chosen === undefined ? interval.calibrated : [];
  const khz = chosenFrequency(bands, { sourceKhz: chosen ?? sourceKhz, fromKhz, toKhz }, target);
  const proposed = propose(
    {
      ...{ frequencyKhz: khz, pulseWidthNs, focus },
      powerW: transfer.pulseEnergyMj * khz,
      speedMmPerS: transfer.pitchUm * khz,
      lineSpacingUm: numbers.lineSpacingUm === null ? null : transfer.lineSpacingUm,
    },
    about,
  );
  if (proposed.value === undefined) return { outcome: 'not known', reasons: proposed.reasons, interval, proposal: null };
  const reasons = stepReasons(proposed.value, target);
  return { outcome: reasons.length === 0 ? 'equivalent' : 'not equivalent', reasons, interval, proposal: proposed.value };
}

/** Another pulse width is outside of any scaling; the dose is all that can be carried over. */
function otherWidth(about: StepAbout, focus: TargetFocus, pulseWidthNs: number): StepFindings {
  const { target } = about;
  const widths = target.profile.pulseWidthsNs ?? [];
  const has = widths.length === 0 ? '' : ` It has ${widths.join(', ')} ns.`;
  const text = `${target.machineName} has no pulse width of ${pulseWidthNs} ns.${has} These numbers do not carry a mark over to another pulse width.`;
  const reason: TransferReason = { code: 'pulse width', text };
  const widthNs = nearestWidthNs(target, pulseWidthNs);
  const limits = widthNs === undefined ? undefined : pulsedLimits(target, widthNs);
  if (widthNs === undefined || limits?.value === undefined)
    return { ...nothing, outcome: 'not equivalent', reasons: [reason, ...(limits?.reasons ?? [])] };
  const nearest = nearestByDose(about, focus, { ...limits.value, pulsed: { ...limits.value, pulseWidthNs: widthNs } });
  return { ...nothing, outcome: 'not equivalent', reasons: [reason, ...(nearest.reasons ?? [])], proposal: nearest.value ?? null };
}

type Empty = { transfer: PulsedTransfer; limits: PulsedTarget; interval: FrequencyInterval; machineName: string };

function whyNone({ transfer, limits, interval: { endsBy, highestKhz }, machineName }: Empty): TransferReason {
  const energy = `${shown(transfer.pulseEnergyMj)} mJ`;
  if (transfer.solvable || transfer.reason === 'pulse energy above limit') {
    const text = `The spot asks for pulses of ${energy}; ${machineName} gives at most ${shown(limits.maxPulseEnergyMj)} mJ at this pulse width.`;
    return { code: 'pulse energy above limit', text };
  }
  const by = { 'rated power': `the rated ${shown(limits.maxPowerW)} W`, 'scan speed': 'the top speed', 'frequency range': 'its range' };
  const text = `With pulses of ${energy}, ${by[endsBy]} ends the frequencies at ${shown(highestKhz)} kHz, below the ${shown(limits.minFrequencyKhz)} kHz where ${machineName} begins.`;
  return { code: 'frequency interval empty', text };
}

const otherMode = (machineName: string): TransferReason => ({
  code: 'beam mode',
  text: `${machineName} sets no pulse frequency. A pulsed mark is not carried over to it by these numbers.`,
});

const shown = (value: number) => String(Number(value.toPrecision(3)));
