import { doseTransfer } from '@proofplate/physics';
import { isMeasuredThere } from '../power/work-power';
import { calibratedBands, chosenFrequency, clamp } from './frequency-interval';
import { conditionsOf, propose } from './propose';
import type { StepAbout } from './step-about';
import type { TargetFocus } from './target-focus';
import type { Found, TransferProposal } from './transfer-ground';

const UM_PER_MM = 1000;

/** What the target can do at most; a continuous beam has neither pulses nor a frequency. */
export type DoseLimits = {
  readonly maxPowerW: number;
  readonly maxSpeedMmPerS: number;
  readonly pulsed: {
    readonly pulseWidthNs: number;
    readonly maxPulseEnergyMj: number;
    readonly minFrequencyKhz: number;
    readonly maxFrequencyKhz: number;
  } | null;
};

/**
 * What comes nearest where no setting keeps the numbers: the energy per area and nothing else.
 *          h2 = h1 d2/d1; P2 = min(P1 (d2/d1)², limits); v2 = n P2 / (dose h2), slower power where v2 exceeds the top speed
 *
 * @param about   step, source numbers, target place
 * @param focus   surface and 1/e² spot on the target, um
 * @param limits  W, mm/s, mJ, kHz of the target at the pulse width that it would use
 * @returns a proposal that is never equivalent, or why there is none
 * Valid as an energy balance only; fluence and overlaps change.
 * Source: docs/science/transfer.md
 */
export function nearestByDose(about: StepAbout, focus: TargetFocus, limits: DoseLimits): Found<TransferProposal> {
  const { numbers } = about;
  const ratio = focus.spotUm / numbers.spotUm;
  const frequencyKhz = limits.pulsed === null ? null : nearestFrequency(about, limits.pulsed);
  const beam = { frequencyKhz, pulseWidthNs: limits.pulsed?.pulseWidthNs ?? null };
  const measuredW = highestMeasuredW(about, beam);
  const byEnergyW = limits.pulsed === null || frequencyKhz === null ? limits.maxPowerW : limits.pulsed.maxPulseEnergyMj * frequencyKhz;
  const highestW = Math.min(numbers.powerW * ratio ** 2, limits.maxPowerW, byEnergyW, measuredW);
  // an outline has no spacing: the energy along the line takes the place of the dose
  const before = numbers.lineSpacingUm ?? UM_PER_MM;
  const spacingUm = numbers.lineSpacingUm === null ? UM_PER_MM : before * ratio;
  const { scans, powerW, speedMmPerS } = numbers;
  const dosed = doseTransfer({ powerW, speedMmPerS, lineSpacingUm: before, scans }, { powerW: highestW, lineSpacingUm: spacingUm, scans });
  const slowed = clamp(dosed.speedMmPerS, 0, limits.maxSpeedMmPerS);
  return propose(
    {
      ...beam,
      powerW: highestW * (slowed / dosed.speedMmPerS),
      speedMmPerS: slowed,
      lineSpacingUm: numbers.lineSpacingUm === null ? null : spacingUm,
      focus,
    },
    about,
  );
}

/** The frequency nearest to the source's that the target has, where a table holds if there is one. */
function nearestFrequency({ numbers, target }: StepAbout, pulsed: NonNullable<DoseLimits['pulsed']>): number {
  const { minFrequencyKhz: fromKhz, maxFrequencyKhz: toKhz } = pulsed;
  const { pulseWidthNs } = conditionsOf({ frequencyKhz: null, pulseWidthNs: pulsed.pulseWidthNs }, target);
  const bands = calibratedBands(target, { pulseWidthNs, fromKhz, toKhz });
  return chosenFrequency(bands, { sourceKhz: numbers.frequencyKhz ?? fromKhz, fromKhz, toKhz }, target);
}

/** The most that a table reads there; without a table nothing bounds it here, and propose() says that it is missing. */
function highestMeasuredW({ target }: StepAbout, beam: Parameters<typeof conditionsOf>[0]): number {
  const { frequencyKhz, pulseWidthNs } = conditionsOf(beam, target);
  const table = target.calibrations.find((known) => isMeasuredThere(known, frequencyKhz, pulseWidthNs));
  return table === undefined ? Number.POSITIVE_INFINITY : Math.max(...table.points.map((point) => point.powerW));
}
