import { isMeasuredThere } from '../power/work-power';
import type { MarkStep } from '../vocabulary/setting';
import { dialIn, outsideTable, type Wanted } from './dial-in';
import { calibratedWatts, keptNumbers, noTable, timeRatioOf } from './step-numbers';
import type { TargetFocus } from './target-focus';
import type {
  Found,
  PulsedOrNot,
  TransferCalibration,
  TransferNumbers,
  TransferPlace,
  TransferProposal,
  TransferReason,
} from './transfer-ground';

/** A kept number may move this far by the panel's steps; beyond it the mark is another one. */
export const PANEL_STEP_TOLERANCE = 0.05;

export type WantedMark = PulsedOrNot & {
  readonly powerW: number;
  readonly speedMmPerS: number;
  readonly lineSpacingUm: number | null;
  readonly focus: TargetFocus;
};

/**
 * Wanted physical values as a proposal on the target's panel, with what its steps do to the kept numbers.
 *
 * @param wanted  power W, speed mm/s, frequency kHz, pulse width ns, spacing um, focus
 * @param about   step and numbers of the source, target place
 * @returns the proposal, or why the panel or the power tables give none
 * Source: docs/science/transfer.md
 */
export function propose(
  wanted: WantedMark,
  { step, numbers, target }: { readonly step: MarkStep; readonly numbers: TransferNumbers; readonly target: TransferPlace },
): Found<TransferProposal> {
  const { parameters: template } = step;
  const values = valuesFor(wanted, step, target);
  const conditions = conditionsOf(wanted, target);
  const calibration = target.calibrations.find((table) => holdsAt(table, conditions, wanted.powerW));
  if (calibration === undefined) return { reasons: [missingTable(target, conditions, wanted.powerW)] };
  const dialled = dialIn(target, values, { calibration, template });
  if (dialled.value === undefined) return dialled;
  const { parameters, leftOut } = dialled.value;
  const measured = calibratedWatts({ ...target, calibrations: [calibration] }, parameters.values);
  if (measured === undefined) return { reasons: [missingTable(target, conditions, wanted.powerW)] };
  const shown = parameters.values;
  const after: TransferNumbers = {
    spotUm: wanted.focus.spotUm,
    powerW: measured.watts,
    speedMmPerS: shown.speedMmPerS?.physical ?? wanted.speedMmPerS,
    frequencyKhz: shown.frequencyKhz?.physical ?? wanted.frequencyKhz,
    pulseWidthNs: wanted.pulseWidthNs,
    lineSpacingUm: wanted.lineSpacingUm === null ? null : (shown.lineSpacingUm?.physical ?? wanted.lineSpacingUm),
    scans: numbers.scans,
  };
  if (after.powerW <= 0) return { reasons: [tooCoarse(target)] };
  const kept = keptNumbers(numbers, after);
  return { value: { parameters, numbers: after, kept, timeRatio: timeRatioOf(numbers, after), calibrationId: calibration.id, leftOut } };
}

/** The kept numbers that the panel's steps move too far. */
export function stepReasons({ kept }: TransferProposal, { machineName }: TransferPlace): TransferReason[] {
  return kept
    .filter(({ deviation }) => Math.abs(deviation) > PANEL_STEP_TOLERANCE)
    .map(({ label, deviation }) => {
      const percent = `${deviation > 0 ? '+' : '−'}${(Math.abs(deviation) * 100).toFixed(1)} %`;
      return { code: 'panel steps', text: `${label} comes out ${percent} by the steps of the panel of ${machineName}.` };
    });
}

function valuesFor({ powerW, speedMmPerS, lineSpacingUm, focus, ...beam }: WantedMark, step: MarkStep, target: TransferPlace): Wanted {
  const { passes, hatchAngleDeg, angleStepDeg } = step.parameters.values;
  const { frequencyKhz, pulseWidthNs } = conditionsOf(beam, target);
  return {
    ...{ powerW, speedMmPerS, focusOffsetMm: focus.focusOffsetMm, passes: passes?.physical ?? 1 },
    ...(frequencyKhz === null ? {} : { frequencyKhz }),
    ...(pulseWidthNs === null ? {} : { pulseWidthNs }),
    ...(lineSpacingUm === null ? {} : { lineSpacingUm }),
    ...(hatchAngleDeg === undefined ? {} : { hatchAngleDeg: hatchAngleDeg.physical }),
    ...(angleStepDeg === undefined ? {} : { angleStepDeg: angleStepDeg.physical }),
  };
}

/** What the panel sets of the beam: a source with one pulse width has no field for it, and its tables name none. */
export function conditionsOf({ frequencyKhz, pulseWidthNs }: PulsedOrNot, { panel }: TransferPlace): PulsedOrNot {
  const setsWidth = panel.fields.some(({ parameter }) => parameter === 'pulseWidthNs');
  return { frequencyKhz, pulseWidthNs: setsWidth ? pulseWidthNs : null };
}

function holdsAt(table: TransferCalibration, { frequencyKhz, pulseWidthNs }: PulsedOrNot, powerW: number): boolean {
  const watts = table.points.map((point) => point.powerW);
  return isMeasuredThere(table, frequencyKhz, pulseWidthNs) && powerW >= Math.min(...watts) && powerW <= Math.max(...watts);
}

/** Which table is missing: one at these conditions, or one that reads as far as these watts. */
function missingTable(target: TransferPlace, { frequencyKhz, pulseWidthNs }: PulsedOrNot, powerW: number): TransferReason {
  const table = target.calibrations.find((known) => isMeasuredThere(known, frequencyKhz, pulseWidthNs));
  return table === undefined ? noTable(target, { frequencyKhz, pulseWidthNs }, 'target') : outsideTable(target, powerW, table);
}

const tooCoarse = ({ machineName }: TransferPlace): TransferReason => ({
  code: 'panel steps',
  text: `The panel of ${machineName} has no step between zero and more than the power that is needed.`,
});
