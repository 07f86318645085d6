import { type Criterion, criterionText, meetsCriterion } from '@proofplate/recipe-model';
import type { CellVerdictDto, CriterionResultDto } from './dto/inspection.dto';

export type JudgedRating = { readonly cellId: string; readonly rating: number | null };
export type JudgedMeasurement = {
  readonly id: string;
  readonly cellId: string;
  readonly quantity: string;
  readonly value: number | null;
  readonly method: string;
  readonly measuredAt: Date;
  readonly supersedesId: string | null;
};

type Verdict = Omit<CellVerdictDto, 'rank'>;

/**
 * Every cell against the criteria, with its place among the judged ones: cells that meet all criteria first, then those with something
 * not measured, then by fewest failed criteria, then by mean rating.
 */
export function cellVerdicts(
  cellIds: readonly string[],
  found: {
    readonly criteria: readonly Criterion[];
    readonly ratings: readonly JudgedRating[];
    readonly measurements: readonly JudgedMeasurement[];
  },
): CellVerdictDto[] {
  const ratings = groupByCell(found.ratings);
  const measurements = groupByCell(standing(found.measurements));
  const verdicts = cellIds.map((cellId) => verdictOf(cellId, found.criteria, ratings.get(cellId) ?? [], measurements.get(cellId) ?? []));
  const judged = verdicts.filter(isJudged).sort(better);
  const ranks = new Map<string, number>();
  judged.forEach((verdict, index) => {
    const before = judged[index - 1];
    const isTied = before !== undefined && better(before, verdict) === 0;
    ranks.set(verdict.cellId, isTied ? (ranks.get(before.cellId) ?? index) : index + 1);
  });
  return verdicts.map((verdict) => ({ ...verdict, rank: ranks.get(verdict.cellId) ?? null }));
}

/** Measurements that no later one took the place of. */
export function standing<Row extends { readonly id: string; readonly supersedesId: string | null }>(rows: readonly Row[]): Row[] {
  const superseded = new Set(rows.map(({ supersedesId }) => supersedesId));
  return rows.filter(({ id }) => !superseded.has(id));
}

/** The measurement that counts: an instrument before an estimate from a photo, then the newest. */
export function countingMeasurement(rows: readonly JudgedMeasurement[], quantity: string): JudgedMeasurement | undefined {
  const own = rows.filter((row) => row.quantity === quantity && row.value !== null);
  return own.reduce<JudgedMeasurement | undefined>((best, row) => (best === undefined || outweighs(row, best) ? row : best), undefined);
}

/** Ids of the measurements that count, one per cell and quantity. */
export function countingIdsOf(rows: readonly JudgedMeasurement[]): ReadonlySet<string> {
  const ids = [...groupByCell(standing(rows)).values()].flatMap((own) =>
    [...new Set(own.map(({ quantity }) => quantity))].map((quantity) => countingMeasurement(own, quantity)?.id),
  );
  return new Set(ids.filter((id) => id !== undefined));
}

function outweighs(row: JudgedMeasurement, best: JudgedMeasurement): boolean {
  const isEstimate = row.method === 'photo';
  if (isEstimate !== (best.method === 'photo')) return !isEstimate;
  return row.measuredAt.getTime() >= best.measuredAt.getTime();
}

function verdictOf(
  cellId: string,
  criteria: readonly Criterion[],
  ratings: readonly JudgedRating[],
  measurements: readonly JudgedMeasurement[],
): Verdict {
  const given = ratings.flatMap(({ rating }) => (rating === null ? [] : [rating]));
  const results = criteria.map((criterion) => resultOf(criterion, measurements));
  return {
    cellId,
    meanRating: given.length === 0 ? null : given.reduce((sum, rating) => sum + rating, 0) / given.length,
    meets: meetsAll(results),
    results,
  };
}

function resultOf(criterion: Criterion, measurements: readonly JudgedMeasurement[]): CriterionResultDto {
  const value = countingMeasurement(measurements, criterion.quantity)?.value ?? null;
  return { criterion: criterionText(criterion), value, meets: value === null ? null : meetsCriterion(criterion, value) };
}

function meetsAll(results: readonly CriterionResultDto[]): boolean | null {
  if (results.some(({ meets }) => meets === false)) return false;
  return results.length > 0 && results.every(({ meets }) => meets === true) ? true : null;
}

const isJudged = ({ meanRating, results }: Verdict) => meanRating !== null || results.some(({ meets }) => meets !== null);
const failures = ({ results }: Verdict) => results.filter(({ meets }) => meets === false).length;
const standingOf = ({ meets }: Verdict) => (meets === true ? 0 : meets === null ? 1 : 2);
const better = (one: Verdict, other: Verdict) =>
  standingOf(one) - standingOf(other) || failures(one) - failures(other) || (other.meanRating ?? -1) - (one.meanRating ?? -1);

function groupByCell<Row extends { readonly cellId: string }>(rows: readonly Row[]): Map<string, Row[]> {
  const groups = new Map<string, Row[]>();
  for (const row of rows) groups.set(row.cellId, [...(groups.get(row.cellId) ?? []), row]);
  return groups;
}
