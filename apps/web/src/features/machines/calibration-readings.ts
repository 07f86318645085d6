import { formatEntered } from '../../lib/format';
import type { ReadingPoint } from './machines.api';
import { readTwoColumns } from './two-columns';

export type Readings = { points: readonly ReadingPoint[]; message?: string };

const MIN_POINTS = 3;

/** The readings of a typed table, and what keeps them from being a curve: the pair is named as a person counts. */
export function readReadings(text: string, locale: string): Readings {
  const read = readTwoColumns(text, locale);
  if ('message' in read) return { points: [], message: read.message };
  const points = read.rows.map(([percent, watts]) => ({ percent, watts }));
  const message = pointsMessage(points);
  return message === undefined ? { points } : { points, message };
}

function pointsMessage(points: readonly ReadingPoint[]): string | undefined {
  const outside = points.findIndex(({ percent, watts }) => percent < 0 || percent > 100 || watts < 0);
  if (outside >= 0) return `Reading ${outside + 1} is impossible: percent runs from 0 to 100, and watts are never below zero.`;
  if (points.length < MIN_POINTS)
    return `Enter at least ${MIN_POINTS} readings; there ${points.length === 1 ? 'is' : 'are'} ${points.length}.`;
  for (const [index, point] of points.entries()) {
    const before = points[index - 1];
    if (before === undefined) continue;
    const pair = `Readings ${index} and ${index + 1} (${words(before)}; ${words(point)})`;
    if (point.percent <= before.percent) return `${pair}: the percentage must rise from reading to reading.`;
    if (point.watts < before.watts) return `${pair}: the watts must not fall. Read this point again, or leave it out.`;
  }
  return undefined;
}

const words = ({ percent, watts }: ReadingPoint) => `${formatEntered(percent)} % ${formatEntered(watts)} W`;
