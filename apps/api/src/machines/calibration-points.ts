import type { FieldProblem } from '../common/errors/domain-error';

export type ReadingPoint = { readonly percent: number; readonly watts: number };

/** Pairs of readings that no monotone curve can pass, each named at the later reading. */
export function pointProblems(points: readonly ReadingPoint[]): FieldProblem[] {
  return points.flatMap((point, index) => {
    const before = points[index - 1];
    if (before === undefined) return [];
    const pair = `Readings ${index} and ${index + 1} (${words(before)}; ${words(point)})`;
    if (point.percent <= before.percent)
      return [{ pointer: `#/points/${index}/percent`, detail: `${pair}: the percentage must rise from reading to reading.` }];
    if (point.watts < before.watts)
      return [{ pointer: `#/points/${index}/watts`, detail: `${pair}: the watts must not fall. Read this point again, or leave it out.` }];
    return [];
  });
}

const words = ({ percent, watts }: ReadingPoint) => `${percent} % ${watts} W`;
