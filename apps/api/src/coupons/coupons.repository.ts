import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type {
  CouponState,
  Criterion,
  LevelSpacing,
  MaterialFamily,
  Panel,
  ParameterKey,
  ParameterSet,
  PhysicalProfile,
  SetValue,
  SourceKind,
} from '@proofplate/recipe-model';
import { and, asc, eq, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import type { CouponPurpose, FillDrawnBy, MarkState } from './dto/coupon.dto';

const { coupon, testGrid, cell, material, finish, effect, machine, machineProfile, machineLens, lens, powerCalibration, member } = schema;
const { recipe, revisionNow } = schema;

const author = alias(member, 'author');
const marker = alias(member, 'marker');
const inspector = alias(member, 'inspector');
const sealer = alias(member, 'sealer');

export type StoredFactor = { parameter: ParameterKey; spacing: LevelSpacing | 'list'; levels: SetValue[] };
type CouponRow = typeof coupon.$inferSelect;
type GridRow = typeof testGrid.$inferSelect;
type CellRow = typeof cell.$inferSelect;

export type StoredCoupon = Omit<CouponRow, 'state' | 'purpose' | 'criteria'> & {
  state: CouponState;
  purpose: CouponPurpose;
  criteria: Criterion[] | null;
};
export type StoredGrid = Omit<GridRow, 'rowFactor' | 'columnFactor' | 'baseSetting' | 'labelStep' | 'fillDrawnBy'> & {
  rowFactor: StoredFactor | null;
  columnFactor: StoredFactor | null;
  baseSetting: ParameterSet;
  labelStep: ParameterSet | null;
  fillDrawnBy: FillDrawnBy;
};
export type StoredCell = Omit<CellRow, 'parameters' | 'actualParameters' | 'markState'> & {
  parameters: ParameterSet;
  actualParameters: ParameterSet | null;
  markState: MarkState;
};
export type CouponView = {
  coupon: StoredCoupon;
  material: { id: string; name: string; family: MaterialFamily };
  finish: { id: string; name: string };
  effect: { id: string; name: string; key: string };
  machine: { id: string; name: string; sourceKind: SourceKind };
  lens: { id: string; name: string; focalLengthMm: number; fieldSizeMm: number; measuredSpotUm: number | null };
  profile: { id: string; number: number; physicalNumber: number; physical: PhysicalProfile; panel: Panel };
  calibration: { id: string; measuredOn: string } | null;
  confirms: { id: string; recipeId: string; recipeCode: string; number: number | null; state: string } | null;
  authorName: string;
  markerName: string | null;
  inspectorName: string | null;
  sealerName: string | null;
};

const sameShop = coupon.shopId;
/** A cursor carries milliseconds, so the order must not be finer than that. */
export const createdToTheMs = sql`date_trunc('milliseconds', ${coupon.createdAt})`;

@Injectable()
export class CouponsRepository {
  async findView(tx: Tx, shopId: string, id: string): Promise<CouponView | undefined> {
    const [view] = await this.views(tx, and(eq(coupon.shopId, shopId), eq(coupon.id, id)), 1);
    return view;
  }

  /** The id behind a code that people read. */
  async findIdByCode(tx: Tx, shopId: string, code: string): Promise<string | undefined> {
    const [row] = await tx
      .select({ id: coupon.id })
      .from(coupon)
      .where(and(eq(coupon.shopId, shopId), eq(coupon.code, code)));
    return row?.id;
  }

  async grids(tx: Tx, shopId: string, couponId: string): Promise<StoredGrid[]> {
    const rows = await tx
      .select()
      .from(testGrid)
      .where(and(eq(testGrid.shopId, shopId), eq(testGrid.couponId, couponId)))
      .orderBy(asc(testGrid.number));
    return rows.map(toStoredGrid);
  }

  /** Row by row, grid by grid. */
  async cells(tx: Tx, shopId: string, couponId: string): Promise<StoredCell[]> {
    const rows = await tx
      .select({ cell })
      .from(cell)
      .innerJoin(testGrid, and(eq(testGrid.shopId, cell.shopId), eq(testGrid.id, cell.gridId)))
      .where(and(eq(cell.shopId, shopId), eq(cell.couponId, couponId)))
      .orderBy(asc(testGrid.number), asc(cell.rowIndex), asc(cell.columnIndex));
    return rows.map((row) => toStoredCell(row.cell));
  }

  /** Keeps everybody else from changing the coupon until the transaction ends; parts of it are locked after it. */
  async lock(tx: Tx, shopId: string, id: string): Promise<StoredCoupon | undefined> {
    const [row] = await tx
      .select()
      .from(coupon)
      .where(and(eq(coupon.shopId, shopId), eq(coupon.id, id)))
      .for('update');
    return row === undefined ? undefined : toStoredCoupon(row);
  }

  /** Coupons with all that they name, newest first. The condition must hold the shop. */
  async views(tx: Tx, isWanted: SQL | undefined, limit: number): Promise<CouponView[]> {
    const rows = await tx
      .select({
        coupon,
        material: { id: material.id, name: material.name, family: material.family },
        finish: { id: finish.id, name: finish.name },
        effect: { id: effect.id, name: effect.name, key: effect.key },
        machine: { id: machine.id, name: machine.name, sourceKind: machine.sourceKind },
        lens: { id: lens.id, name: lens.name, focalLengthMm: lens.focalLengthMm, fieldSizeMm: lens.fieldSizeMm },
        measuredSpotUm: machineLens.measuredSpotUm,
        profile: {
          id: machineProfile.id,
          number: machineProfile.number,
          physicalNumber: machineProfile.physicalNumber,
          physical: machineProfile.physical,
          panel: machineProfile.panel,
        },
        calibration: { id: powerCalibration.id, measuredOn: powerCalibration.measuredOn },
        confirms: {
          id: revisionNow.id,
          recipeId: revisionNow.recipeId,
          recipeCode: sql<string>`${recipe.code}`,
          number: revisionNow.number,
          state: revisionNow.state,
        },
        authorName: author.printedName,
        markerName: marker.printedName,
        inspectorName: inspector.printedName,
        sealerName: sealer.printedName,
      })
      .from(coupon)
      .innerJoin(material, and(eq(material.shopId, sameShop), eq(material.id, coupon.materialId)))
      .innerJoin(finish, and(eq(finish.shopId, sameShop), eq(finish.id, coupon.finishId)))
      .innerJoin(effect, and(eq(effect.shopId, sameShop), eq(effect.id, coupon.effectId)))
      .innerJoin(machine, and(eq(machine.shopId, sameShop), eq(machine.id, coupon.machineId)))
      .innerJoin(machineProfile, and(eq(machineProfile.shopId, sameShop), eq(machineProfile.id, coupon.profileId)))
      .innerJoin(lens, and(eq(lens.shopId, sameShop), eq(lens.id, coupon.lensId)))
      .innerJoin(author, and(eq(author.shopId, sameShop), eq(author.id, coupon.createdBy)))
      .leftJoin(
        machineLens,
        and(eq(machineLens.shopId, sameShop), eq(machineLens.machineId, coupon.machineId), eq(machineLens.lensId, coupon.lensId)),
      )
      .leftJoin(powerCalibration, and(eq(powerCalibration.shopId, sameShop), eq(powerCalibration.id, coupon.calibrationId)))
      .leftJoin(revisionNow, and(eq(revisionNow.shopId, sameShop), eq(revisionNow.id, coupon.confirmsRevisionId)))
      .leftJoin(recipe, and(eq(recipe.shopId, sameShop), eq(recipe.id, revisionNow.recipeId)))
      .leftJoin(marker, and(eq(marker.shopId, sameShop), eq(marker.id, coupon.markedBy)))
      .leftJoin(inspector, and(eq(inspector.shopId, sameShop), eq(inspector.id, coupon.inspectedBy)))
      .leftJoin(sealer, and(eq(sealer.shopId, sameShop), eq(sealer.id, coupon.sealedBy)))
      .where(isWanted)
      .orderBy(sql`${createdToTheMs} desc, ${coupon.id} desc`)
      .limit(limit);
    return rows.map(({ measuredSpotUm, ...row }) => ({
      ...row,
      coupon: toStoredCoupon(row.coupon),
      // constraints and the request classes are the only ways into these columns, so they hold the model's shapes
      material: { ...row.material, family: row.material.family as MaterialFamily },
      machine: { ...row.machine, sourceKind: row.machine.sourceKind as SourceKind },
      lens: { ...row.lens, measuredSpotUm },
      profile: {
        ...row.profile,
        physical: row.profile.physical as unknown as PhysicalProfile,
        panel: row.profile.panel as unknown as Panel,
      },
    }));
  }
}

/** Check constraints and this module's request classes are the only ways into these columns, so they hold the model's shapes. */
export function toStoredCoupon(row: CouponRow): StoredCoupon {
  return {
    ...row,
    state: row.state as CouponState,
    purpose: row.purpose as CouponPurpose,
    criteria: row.criteria as Criterion[] | null,
  };
}

export function toStoredGrid(row: GridRow): StoredGrid {
  return {
    ...row,
    rowFactor: row.rowFactor as StoredFactor | null,
    columnFactor: row.columnFactor as StoredFactor | null,
    baseSetting: row.baseSetting as unknown as ParameterSet,
    labelStep: row.labelStep as unknown as ParameterSet | null,
    fillDrawnBy: row.fillDrawnBy as FillDrawnBy,
  };
}

export function toStoredCell(row: CellRow): StoredCell {
  return {
    ...row,
    parameters: row.parameters as unknown as ParameterSet,
    actualParameters: row.actualParameters as unknown as ParameterSet | null,
    markState: row.markState as MarkState,
  };
}
