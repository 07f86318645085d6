import type { StoredCorrection } from './coupon-corrections.repository';
import { cellVerdicts, countingIdsOf } from './coupon-inspection-verdicts';
import type { StoredMeasurement } from './coupon-measurements.repository';
import type { StoredRating } from './coupon-ratings.repository';
import type { StoredCell, StoredCoupon } from './coupons.repository';
import type { CellRatingDto, CellVerdictDto, CorrectionDto, MeasurementDto } from './dto/inspection.dto';

export function toCellRatingDto({ id, cellId, memberId, by, rating, outcome, tags, note, ratedAt, version }: StoredRating): CellRatingDto {
  return { id, cellId, memberId, by, rating, outcome, tags, note, ratedAt: ratedAt.toISOString(), version };
}

/** Measurements of a coupon, each with what became of it among the others. @param all every measurement of these cells */
export function toMeasurementDtos(rows: readonly StoredMeasurement[], all: readonly StoredMeasurement[]): MeasurementDto[] {
  const supersededIds = new Set(all.map(({ supersedesId }) => supersedesId));
  const countingIds = countingIdsOf(all);
  return rows.map((row) => {
    const { id, cellId, quantity, value, grade, unit, method, methodDetail, instrument, photoId, uncertainty, by, supersedesId, reason } =
      row;
    return {
      ...{ id, cellId, quantity, value, grade, unit, method, methodDetail, instrument, photoId, uncertainty, by, supersedesId, reason },
      measuredAt: row.measuredAt.toISOString(),
      isSuperseded: supersededIds.has(id),
      counts: countingIds.has(id),
    };
  });
}

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
