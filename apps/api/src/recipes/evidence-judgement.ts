import {
  type Criterion,
  criterionText,
  type MarkStep,
  meetsCriterion,
  type ParameterSet,
  type SettingChange,
  settingDiff,
} from '@proofplate/recipe-model';
import type { StoredMeasurement } from './stored-revision';

export type CriterionResult = {
  readonly criterion: Criterion;
  readonly text: string;
  readonly value: number | null;
  readonly method: string | null;
  readonly meets: boolean;
};

type Measured = Pick<StoredMeasurement, 'quantity' | 'value' | 'grade' | 'unit' | 'method'>;

const GRADE_VALUES: Readonly<Record<string, number>> = { A: 4, B: 3, C: 2, D: 1, F: 0 };

/**
 * Each criterion with the value that counts: an instrument's reading before an estimate from a photo, the newest first. What was not
 * measured, or in another unit, is not met. A code grade counts from a verifier only.
 */
export function criterionResults(criteria: readonly Criterion[], newestFirst: readonly Measured[]): CriterionResult[] {
  return criteria.map((criterion) => {
    const fitting = newestFirst.filter((measured) => counts(measured, criterion) && measuredValue(measured) !== null);
    const chosen = fitting.find(({ method }) => method !== 'photo') ?? fitting[0];
    const value = chosen === undefined ? null : measuredValue(chosen);
    return {
      criterion,
      text: criterionText(criterion),
      value,
      method: chosen?.method ?? null,
      meets: value !== null && meetsCriterion(criterion, value),
    };
  });
}

/** True if there are criteria and every one is met; null without any. */
export function meetsAll(results: readonly CriterionResult[]): boolean | null {
  return results.length === 0 ? null : results.every(({ meets }) => meets);
}

/**
 * Labels of the essential parameters in which a mark differs from a setting. A cell holds one mark step; of a setting with several
 * steps it is compared with the step that it is nearest to.
 */
export function essentialDifferences(
  parameters: ParameterSet,
  steps: readonly MarkStep[],
  unknownFields: readonly string[] = [],
): string[] {
  const [nearest] = steps
    .map((step) => settingDiff(step.parameters, parameters).filter((change) => change.class === 'essential'))
    .sort((one, other) => one.length - other.length);
  if (nearest === undefined) return ['No mark step is set'];
  return [...nearest.map(({ label }) => label), ...unknownEssentials(nearest, unknownFields)];
}

/** The mark steps, from 0, that have exactly these essential parameters. */
export function stepsMarkedBy(parameters: ParameterSet, steps: readonly MarkStep[]): number[] {
  return steps.flatMap((step, index) =>
    settingDiff(step.parameters, parameters).some((change) => change.class === 'essential') ? [] : [index],
  );
}

/** The value that counts for a quantity: an instrument's before a photo's, the newest first; null where none was measured. */
export function newestOf(newestFirst: readonly Measured[], quantity: string, unit: string): number | null {
  const fitting = newestFirst.filter(
    (measured) => measured.quantity === quantity && measured.unit === unit && measuredValue(measured) !== null,
  );
  const chosen = fitting.find(({ method }) => method !== 'photo') ?? fitting[0];
  return chosen === undefined ? null : measuredValue(chosen);
}

function counts({ quantity, unit, method }: Measured, criterion: Criterion): boolean {
  if (quantity !== criterion.quantity || unit !== criterion.unit) return false;
  return quantity !== 'code-grade' || method === 'verifier';
}

function measuredValue({ value, grade }: Measured): number | null {
  if (value !== null) return value;
  return grade === null ? null : (GRADE_VALUES[grade.trim().toUpperCase()] ?? null);
}

/** On a plate burnt earlier a placeholder may stand where nobody knows the fill any more. */
function unknownEssentials(nearest: readonly SettingChange[], unknownFields: readonly string[]): string[] {
  const isUnknown = unknownFields.includes('fill') && nearest.every(({ item }) => item !== 'fill');
  return isUnknown ? ['Fill (not known)'] : [];
}
