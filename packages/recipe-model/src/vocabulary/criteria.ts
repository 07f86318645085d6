import type { MeasurementQuantity } from './measurements';

export type Comparison = 'at least' | 'at most' | 'between';

/** An acceptance criterion, recorded before inspection. `upper` belongs to 'between' only. */
export type Criterion = { quantity: MeasurementQuantity; comparison: Comparison; value: number; upper?: number; unit: string };

export const COMPARISON_LABELS: Readonly<Record<Comparison, string>> = { 'at least': 'at least', 'at most': 'at most', between: 'between' };
export const COMPARISONS: readonly Comparison[] = ['at least', 'at most', 'between'];
