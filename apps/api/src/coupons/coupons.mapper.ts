import { couponLayout } from '@proofplate/imaging';
import type { DoseCaution } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { cellDose } from './cell-dose';
import { couponActions } from './coupons.policy';
import type { CouponView, StoredCell, StoredGrid } from './coupons.repository';
import type { CouponActDto, CouponCellDto, CouponDto, CouponHeadDto, PlateSizeDto, TestGridDto } from './dto/coupon.dto';

export type WholeCoupon = { readonly view: CouponView; readonly grids: readonly StoredGrid[]; readonly cells: readonly StoredCell[] };

export function toCouponDto(
  { view, grids, cells }: WholeCoupon,
  { actor, doseCaution }: { actor: Pick<Actor, 'role'>; doseCaution: DoseCaution | null },
): CouponDto {
  const { coupon, profile, calibration, confirms } = view;
  return {
    ...toCouponHead(view),
    profile,
    calibration,
    confirms,
    ambientNotes: coupon.ambientNotes,
    notes: coupon.notes,
    unknownFields: coupon.unknownFields,
    sourceNote: coupon.sourceNote,
    doseCaution,
    criteria: coupon.criteria,
    criteriaRecordedAt: isoOf(coupon.criteriaRecordedAt),
    acknowledgedCautionIds: coupon.acknowledgedCautionIds,
    markingStartedAt: isoOf(coupon.markingStartedAt),
    marked: actOf(coupon.markedAt, view.markerName),
    inspected: actOf(coupon.inspectedAt, view.inspectorName),
    sealed: actOf(coupon.sealedAt, view.sealerName),
    grids: grids.map(toTestGridDto),
    cells: cells.map((row) => toCouponCellDto(row, coupon.unknownFields)),
    version: coupon.version,
    allowedActions: couponActions(actor, coupon),
  };
}

export function toCouponHead({ coupon, material, finish, effect, machine, lens, authorName }: CouponView): CouponHeadDto {
  const { id, code, title, purpose, state, lot, thicknessMm, storedAt, isImported, isInvented } = coupon;
  return {
    ...{ id, code, title, purpose, state, material, finish, effect, machine, lens },
    ...{ lot, thicknessMm, storedAt, isImported, isInvented },
    createdAt: coupon.createdAt.toISOString(),
    createdBy: authorName,
    markedAt: isoOf(coupon.markedAt),
  };
}

export function toTestGridDto(grid: StoredGrid): TestGridDto {
  const { id, number, rows, columns, rowFactor, columnFactor, baseSetting, labelStep } = grid;
  const { cellMm, gapMm, layoutVersion, runOrderSeed, fillDrawnBy } = grid;
  return {
    ...{ id, number, rows, columns, rowFactor, columnFactor, baseSetting, labelStep },
    ...{ cellMm, gapMm, layoutVersion, runOrderSeed, fillDrawnBy },
    plate: plateSize(grid),
  };
}

export function toCouponCellDto(row: StoredCell, unknownFields: readonly string[]): CouponCellDto {
  const { id, gridId, address, rowIndex, columnIndex, runOrder, parameters, actualParameters, markState, markNote, version } = row;
  return {
    ...{ id, gridId, address, rowIndex, columnIndex, runOrder, parameters, actualParameters, markState, markNote, version },
    markedAt: isoOf(row.markedAt),
    dose: cellDose(actualParameters ?? parameters, unknownFields),
  };
}

/** The code on the plate does not change its size. */
export function plateSize({ rows, columns, cellMm, gapMm }: Pick<StoredGrid, 'rows' | 'columns' | 'cellMm' | 'gapMm'>): PlateSizeDto {
  return couponLayout({ rows, columns, cellMm, gapMm, reference: 'size' }).plate;
}

const isoOf = (moment: Date | null) => moment?.toISOString() ?? null;

const actOf = (at: Date | null, by: string | null): CouponActDto | null => (at === null ? null : { at: at.toISOString(), by });
