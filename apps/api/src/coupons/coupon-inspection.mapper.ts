import type { StoredCorrection } from './coupon-corrections.repository';
import { cellVerdicts } from './coupon-inspection-verdicts';
import type { StoredMeasurement } from './coupon-measurements.repository';
import type { StoredRating } from './coupon-ratings.repository';
import type { StoredCell, StoredCoupon } from './coupons.repository';
import type { CellRatingDto, CellVerdictDto, CorrectionDto, MeasurementDto } from './dto/inspection.dto';

export function toCellRatingDto({ id, cellId, memberId, by, rating, outcome, tags, note, ratedAt, version }: StoredRating): CellRatingDto {
  return { id, cellId, memberId, by, rating, outcome, tags, note, ratedAt: ratedAt.toISOString(), version };
}

/** @param supersededIds measurements whose place a later one took */
export function toMeasurementDto(row: StoredMeasurement, supersededIds: ReadonlySet<string | null>): MeasurementDto {
  const { id, cellId, quantity, value, grade, unit, method, methodDetail, instrument, photoId, uncertainty, by, supersedesId, reason } =
    row;
  return {
    ...{ id, cellId, quantity, value, grade, unit, method, methodDetail, instrument, photoId, uncertainty, by, supersedesId, reason },
    measuredAt: row.measuredAt.toISOString(),
    isSuperseded: supersededIds.has(id),
  };
}

export const supersededIdsOf = (rows: readonly StoredMeasurement[]): ReadonlySet<string | null> =>
  new Set(rows.map(({ supersedesId }) => supersedesId));

export function toCorrectionDto({ id, cellId, address, text, reason, createdAt, by }: StoredCorrection): CorrectionDto {
  return { id, cellId, address, text, reason, at: createdAt.toISOString(), by };
}

export function toVerdicts(
  coupon: Pick<StoredCoupon, 'criteria'>,
  cells: readonly StoredCell[],
  found: { readonly ratings: readonly StoredRating[]; readonly measurements: readonly StoredMeasurement[] },
): CellVerdictDto[] {
  return cellVerdicts(
    cells.map(({ id }) => id),
    { criteria: coupon.criteria ?? [], ...found },
  );
}
