import type { Calibration } from '../machines.api';
import { readingGroups, sharedPercents, wattsOverTime } from './ageing-series';

const reading = (id: string, measuredOn: string, points: readonly [number, number][], rest: Partial<Calibration> = {}): Calibration => ({
  ...{ id, machineId: 'm1', measuredOn, meter: 'Meter 3', meterDueOn: null, wavelengthNm: 1064, frequencyKhz: 60, pulseWidthNs: 200 },
  ...{ points: points.map(([percent, watts]) => ({ percent, watts })), notes: '', createdAt: '', createdByName: 'Hanne Voss' },
  ...rest,
});
const FIRST = reading('a', '2026-01-10', [
  [10, 2],
  [50, 10],
  [100, 20],
]);
const LATER = reading('b', '2026-07-01', [
  [20, 3.6],
  [50, 9],
  [80, 14.4],
]);
const ELSEWHERE = reading(
  'c',
  '2026-08-01',
  [
    [10, 1],
    [50, 5],
    [100, 9],
  ],
  { frequencyKhz: 200 },
);

describe('the ageing of a source', () => {
  it('compares readings of the same wavelength, frequency and pulse width only, oldest first', () => {
    const groups = readingGroups([ELSEWHERE, LATER, FIRST]);
    expect(groups.map(({ readings }) => readings.map(({ id }) => id))).toEqual([['a', 'b'], ['c']]);
  });

  it('offers the percentages that every reading reaches', () => {
    const [group] = readingGroups([LATER, FIRST]);
    expect(group && sharedPercents(group)).toEqual([80, 50, 20]);
  });

  it('gives the watts at one of them over the days, through each reading’s own curve', () => {
    const [group] = readingGroups([LATER, FIRST]);
    const points = group === undefined ? [] : wattsOverTime(group, 50);
    expect(points.map(({ measuredOn, watts }) => [measuredOn, Number(watts.toFixed(6))])).toEqual([
      ['2026-01-10', 10],
      ['2026-07-01', 9],
    ]);
  });
});
