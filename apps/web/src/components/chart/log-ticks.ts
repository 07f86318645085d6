const STEPS = [1, 2, 5];
const DECADE = 10;

/** 1, 2, 5, 10 … between two positive numbers, for an axis of equal ratios. */
export function logTicks(lowest: number, highest: number): number[] {
  if (!(lowest > 0) || !(highest >= lowest)) return [];
  const ticks: number[] = [];
  for (let decade = Math.floor(Math.log10(lowest)); DECADE ** decade <= highest; decade += 1) {
    for (const step of STEPS) ticks.push(Number((step * DECADE ** decade).toPrecision(12)));
  }
  return ticks.filter((tick) => tick >= lowest && tick <= highest);
}
