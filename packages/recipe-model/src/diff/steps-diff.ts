import { STEP_PURPOSE_LABELS } from '../vocabulary/lists';
import type { MarkStep } from '../vocabulary/setting';
import { parameterClassOf, type ShopClasses } from './parameter-class';
import { numberChange, type SettingChange, settingDiff, wordChange } from './setting-diff';

/** One mark step of two revisions, by its place in the order; a step more or less is essential as a whole. */
export type StepChange = { step: number; change: 'added' | 'removed' | 'changed'; purpose: string; changes: SettingChange[] };

/**
 * Every difference between the mark steps of two revisions, step by step in their order.
 *
 * @param before      steps of the earlier revision
 * @param after       steps of the later revision
 * @param shopClasses classes that the shop tightened
 * @returns the steps that differ (numbered from 1); empty if the settings are the same
 */
export function stepsDiff(before: readonly MarkStep[], after: readonly MarkStep[], shopClasses: ShopClasses = {}): StepChange[] {
  const count = Math.max(before.length, after.length);
  return Array.from({ length: count }, (_, index) => stepChange(index, before[index], after[index], shopClasses)).filter(
    (change) => change !== null,
  );
}

/** True if a change between the two needs new confirmation: a step more or less, or an essential item that differs. */
export function hasEssentialChange(before: readonly MarkStep[], after: readonly MarkStep[], shopClasses: ShopClasses = {}): boolean {
  return stepsDiff(before, after, shopClasses).some(
    (step) => step.change !== 'changed' || step.changes.some((change) => change.class === 'essential'),
  );
}

function stepChange(index: number, before: MarkStep | undefined, after: MarkStep | undefined, shopClasses: ShopClasses): StepChange | null {
  const step = index + 1;
  if (before === undefined)
    return after === undefined ? null : { step, change: 'added', purpose: STEP_PURPOSE_LABELS[after.purpose], changes: [] };
  if (after === undefined) return { step, change: 'removed', purpose: STEP_PURPOSE_LABELS[before.purpose], changes: [] };
  const around = [
    wordChange('purpose', STEP_PURPOSE_LABELS[before.purpose], STEP_PURPOSE_LABELS[after.purpose]),
    numberChange('pauseAfterS', { before: before.pauseAfterS, after: after.pauseAfterS, symbol: 's' }),
  ]
    .filter((change) => change !== null)
    .map((change) => ({ ...change, class: parameterClassOf(change.item, shopClasses) }));
  const changes = [...settingDiff(before.parameters, after.parameters, shopClasses), ...around];
  return changes.length === 0 ? null : { step, change: 'changed', purpose: STEP_PURPOSE_LABELS[after.purpose], changes };
}
