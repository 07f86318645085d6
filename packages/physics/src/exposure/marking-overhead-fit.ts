import { leastSquares } from '@proofplate/statistics';
import { requireAtLeast } from '../arguments/require-at-least';
import { requirePositive } from '../arguments/require-positive';
import type { Scanning } from './rectangle-scanning';

/** A clocked mark: what it was made of, and how long it took. */
export type LoggedMark = Scanning & { readonly loggedS: number };

export type FittedMark = {
  readonly predictedS: number;
  /** Logged less predicted. */
  readonly residualS: number;
  /** Far from what the others say of it; it counts all the same. */
  readonly isOutlier: boolean;
};

export type MarkingOverheadFit = {
  readonly kind: 'fitted';
  readonly n: number;
  readonly lineMs: number;
  readonly lineStandardErrorMs: number;
  /** null: see scanMissingBecause; the lines then carry it. */
  readonly scanMs: number | null;
  readonly scanStandardErrorMs: number | null;
  readonly scanMissingBecause: string | null;
  /** Standard deviation of logged less predicted, s. */
  readonly spreadS: number;
  /** In the order of the logs. */
  readonly marks: readonly FittedMark[];
};

export type MarkingOverheads = MarkingOverheadFit | { readonly kind: 'not known'; readonly n: number; readonly because: string };

type Line = { readonly rows: readonly (readonly number[])[]; readonly y: readonly number[] };
type Solved = {
  readonly values: readonly number[];
  readonly errors: readonly number[];
  readonly spreadS: number;
  readonly marks: FittedMark[];
};

const MIN_LOGS = 3;
/** Two constants from three logs would leave a single degree of freedom for their error. */
const MIN_LOGS_OF_TWO = 4;
/** Lines and scans whose cosine is above this rise together: the error of either would be ten times that of the lines alone. */
const LARGEST_COSINE = 0.995;
/** A value this many standard errors from zero is not put down to chance. */
const CLEAR_ERRORS = 2;
/** Studentised by a fit without the mark itself; no stopwatch scatter reaches it. */
const OUTLIER_ERRORS = 4;
/** Two hands on a clock: below this nothing is called an outlier, s. */
const CLOCK_S = 0.5;
const MS_PER_S = 1000;

/**
 * Overheads of a scan head from clocked marks, by least squares.
 *          T - beam-on - jump travel = n_lines t_line + n_scans t_scan
 *          standard errors sqrt(s^2 (X'X)^-1), s^2 = sum r^2 / (n - p)
 *
 * @param logs  of each mark: logged time, beam-on time s, finite, > 0; jump travel s, finite, >= 0; lines and scans, > 0
 * @returns time per line (delays, run-in and run-out, settling) and, where the logs can tell them apart, time per scan, ms, each with its
 *          standard error; spread of the residuals, s; each mark's prediction, and whether it stands apart from the others (it is never
 *          left out). Or why the overheads are not known: fewer than 3 logs, or times that no overhead above zero explains.
 *          Time per scan needs 4 logs, and lines and scans that do not rise together; a value that is not clearly below zero is taken
 *          for none, and the lines alone are fitted
 * @throws RangeError naming the argument and its value, if out of range
 * Valid for one machine with unchanged delays and jump speed; lines long enough to reach full speed; the error of the clock is the same
 * for short and long marks, so that all logs count alike.
 * Source: own model, NIST/SEMATECH e-Handbook of Statistical Methods, 4.1.4.1; docs/science/marking-time.md
 */
export function markingOverheadFit(logs: readonly LoggedMark[]): MarkingOverheads {
  for (const { loggedS, beamOnS, jumpTravelS, lines, scans } of logs) {
    requirePositive({ loggedS, beamOnS, lines, scans });
    requireAtLeast(0, { jumpTravelS });
  }
  const n = logs.length;
  if (n < MIN_LOGS)
    return notKnown(n, `${n === 0 ? 'no time is' : `only ${n} ${n === 1 ? 'time is' : 'times are'}`} logged; it takes ${MIN_LOGS}`);
  const scanMissingBecause = whyNoScan(logs);
  if (scanMissingBecause !== undefined) return linesAlone(logs, scanMissingBecause);
  const both = solve(logs, ({ lines, scans }) => [lines, scans]);
  const [line, scan] = both.values;
  if (scan >= 0) return line > 0 ? fitted(both) : tooShort(n);
  if (scan < -CLEAR_ERRORS * both.errors[1])
    return notKnown(n, `the time per scan comes out below zero, ${msWords(scan)}: look at the logged times and areas`);
  return linesAlone(logs, `the time per scan, ${msWords(scan)}, does not differ from none`);
}

