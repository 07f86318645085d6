import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { CouponState, ParameterSet } from '@proofplate/recipe-model';
import { and, eq, inArray, type SQL, sql } from 'drizzle-orm';
import { containsText } from '../database/contains-text';
import { CouponsRepository, type CouponView, createdToTheMs } from './coupons.repository';
import type { CouponPurpose } from './dto/coupon.dto';

const { coupon, testGrid, cell, cellRating, material, finish, effect, machine } = schema;

export type CouponFilter = {
  state?: CouponState;
  purpose?: CouponPurpose;
  materialId?: string;
  effectId?: string;
  machineId?: string;
  /** Each must be found somewhere. */
  words: readonly string[];
};
export type FacetKey = 'state' | 'materialId' | 'effectId' | 'machineId';
export type FacetCount = { value: string; label: string; count: number };
export type FaceCell = {
  couponId: string;
  rows: number;
  columns: number;
  cellMm: number;
  gapMm: number;
  rowIndex: number;
  columnIndex: number;
  meanRating: number | null;
  bestRating: number | null;
  /** Enough of the parameters for the dose of what was really marked. */
  parameters: Pick<ParameterSet, 'values' | 'fill' | 'power'>;
};

const FACETS: Readonly<Record<FacetKey, { value: SQL<string>; label: SQL<string> }>> = {
  state: { value: sql`${coupon.state}`, label: sql`${coupon.state}` },
  materialId: { value: sql`${material.id}`, label: sql`${material.name}` },
  effectId: { value: sql`${effect.id}`, label: sql`${effect.name}` },
  machineId: { value: sql`${machine.id}`, label: sql`${machine.name}` },
};

@Injectable()
export class CouponListRepository {
  constructor(private readonly coupons: CouponsRepository) {}

  /** Newest first. */
  async list(
    tx: Tx,
    shopId: string,
    { filter, after, limit }: { filter: CouponFilter; after?: { createdAt: string; id: string }; limit: number },
  ): Promise<CouponView[]> {
    const isAfter =
      after === undefined ? undefined : sql`(${createdToTheMs}, ${coupon.id}) < (${after.createdAt}::timestamptz, ${after.id}::uuid)`;
    return this.coupons.views(tx, and(isWanted(shopId, filter), isAfter), limit);
  }

  /** Values of one facet; the other choices hold, its own does not. */
  async facet(tx: Tx, shopId: string, key: FacetKey, filter: CouponFilter): Promise<FacetCount[]> {
    const { value, label } = FACETS[key];
    const { [key]: _own, ...others } = filter;
    const count = sql<number>`count(*)::int`;
    return tx
      .select({ value, label, count })
      .from(coupon)
      .innerJoin(material, and(eq(material.shopId, coupon.shopId), eq(material.id, coupon.materialId)))
      .innerJoin(finish, and(eq(finish.shopId, coupon.shopId), eq(finish.id, coupon.finishId)))
      .innerJoin(effect, and(eq(effect.shopId, coupon.shopId), eq(effect.id, coupon.effectId)))
      .innerJoin(machine, and(eq(machine.shopId, coupon.shopId), eq(machine.id, coupon.machineId)))
      .where(isWanted(shopId, others))
      .groupBy(value, label)
      .orderBy(label);
  }

  async count(tx: Tx, shopId: string, filter: CouponFilter): Promise<number> {
    const [row] = await tx
      .select({ count: sql<number>`count(*)::int` })
      .from(coupon)
      .innerJoin(material, and(eq(material.shopId, coupon.shopId), eq(material.id, coupon.materialId)))
      .innerJoin(finish, and(eq(finish.shopId, coupon.shopId), eq(finish.id, coupon.finishId)))
      .where(isWanted(shopId, filter));
    return row?.count ?? 0;
  }

  /** Cells of each coupon's first grid. */
  async faceCells(tx: Tx, shopId: string, couponIds: readonly string[]): Promise<FaceCell[]> {
    if (couponIds.length === 0) return [];
    const set = sql`coalesce(${cell.actualParameters}, ${cell.parameters})`;
    const storedValue = (key: string) => sql`${set} -> 'values' -> ${sql.raw(`'${key}'`)}`;
    const ratings = tx
      .select({
        cellId: cellRating.cellId,
        mean: sql<number | null>`avg(${cellRating.rating})::float8`.as('mean_rating'),
        best: sql<number | null>`max(${cellRating.rating})`.as('best_rating'),
      })
      .from(cellRating)
      .where(eq(cellRating.shopId, shopId))
      .groupBy(cellRating.cellId)
      .as('ratings');
    return tx
      .select({
        couponId: cell.couponId,
        rows: testGrid.rows,
        columns: testGrid.columns,
        cellMm: testGrid.cellMm,
        gapMm: testGrid.gapMm,
        rowIndex: cell.rowIndex,
        columnIndex: cell.columnIndex,
        meanRating: ratings.mean,
        bestRating: ratings.best,
        parameters: sql<FaceCell['parameters']>`jsonb_build_object('fill', ${set} -> 'fill', 'power', ${set} -> 'power',
          'values', jsonb_strip_nulls(jsonb_build_object('speedMmPerS', ${storedValue('speedMmPerS')}, 'passes', ${storedValue('passes')},
          'lineSpacingUm', ${storedValue('lineSpacingUm')}, 'wobbleDiameterUm', ${storedValue('wobbleDiameterUm')})))`,
      })
      .from(cell)
      .innerJoin(testGrid, and(eq(testGrid.shopId, cell.shopId), eq(testGrid.id, cell.gridId), eq(testGrid.number, 1)))
      .leftJoin(ratings, eq(ratings.cellId, cell.id))
      .where(and(eq(cell.shopId, shopId), inArray(cell.couponId, [...couponIds])));
  }
}

function isWanted(shopId: string, { state, purpose, materialId, effectId, machineId, words }: CouponFilter): SQL | undefined {
  return and(
    eq(coupon.shopId, shopId),
    state === undefined ? undefined : eq(coupon.state, state),
    purpose === undefined ? undefined : eq(coupon.purpose, purpose),
    materialId === undefined ? undefined : eq(coupon.materialId, materialId),
    effectId === undefined ? undefined : eq(coupon.effectId, effectId),
    machineId === undefined ? undefined : eq(coupon.machineId, machineId),
    ...words.map(
      (word) =>
        sql`concat_ws(' ', ${coupon.code}, ${coupon.title}, ${coupon.lot}, ${coupon.storedAt}, ${material.name}, ${finish.name}) ilike ${containsText(word)}`,
    ),
  );
}
