import type { PlatePhotoDto } from '../photos/dto/photo.dto';
import { cellDose } from './cell-dose';
import type { FaceCell } from './coupon-list.repository';
import { toCouponHead } from './coupons.mapper';
import type { CouponView } from './coupons.repository';
import type { CouponFaceDto, CouponSummaryDto } from './dto/coupon.dto';

export function toCouponSummaryDto(view: CouponView, cells: readonly FaceCell[], photo: PlatePhotoDto | null): CouponSummaryDto {
  const rated = cells.filter(({ meanRating }) => meanRating !== null);
  const best = rated.map(({ bestRating }) => bestRating ?? 0);
  return {
    ...toCouponHead(view),
    face: toFace(cells, { shows: rated.length > 0 ? 'rating' : 'dose', unknownFields: view.coupon.unknownFields, photo }),
    cellCount: cells.length,
    ratedCount: rated.length,
    bestRating: best.length === 0 ? null : Math.max(...best),
  };
}

/** Ratings once there are any: a face in two scales at once would be read wrongly. */
function toFace(
  cells: readonly FaceCell[],
  { shows, unknownFields, photo }: { shows: CouponFaceDto['shows']; unknownFields: readonly string[]; photo: PlatePhotoDto | null },
): CouponFaceDto | null {
  const [first] = cells;
  if (first === undefined) return null;
  const { rows, columns, cellMm, gapMm } = first;
  const values = new Array<number | null>(rows * columns).fill(null);
  for (const cell of cells) {
    const value = shows === 'rating' ? cell.meanRating : cellDose(cell.parameters, unknownFields).value;
    values[cell.rowIndex * columns + cell.columnIndex] = value;
  }
  return { rows, columns, cellMm, gapMm, shows, values, photo };
}
