import { emptyPlan, type PlanValues } from './plan-values';

const KEY = 'proofplate.plan.';

/** Whose plan it is: two people at one tablet, or one person in two shops, never see each other's. */
export const planKey = (ids: { shopId: string; memberId: string; from: string | undefined }): string =>
  [ids.shopId, ids.memberId, ids.from ?? ''].join('.');

/** What was typed into a plan that was not saved yet; kept in this tab only, so that Back and a reload lose nothing. */
export function keptPlan(key: string): PlanValues | undefined {
  try {
    const stored: unknown = JSON.parse(sessionStorage.getItem(KEY + key) ?? 'null');
    return isPlan(stored) ? stored : undefined;
  } catch {
    return undefined;
  }
}

export function keepPlan(key: string, values: PlanValues | undefined): void {
  try {
    if (values === undefined) sessionStorage.removeItem(KEY + key);
    else sessionStorage.setItem(KEY + key, JSON.stringify(values));
  } catch {
    // Without storage the plan holds until the page is left.
  }
}

/** Kept by an earlier release it may lack a field; then it is not the form's any more. */
function isPlan(stored: unknown): stored is PlanValues {
  return hasShapeOf(emptyPlan(), stored);
}

function hasShapeOf(wanted: unknown, stored: unknown): boolean {
  if (typeof stored !== typeof wanted || stored === null) return false;
  if (typeof wanted !== 'object' || wanted === null) return true;
  if (Array.isArray(wanted)) return Array.isArray(stored);
  return Object.entries(wanted).every(([name, value]) => hasShapeOf(value, Reflect.get(Object(stored), name)));
}
