const FEWEST_STEPS = 3;
const ROUND_STEPS = [1, 2, 2.5, 5, 10];

/** Round numbers from zero to at least the highest value, three to six of them beyond zero. */
export function axisTicks(highest: number): number[] {
  if (!(highest > 0)) return [0, 1];
  const rough = highest / FEWEST_STEPS;
  const size = 10 ** Math.floor(Math.log10(rough));
  const step = [...ROUND_STEPS].reverse().find((factor) => factor * size <= rough * (1 + 1e-9)) ?? 1;
  const count = Math.ceil(highest / (step * size) - 1e-9);
  return Array.from({ length: count + 1 }, (_, index) => Number((index * step * size).toPrecision(12)));
}
