import type { CheckResult } from './check-records';

/** Lines to print: counts for each formula, then every failure by name, then the totals. */
export function reportLines(results: readonly CheckResult[]): readonly string[] {
  const failed = results.filter((result) => result.failures.length > 0);
  return [
    ...[...groupByFormula(results)].map(([formula, group]) => countLine(formula, group)),
    ...failed.flatMap((result) => result.failures.map((failure) => `FAILED ${result.name}: ${failure}`)),
    `${results.length - failed.length} passed, ${failed.length} failed`,
  ];
}

function groupByFormula(results: readonly CheckResult[]): ReadonlyMap<string, readonly CheckResult[]> {
  const groups = new Map<string, CheckResult[]>();
  for (const result of results) groups.set(result.formula, [...(groups.get(result.formula) ?? []), result]);
  return groups;
}

function countLine(formula: string, group: readonly CheckResult[]): string {
  const passed = group.filter((result) => result.failures.length === 0).length;
  return `${passed} of ${group.length} passed  ${formula}`;
}
