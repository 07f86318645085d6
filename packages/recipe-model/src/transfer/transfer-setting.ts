import type { MarkStep } from '../vocabulary/setting';
import { continuousStep } from './continuous-step';
import { pulsedStep } from './pulsed-step';
import { sourceNumbers } from './step-numbers';
import { targetFocus } from './target-focus';
import type {
  TransferChoice,
  TransferInput,
  TransferOutcome,
  TransferPlace,
  TransferReason,
  TransferResult,
  TransferStep,
} from './transfer-ground';

/** Sources of one kind are sold with wavelengths this far apart; beyond it the material takes up another share. */
const SAME_WAVELENGTH = 0.01;

/**
 * A whole setting carried to another machine or lens: what is kept, on which frequencies, and what its panel would show.
 *          pulsed: pulsedTransfer within the target's limits; continuous: continuousTransfer; else what doseTransfer gives, not equivalent
 *
 * @param input.steps    mark steps of the source, as stored
 * @param input.source   machine and lens of the source: profile, panel, optics, power tables
 * @param input.target   the same of the target
 * @param input.choices  frequency kHz and focus offset mm by step, where somebody chose them
 * @returns by step the outcome with every reason, the interval and the proposal; a missing spot, M², power table, pulse width or limit
 *          of either side gives a reason that says where to enter it, never a number
 * @throws RangeError if a power table's points are too few or not in order
 * Valid for the same material, wavelength (within 1 %) and pulse width; the result is a proposal that needs a coupon.
 * Source: docs/science/transfer.md
 */
export function transferSetting({ steps, source, target, choices = [] }: TransferInput): TransferResult {
  const wavelength = wavelengthReason(source, target);
  if (wavelength !== undefined) return { outcome: 'not equivalent', reasons: [wavelength], steps: [], calibrationId: null };
  const found = steps.map((step, index) => transferStep(step, index + 1, { source, target, choice: choices[index] ?? {} }));
  const calibrationIds = [...new Set(found.flatMap(({ proposal }) => (proposal === null ? [] : [proposal.calibrationId])))];
  const reasons = calibrationIds.length > 1 ? [severalTables()] : [];
  const outcome = reasons.length > 0 ? 'not known' : worst(found);
  return { outcome, reasons, steps: found, calibrationId: calibrationIds.length === 1 ? (calibrationIds[0] ?? null) : null };
}

/** True if every step has a proposal that one draft can hold. */
export function isDraftable({ steps, reasons, calibrationId }: TransferResult): boolean {
  return steps.length > 0 && reasons.length === 0 && calibrationId !== null && steps.every(({ proposal }) => proposal !== null);
}

type Places = { readonly source: TransferPlace; readonly target: TransferPlace; readonly choice: TransferChoice };

function transferStep(step: MarkStep, number: number, { source, target, choice }: Places): TransferStep {
  if (step.parameters.values.wobbleDiameterUm !== undefined)
    return { step: number, outcome: 'not equivalent', reasons: [wobble()], source: null, interval: null, proposal: null };
  const before = sourceNumbers(step, source);
  const focus = targetFocus(step, { source, target }, choice);
  if (before.value === undefined || focus.value === undefined) {
    const reasons = distinct([...(before.reasons ?? []), ...(focus.reasons ?? [])]);
    return { step: number, outcome: 'not known', reasons, source: before.value ?? null, interval: null, proposal: null };
  }
  const numbers = before.value;
  const about = { step, numbers, source, target, choice };
  const findings =
    numbers.frequencyKhz === null || numbers.pulseWidthNs === null
      ? continuousStep(about, focus.value)
      : pulsedStep(about, focus.value, numbers.frequencyKhz, numbers.pulseWidthNs);
  return { step: number, source: numbers, ...findings, reasons: distinct(findings.reasons) };
}

function wavelengthReason({ profile: from }: TransferPlace, { profile: to, machineName }: TransferPlace): TransferReason | undefined {
  if (Math.abs(to.wavelengthNm - from.wavelengthNm) <= SAME_WAVELENGTH * from.wavelengthNm) return undefined;
  const text = `${machineName} works at ${to.wavelengthNm} nm, the source at ${from.wavelengthNm} nm. The material takes up another share of another wavelength, so these numbers carry nothing over. Plan a coupon there.`;
  return { code: 'wavelength', text };
}

const ORDER: readonly TransferOutcome[] = ['not known', 'not equivalent', 'equivalent'];
const worst = (steps: readonly TransferStep[]): TransferOutcome =>
  ORDER.find((outcome) => steps.some((step) => step.outcome === outcome)) ?? 'not known';

const wobble = (): TransferReason => ({
  code: 'wobble',
  text: 'The line is swung in circles: pitch, overlap and dose follow its true path, which these numbers do not describe.',
});

const severalTables = (): TransferReason => ({
  code: 'several calibrations',
  text: 'The steps need different power tables, and a revision cites one. Choose frequencies that one table holds for.',
});

function distinct(reasons: readonly TransferReason[]): TransferReason[] {
  return reasons.filter(({ text }, index) => reasons.findIndex((other) => other.text === text) === index);
}
