import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { CouponState, Criterion, MarkStep, ParameterSet } from '@proofplate/recipe-model';
import { and, eq, inArray, ne, type SQL, sql } from 'drizzle-orm';
import type { EvidenceCell, EvidenceKind, EvidencePhoto, EvidenceRun, KeyIds, LinkedCell, StoredMeasurement } from './stored-revision';

const { revisionEvidence, cell, coupon, testGrid, machineProfile, run } = schema;

const MOST_CANDIDATES = 400;

const measurements = sql<StoredMeasurement[]>`coalesce((
  select json_agg(json_build_object('quantity', m.quantity, 'value', m.value, 'grade', m.grade, 'unit', m.unit, 'method', m.method,
    'measuredAt', m.measured_at) order by m.measured_at desc, m.id desc)
  from measurement m where m.shop_id = ${cell.shopId} and m.cell_id = ${cell.id}
    and not exists (select 1 from measurement later where later.shop_id = m.shop_id and later.supersedes_id = m.id)), '[]'::json)`;
const meanRating = sql<number | null>`(select avg(r.rating)::float8 from cell_rating r
  where r.shop_id = ${cell.shopId} and r.cell_id = ${cell.id} and r.rating is not null)`;
const photo = sql<EvidencePhoto | null>`(
  select json_build_object('shopId', p.shop_id, 'id', p.id, 'masterSha256', p.master_sha256, 'largeSha256', p.large_sha256,
    'smallSha256', p.small_sha256, 'corners', p.corners, 'widthPx', p.width_px, 'heightPx', p.height_px)
  from photo p where p.shop_id = ${coupon.shopId} and p.coupon_id = ${coupon.id} and p.state = 'ready' order by p.id desc limit 1)`;
const firstLookedAt = sql<string | null>`least(${coupon.inspectedAt},
  (select min(m.created_at) from measurement m join cell c on c.shop_id = m.shop_id and c.id = m.cell_id
    where c.shop_id = ${coupon.shopId} and c.coupon_id = ${coupon.id}),
  (select min(r.rated_at) from cell_rating r join cell c on c.shop_id = r.shop_id and c.id = r.cell_id
    where c.shop_id = ${coupon.shopId} and c.coupon_id = ${coupon.id}))`;

const cellColumns = {
  cell,
  coupon,
  testGrid,
  physicalNumber: machineProfile.physicalNumber,
  measurements,
  meanRating,
  photo,
  firstLookedAt,
};

@Injectable()
export class RevisionEvidenceRepository {
  /** Cells linked to revisions, in the order of coupon and address. */
  async linked(tx: Tx, shopId: string, revisionIds: readonly string[]): Promise<LinkedCell[]> {
    if (revisionIds.length === 0) return [];
    const rows = await tx
      .select({ ...cellColumns, revisionId: revisionEvidence.revisionId, kind: revisionEvidence.kind })
      .from(revisionEvidence)
      .innerJoin(cell, and(eq(cell.shopId, revisionEvidence.shopId), eq(cell.id, revisionEvidence.cellId)))
      .innerJoin(coupon, and(eq(coupon.shopId, cell.shopId), eq(coupon.id, cell.couponId)))
      .innerJoin(testGrid, and(eq(testGrid.shopId, cell.shopId), eq(testGrid.id, cell.gridId)))
      .innerJoin(machineProfile, and(eq(machineProfile.shopId, coupon.shopId), eq(machineProfile.id, coupon.profileId)))
      .where(and(eq(revisionEvidence.shopId, shopId), inArray(revisionEvidence.revisionId, [...revisionIds])))
      .orderBy(coupon.code, testGrid.number, cell.rowIndex, cell.columnIndex);
    return rows.map((row) => ({ ...toEvidenceCell(row), revisionId: row.revisionId, kind: row.kind as EvidenceKind }));
  }

  async cells(tx: Tx, shopId: string, ids: readonly string[]): Promise<EvidenceCell[]> {
    if (ids.length === 0) return [];
    return this.select(tx, and(eq(cell.shopId, shopId), inArray(cell.id, [...ids])));
  }

  /** Marked cells of coupons with the same five keys, best rated first. */
  async candidates(tx: Tx, shopId: string, keys: KeyIds): Promise<EvidenceCell[]> {
    return this.select(
      tx,
      and(
        eq(cell.shopId, shopId),
        inArray(cell.markState, ['marked', 'differs']),
        ne(coupon.state, 'planned'),
        eq(coupon.materialId, keys.materialId),
        eq(coupon.finishId, keys.finishId),
        eq(coupon.effectId, keys.effectId),
        eq(coupon.machineId, keys.machineId),
        eq(coupon.lensId, keys.lensId),
      ),
    );
  }