const notKnown = (n: number, because: string): MarkingOverheads => ({ kind: 'not known', n, because });
const tooShort = (n: number) =>
  notKnown(n, 'the logged times leave nothing beside beam-on time and jumps: look at the logged times, the areas and the speeds');
const msWords = (seconds: number) => `${(seconds * MS_PER_S).toPrecision(2).replace('-', '−')} ms`;

function whyNoScan(logs: readonly LoggedMark[]): string | undefined {
  if (logs.length < MIN_LOGS_OF_TWO) return `time per scan and time per line need ${MIN_LOGS_OF_TWO} logs`;
  const dot = logs.reduce((sum, { lines, scans }) => sum + lines * scans, 0);
  const cosine =
    dot / Math.sqrt(logs.reduce((sum, { lines }) => sum + lines ** 2, 0) * logs.reduce((sum, { scans }) => sum + scans ** 2, 0));
  return cosine > LARGEST_COSINE ? 'lines and scans of the logged marks rise together, so that only their sum shows' : undefined;
}

function linesAlone(logs: readonly LoggedMark[], scanMissingBecause: string): MarkingOverheads {
  const solved = solve(logs, ({ lines }) => [lines]);
  return solved.values[0] > 0 ? fitted(solved, scanMissingBecause) : tooShort(logs.length);
}

function fitted({ values, errors, spreadS, marks }: Solved, scanMissingBecause: string | null = null): MarkingOverheadFit {
  const hasScan = values.length > 1;
  return {
    ...{ kind: 'fitted', n: marks.length, spreadS, marks, scanMissingBecause },
    lineMs: values[0] * MS_PER_S,
    lineStandardErrorMs: errors[0] * MS_PER_S,
    scanMs: hasScan ? values[1] * MS_PER_S : null,
    scanStandardErrorMs: hasScan ? errors[1] * MS_PER_S : null,
  };
}

function solve(logs: readonly LoggedMark[], columnsOf: (log: LoggedMark) => readonly number[]): Solved {
  const bare = logs.map(({ beamOnS, jumpTravelS }) => beamOnS + jumpTravelS);
  const line: Line = { rows: logs.map(columnsOf), y: logs.map(({ loggedS }, i) => loggedS - bare[i]) };
  const values = leastSquares(line.rows, line.y);
  const residuals = line.rows.map((row, i) => line.y[i] - dotOf(row, values));
  const inverse = inverseOfProduct(line.rows);
  const freedom = logs.length - values.length;
  const squares = residuals.reduce((sum, residual) => sum + residual ** 2, 0);
  const outlying = outliers(line, { residuals, inverse, squares });
  return {
    values,
    errors: values.map((_, k) => Math.sqrt((squares / freedom) * inverse[k][k])),
    spreadS: Math.sqrt(squares / freedom),
    marks: residuals.map((residualS, i) => ({ predictedS: logs[i].loggedS - residualS, residualS, isOutlier: outlying[i] })),
  };
}

/** (X'X)^-1 for one or two columns. */
function inverseOfProduct(rows: readonly (readonly number[])[]): readonly (readonly number[])[] {
  const sum = (j: number, k: number) => rows.reduce((total, row) => total + row[j] * row[k], 0);
  if (rows[0].length === 1) return [[1 / sum(0, 0)]];
  const [a, b, d] = [sum(0, 0), sum(0, 1), sum(1, 1)];
  const determinant = a * d - b * b;
  return [
    [d / determinant, -b / determinant],
    [-b / determinant, a / determinant],
  ];
}

type Residuals = { readonly residuals: readonly number[]; readonly inverse: readonly (readonly number[])[]; readonly squares: number };

/** Residuals over the spread that the other marks have among themselves. */
function outliers({ rows }: Line, { residuals, inverse, squares }: Residuals): readonly boolean[] {
  const freedomWithout = rows.length - rows[0].length - 1;
  return rows.map((row, i) => {
    if (freedomWithout < 2 || Math.abs(residuals[i]) < CLOCK_S) return false;
    const open = 1 - row.reduce((sum, value, j) => sum + value * dotOf(inverse[j], row), 0);
    const without = (squares - residuals[i] ** 2 / open) / freedomWithout;
    return residuals[i] ** 2 > OUTLIER_ERRORS ** 2 * Math.max(0, without) * open;
  });
}

const dotOf = (row: readonly number[], values: readonly number[]) => row.reduce((sum, value, k) => sum + value * values[k], 0);
