import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { ParameterSet, RevisionContent } from '@proofplate/recipe-model';
import { and, desc, eq, inArray, isNotNull, or, sql } from 'drizzle-orm';
import type { StoredCell, StoredCoupon, StoredGrid } from './coupons.repository';

const { cell, cellRating, coupon, recipe, revision, revisionEvidence, revisionNow, testGrid } = schema;

export type NewCoupon = Pick<StoredCoupon, 'code' | 'title' | 'purpose' | 'materialId' | 'finishId' | 'effectId' | 'machineId'> &
  Pick<StoredCoupon, 'profileId' | 'lensId' | 'calibrationId' | 'lot' | 'thicknessMm' | 'storedAt' | 'notes' | 'acknowledgedCautionIds'> &
  Partial<Pick<StoredCoupon, 'state' | 'confirmsRevisionId' | 'isImported' | 'unknownFields' | 'markedAt' | 'markedBy' | 'ambientNotes'>>;
export type NewGrid = Omit<StoredGrid, 'shopId' | 'id' | 'couponId' | 'number' | 'createdAt' | 'createdBy'>;
export type NewCell = Pick<StoredCell, 'address' | 'rowIndex' | 'columnIndex' | 'runOrder' | 'parameters'> &
  Partial<Pick<StoredCell, 'markState' | 'markNote'>>;
export type RevisionToConfirm = {
  id: string;
  state: string;
  content: RevisionContent;
  profileId: string;
  calibrationId: string | null;
  recipe: { title: string; code: string; materialId: string; finishId: string; effectId: string; machineId: string; lensId: string };
};
/** A cell of an earlier coupon on the same ground that went wrong. */
export type SpoiltCell = { code: string; address: string; outcome: string; parameters: Pick<ParameterSet, 'values' | 'fill' | 'power'> };

/** Outcomes of too much energy; a faint or uneven mark says nothing about a limit. */
const SPOILT = ['overburnt', 'charred', 'melted', 'cracked', 'warped'];
const MOST_SPOILT_CELLS = 2_000;
/** A statement takes 65 535 values; a cell has about a dozen. */
const CELLS_PER_STATEMENT = 500;

@Injectable()
export class CouponPlansRepository {
  async insertCoupon(tx: Tx, shopId: string, createdBy: string, values: NewCoupon): Promise<string> {
    const [row] = await tx
      .insert(coupon)
      .values({ shopId, createdBy, ...values })
      .returning({ id: coupon.id });
    if (row === undefined) throw new Error('the coupon was not stored');
    return row.id;
  }

  async insertGrid(tx: Tx, shopId: string, createdBy: string, { couponId, grid }: { couponId: string; grid: NewGrid }): Promise<string> {
    const { rowFactor, columnFactor, baseSetting, labelStep, ...rest } = grid;
    const [row] = await tx
      .insert(testGrid)
      .values({
        ...{ shopId, createdBy, couponId, number: 1, ...rest },
        rowFactor: rowFactor === null ? null : { ...rowFactor },
        columnFactor: columnFactor === null ? null : { ...columnFactor },
        baseSetting: { ...baseSetting },
        labelStep: labelStep === null ? null : { ...labelStep },
      })
      .returning({ id: testGrid.id });
    if (row === undefined) throw new Error('the grid was not stored');
    return row.id;
  }

  async insertCells(tx: Tx, shopId: string, at: { couponId: string; gridId: string }, cells: readonly NewCell[]): Promise<void> {
    for (let first = 0; first < cells.length; first += CELLS_PER_STATEMENT) {
      const stretch = cells.slice(first, first + CELLS_PER_STATEMENT);
      await tx.insert(cell).values(stretch.map((values) => ({ shopId, ...at, ...values, parameters: { ...values.parameters } })));
    }
  }

  /**
   * The recipes module stands above this one, so a confirmation coupon reads the revision itself: as it stands now, and as it stays until
   * the transaction ends.
   */
  async findRevision(tx: Tx, shopId: string, revisionId: string): Promise<RevisionToConfirm | undefined> {
    await tx
      .select({ id: revision.id })
      .from(revision)
      .where(and(eq(revision.shopId, shopId), eq(revision.id, revisionId)))
      .for('share');
    const [row] = await tx
      .select({
        id: revisionNow.id,
        state: revisionNow.state,
        content: revisionNow.content,
        profileId: revisionNow.profileId,
        calibrationId: revisionNow.calibrationId,
        recipe: {
          title: recipe.title,
          code: recipe.code,
          materialId: recipe.materialId,
          finishId: recipe.finishId,
          effectId: recipe.effectId,
          machineId: recipe.machineId,
          lensId: recipe.lensId,
        },
      })
      .from(revisionNow)
      .innerJoin(recipe, and(eq(recipe.shopId, revisionNow.shopId), eq(recipe.id, revisionNow.recipeId)))
      .where(and(eq(revisionNow.shopId, shopId), eq(revisionNow.id, revisionId)));
    // the recipes module is the only way into this column, so it holds the model's shape
    return row === undefined ? undefined : { ...row, content: row.content as unknown as RevisionContent };
  }

  /** How labels were marked before: on the coupon that the revision rests on, else on the latest of the same work place and plate. */
  async labelStepFor(tx: Tx, shopId: string, { id, recipe: keys }: RevisionToConfirm): Promise<ParameterSet | null> {
    const isBasis = sql`exists (select 1 from ${revisionEvidence} where ${and(
      eq(revisionEvidence.shopId, shopId),
      eq(revisionEvidence.revisionId, id),
      eq(revisionEvidence.couponId, coupon.id),
      eq(revisionEvidence.kind, 'basis'),
    )})`;
    const isSamePlate = and(
      eq(coupon.machineId, keys.machineId),
      eq(coupon.lensId, keys.lensId),
      eq(coupon.materialId, keys.materialId),
      eq(coupon.finishId, keys.finishId),
    );
    const [row] = await tx
      .select({ labelStep: testGrid.labelStep })
      .from(coupon)
      .innerJoin(testGrid, and(eq(testGrid.shopId, coupon.shopId), eq(testGrid.couponId, coupon.id)))
      .where(and(eq(coupon.shopId, shopId), isNotNull(testGrid.labelStep), or(isBasis, isSamePlate)))
      .orderBy(desc(isBasis), desc(coupon.createdAt), desc(coupon.id))
      .limit(1);
    // only the plans of this module write label steps, so they hold the model's shape
    return row === undefined ? null : (row.labelStep as ParameterSet | null);
  }

  /** Cells on the same material and finish that somebody found overdone. */
  async spoiltCells(tx: Tx, shopId: string, ground: { materialId: string; finishId: string }): Promise<SpoiltCell[]> {
    const set = sql<SpoiltCell['parameters']>`coalesce(${cell.actualParameters}, ${cell.parameters})`;
    return tx
      .selectDistinctOn([cell.id], {
        code: coupon.code,
        address: cell.address,
        outcome: sql<string>`${cellRating.outcome}`,
        parameters: set,
      })
      .from(cellRating)
      .innerJoin(cell, and(eq(cell.shopId, cellRating.shopId), eq(cell.id, cellRating.cellId)))
      .innerJoin(coupon, and(eq(coupon.shopId, cell.shopId), eq(coupon.id, cell.couponId)))
      .where(
        and(
          eq(cellRating.shopId, shopId),
          inArray(cellRating.outcome, SPOILT),
          eq(coupon.materialId, ground.materialId),
          eq(coupon.finishId, ground.finishId),
          sql`not (${coupon.unknownFields} ? 'fill')`,
        ),
      )
      .limit(MOST_SPOILT_CELLS);
  }
}