  /** Finished confirmation runs of revisions, oldest first. */
  async runs(tx: Tx, shopId: string, revisionIds: readonly string[]): Promise<EvidenceRun[]> {
    if (revisionIds.length === 0) return [];
    const rows = await tx
      .select()
      .from(run)
      .where(
        and(eq(run.shopId, shopId), inArray(run.revisionId, [...revisionIds]), eq(run.kind, 'confirmation'), eq(run.state, 'finished')),
      )
      .orderBy(run.startedAt, run.id);
    return rows.map((row) => ({
      id: row.id,
      revisionId: row.revisionId,
      code: row.code,
      lot: row.lot,
      startedAt: row.startedAt,
      hasBadResult: row.badResult !== null,
      // a confirmation run keeps the steps of the revision as they were
      steps: row.steps as MarkStep[] | null,
      measurements: row.measurements,
    }));
  }

  async link(
    tx: Tx,
    shopId: string,
    createdBy: string,
    links: readonly { revisionId: string; couponId: string; cellId: string; kind: EvidenceKind }[],
  ) {
    if (links.length === 0) return;
    await tx.insert(revisionEvidence).values(links.map((link) => ({ shopId, createdBy, ...link })));
  }

  async unlinkAll(tx: Tx, shopId: string, revisionId: string): Promise<void> {
    await tx.delete(revisionEvidence).where(and(eq(revisionEvidence.shopId, shopId), eq(revisionEvidence.revisionId, revisionId)));
  }

  private async select(tx: Tx, isWanted: SQL | undefined): Promise<EvidenceCell[]> {
    const rows = await tx
      .select(cellColumns)
      .from(cell)
      .innerJoin(coupon, and(eq(coupon.shopId, cell.shopId), eq(coupon.id, cell.couponId)))
      .innerJoin(testGrid, and(eq(testGrid.shopId, cell.shopId), eq(testGrid.id, cell.gridId)))
      .innerJoin(machineProfile, and(eq(machineProfile.shopId, coupon.shopId), eq(machineProfile.id, coupon.profileId)))
      .where(isWanted)
      .orderBy(sql`${meanRating} desc nulls last`, sql`${coupon.code} desc`, testGrid.number, cell.rowIndex, cell.columnIndex)
      .limit(MOST_CANDIDATES);
    return rows.map(toEvidenceCell);
  }
}

type CellRow = {
  cell: typeof cell.$inferSelect;
  coupon: typeof coupon.$inferSelect;
  testGrid: typeof testGrid.$inferSelect;
  physicalNumber: number;
  measurements: StoredMeasurement[];
  meanRating: number | null;
  photo: EvidencePhoto | null;
  firstLookedAt: string | Date | null;
};

/** Constraints and the request classes of coupons are the only ways into these columns, so they hold the model's shapes. */
function toEvidenceCell(row: CellRow): EvidenceCell {
  const { cell: square, coupon: plate, testGrid: grid } = row;
  const { materialId, finishId, effectId, machineId, lensId } = plate;
  return {
    cellId: square.id,
    address: square.address,
    rowIndex: square.rowIndex,
    columnIndex: square.columnIndex,
    isMarked: square.markState === 'marked' || square.markState === 'differs',
    parameters: (square.actualParameters ?? square.parameters) as unknown as ParameterSet,
    coupon: {
      id: plate.id,
      code: plate.code,
      state: plate.state as CouponState,
      lot: plate.lot,
      markedAt: plate.markedAt,
      sealedAt: plate.sealedAt,
      criteria: plate.criteria as Criterion[] | null,
      criteriaRecordedAt: plate.criteriaRecordedAt,
      firstLookedAt: row.firstLookedAt === null ? null : new Date(row.firstLookedAt),
      unknownFields: plate.unknownFields,
      isProof: plate.purpose === 'confirmation',
      confirmsRevisionId: plate.confirmsRevisionId,
      profileId: plate.profileId,
      physicalNumber: row.physicalNumber,
      calibrationId: plate.calibrationId,
      keys: { materialId, finishId, effectId, machineId, lensId },
    },
    plate: { rows: grid.rows, columns: grid.columns, cellMm: grid.cellMm, gapMm: grid.gapMm, layoutVersion: grid.layoutVersion },
    meanRating: row.meanRating,
    measurements: row.measurements,
    photo: row.photo,
  };
}
