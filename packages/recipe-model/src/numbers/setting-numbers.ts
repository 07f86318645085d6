import { type DerivedNumber, derivedNumbers } from '@proofplate/physics';
import type { Panel } from '../panel/panel';
import { showNumber } from '../panel/show-number';
import type { HeadOverheads } from '../time/head-overheads';
import { isAbove, largestPulseEnergyMj } from './machine-limits';
import type { AreaMm } from './mark-area';
import { markOfSetting, type NumberedSetting } from './mark-of-setting';
import type { Optics } from './optics';
import type { SettingNumber } from './setting-number';
import { type SettingRemark, settingRemarks } from './setting-remarks';
import { totalNumbers } from './total-numbers';

export type StepNumbers = { readonly numbers: readonly SettingNumber[]; readonly remarks: readonly SettingRemark[] };
export type SettingNumbers = { readonly steps: readonly StepNumbers[]; readonly totals: readonly SettingNumber[] };

/** Dose from which a material went wrong before, or that somebody set as the limit. */
export type DoseCaution = { readonly doseJPerMm2: number; readonly source: string };

export type NumbersGround = {
  readonly optics: Optics;
  /** What the machine can show; absent: nothing is said about it. */
  readonly panel?: Panel;
  readonly doseCaution?: DoseCaution | null;
  /** Filled rectangle, mm, where its marking time is asked for. */
  readonly areaMm?: AreaMm;
  /** Overheads that hold for the machine; absent: those of its profile. */
  readonly overheads?: HeadOverheads | undefined;
};

const SHOWN_DIGITS = 3;

/**
 * All numbers of a setting with 1 … n mark steps: those of each step, and totals over the steps where there are several.
 *
 * @param steps   mark steps in order, each as set, with reasons for what is not known
 * @param ground  machine, lens and spot; panel, dose caution and area where they are known
 * @returns per step the same keys in the same order, each a value with its inputs or the reason why there is none, and what to look at:
 *          validity of the formula, spots or lines that do not touch, energy above the source's, dose above the caution, values that the
 *          panel cannot show or the machine cannot do
 * @throws RangeError if a value is impossible in itself, such as negative power
 * Valid as each entry's formula; see its source.
 * Source: docs/science/beam.md, pulses.md, scanning.md, marking-time.md, work-power.md
 */
export function settingNumbers(steps: readonly NumberedSetting[], ground: NumbersGround): SettingNumbers {
  const each = steps.map((step) => stepNumbers(step, ground));
  const totals = totalNumbers(
    steps.map(({ fill }, index) => ({ fill, numbers: each[index].numbers })),
    (dose) => doseRemarks(dose, ground.doseCaution),
  );
  return { steps: each, totals };
}

/** Numbers of one mark step; see settingNumbers(). */
export function stepNumbers(step: NumberedSetting, ground: NumbersGround): StepNumbers {
  const { optics, panel, doseCaution, areaMm, overheads } = ground;
  const numbers = [
    workPowerNumber(step),
    ...derivedNumbers(markOfSetting(step, optics, areaMm === undefined ? undefined : { ...areaMm, overheads })),
  ];
  const pulseWidthNs = step.values.pulseWidthNs?.physical ?? null;
  const limitMj = step.unknownBecause?.pulseWidthNs === undefined ? largestPulseEnergyMj(optics.physical, pulseWidthNs) : null;
  return {
    numbers: numbers.map((derived) => ({ ...derived, lookAt: lookAtOf(derived, { limitMj, doseCaution, power: step.power }) })),
    remarks: settingRemarks(step.values, optics.physical, panel),
  };
}

function workPowerNumber({ power, values, unknownBecause = {} }: NumberedSetting): DerivedNumber {
  const described = { key: 'workPower', unit: 'W', source: 'docs/science/work-power.md' };
  const formula = 'from the power calibration, else p min(rated power, largest pulse energy × f)';
  const reason = unknownBecause.powerPercent ?? (power.watts === null ? power.reason : undefined);
  if (power.watts === null || reason !== undefined) return { ...described, formula, missingBecause: reason ?? '', isRuledOutByMode: false };
  const percent = values.powerPercent?.physical;
  return {
    ...described,
    formula:
      power.basis === 'calibration' ? 'read from the power calibration' : 'p min(rated power, largest pulse energy × f), not calibrated',
    value: power.watts,
    inputs: percent === undefined ? {} : { powerPercent: percent },
  };
}

type Limits = {
  readonly limitMj: number | null;
  readonly doseCaution?: DoseCaution | null | undefined;
  readonly power: NumberedSetting['power'];
};

function lookAtOf(derived: DerivedNumber, { limitMj, doseCaution, power }: Limits): string[] {
  if (derived.missingBecause !== undefined) return [];
  const { key, value, outOfRange } = derived;
  const remarks = outOfRange === undefined ? [] : [`Outside the formula’s range: ${outOfRange}.`];
  if (key === 'workPower' && power.watts !== null && power.basis === 'not calibrated')
    remarks.push('Not calibrated: what really reaches the work is known only from a power meter.');
  if (key === 'pulseOverlap' && value < 0)
    remarks.push('The spots do not touch along the line: bare ground stays between them. Lower the speed or raise the frequency.');
  if (key === 'lineOverlap' && value < 0)
    remarks.push('The lines do not touch: bare ground stays between them. Take a closer line spacing.');
  if (key === 'pulseEnergy' && limitMj !== null && isAbove(value, limitMj))
    remarks.push(
      `Above the source’s largest pulse energy at this pulse width, ${short(limitMj)} mJ: the mark will be weaker than the numbers say.`,
    );
  if (key === 'arealDose') remarks.push(...doseRemarks(value, doseCaution));
  return remarks;
}

function doseRemarks(doseJPerMm2: number, caution: DoseCaution | null | undefined): string[] {
  if (caution === null || caution === undefined || doseJPerMm2 < caution.doseJPerMm2) return [];
  return [`At or above ${short(caution.doseJPerMm2)} J/mm²: ${caution.source}.`];
}

const short = (value: number) => showNumber(Number(value.toPrecision(SHOWN_DIGITS)));
