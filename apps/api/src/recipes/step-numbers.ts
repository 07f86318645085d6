import {
  type DoseCaution,
  type MarkStep,
  type Panel,
  type PhysicalProfile,
  type SettingNumber,
  settingNumbers,
} from '@proofplate/recipe-model';
import type { DerivedNumberDto, StepNumbersDto } from './dto/derived-number.dto';

/** Machine and lens that a setting is for, as one revision knows them. */
export type NumbersOn = {
  readonly physical: PhysicalProfile;
  readonly panel: Panel;
  readonly optics: { readonly focalLengthMm: number; readonly measuredSpotUm: number | null };
};
export type RevisionNumbers = { readonly derived: StepNumbersDto[]; readonly derivedTotals: DerivedNumberDto[] };

/** Numbers that follow from mark steps on the machine and lens of their recipe, per step and in total. */
export function revisionNumbers(
  steps: readonly MarkStep[],
  { physical, panel, optics }: NumbersOn,
  doseCaution: DoseCaution | null = null,
): RevisionNumbers {
  const ground = { optics: { physical, ...optics }, panel, doseCaution };
  const settings = steps.map(({ parameters }) => parameters);
  const { steps: each, totals } = settingNumbers(settings, ground);
  return {
    derived: each.map(({ numbers, remarks }, index) => ({ step: index + 1, numbers: numbers.map(toDto), remarks: [...remarks] })),
    derivedTotals: totals.map(toDto),
  };
}

function toDto({ key, unit, formula, source, lookAt, ...number }: SettingNumber): DerivedNumberDto {
  const described = { key, unit, formula, source, lookAt: [...lookAt] };
  if (number.missingBecause !== undefined) {
    const { missingBecause, isRuledOutByMode } = number;
    return { ...described, value: null, missingBecause, isRuledOutByMode, inputs: {} };
  }
  return { ...described, value: number.value, missingBecause: null, isRuledOutByMode: false, inputs: { ...number.inputs } };
}
