import type { CraterPoint } from './craters.api';

/** Cells that the line leaves out by their reason, in the order of the first of each: "B1, B2" and why. */
export function leftOutByReason(points: readonly CraterPoint[]): { readonly reason: string; readonly addresses: readonly string[] }[] {
  const groups = new Map<string, string[]>();
  for (const { address, excludedBecause } of points) {
    if (excludedBecause === null) continue;
    groups.set(excludedBecause, [...(groups.get(excludedBecause) ?? []), address]);
  }
  return [...groups].map(([reason, addresses]) => ({ reason, addresses }));
}
