import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { type FieldProblem, InvalidError, StaleError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { toCellRatingDto } from './coupon-inspection.mapper';
import { type CellStanding, CouponInspectionRepository } from './coupon-inspection.repository';
import { requireOpenForResults } from './coupon-inspection-state';
import { CouponRatingsRepository, type RatingChange, type StoredRating } from './coupon-ratings.repository';
import { CouponNotFoundError } from './coupons.errors';
import type { SavedRatingsDto } from './dto/inspection.dto';
import type { CellRatingChangeDto, SaveRatingsDto } from './dto/save-ratings.dto';

@Injectable()
export class CouponRatingsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly inspection: CouponInspectionRepository,
    private readonly ratings: CouponRatingsRepository,
    private readonly ledger: LedgerService,
  ) {}

  /**
   * Saves the caller's own ratings, all or none, as one event of the ledger.
   *
   * @throws StaleError with both values when one of them was changed since it was seen
   */
  async save(actor: Actor, couponId: string, { ratings }: SaveRatingsDto): Promise<SavedRatingsDto> {
    const changes = ratings.map(changeOf);
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.inspection.hold(tx, actor.shopId, couponId);
      if (coupon === undefined) throw new CouponNotFoundError();
      requireOpenForResults(coupon);
      const cells = new Map((await this.inspection.cellStandings(tx, actor.shopId, couponId)).map((cell) => [cell.id, cell]));
      refuseCells(ratings, cells);
      const before = await this.lockUnchanged(tx, actor, changes);
      const saved = await this.ratings.save(tx, { shopId: actor.shopId, memberId: actor.memberId, by: actor.printedName }, changes);
      // a first rating that somebody else's tab stored in this moment
      if (saved.length < changes.length) await this.lockUnchanged(tx, actor, changes, new Set(saved.map(({ cellId }) => cellId)));
      await this.ledger.record(tx, {
        actor,
        action: 'coupon.cells-rated',
        subjectType: 'coupon',
        subjectId: couponId,
        subjectCode: coupon.code,
        before: byAddress(before, cells),
        after: byAddress(saved, cells),
      });
      return { ratings: saved.map(toCellRatingDto) };
    });
  }

  private async lockUnchanged(tx: Tx, actor: Actor, changes: readonly RatingChange[], written: ReadonlySet<string> = new Set()) {
    const cellIds = changes.map(({ cellId }) => cellId);
    const stored = await this.ratings.lockOwn(tx, actor.shopId, actor.memberId, cellIds);
    const present = new Map(stored.map((row) => [row.cellId, row]));
    const stale = changes.filter(({ cellId, seenVersion }) => !written.has(cellId) && (present.get(cellId)?.version ?? 0) !== seenVersion);
    if (stale.length === 0) return stored;
    const conflicts = stale.map(({ seenVersion: _, ...yours }) => {
      const current = present.get(yours.cellId);
      return { cellId: yours.cellId, yours, current: current === undefined ? null : toCellRatingDto(current) };
    });
    throw new StaleError({ conflicts }, 'You rated this cell somewhere else meanwhile. Look at both values and choose.');
  }
}

function changeOf({ cellId, seenVersion, rating, outcome, tags, note }: CellRatingChangeDto): RatingChange {
  return { cellId, seenVersion: seenVersion ?? 0, rating, outcome: outcome ?? null, tags: tags ?? [], note: note ?? '' };
}

function refuseCells(ratings: readonly CellRatingChangeDto[], cells: ReadonlyMap<string, CellStanding>): void {
  const problems = ratings.flatMap(({ cellId, rating }, index): FieldProblem[] => {
    const cell = cells.get(cellId);
    if (cell === undefined) return [{ pointer: `#/ratings/${index}/cellId`, detail: 'This cell is not on the coupon.' }];
    if (cell.markState !== 'skipped' || rating === null) return [];
    return [
      {
        pointer: `#/ratings/${index}/rating`,
        detail: `${cell.address} was skipped when the plate was marked, so there is nothing to rate.`,
      },
    ];
  });
  if (problems.length > 0) throw new InvalidError('Some of the cells cannot be rated.', problems);
}

function byAddress(rows: readonly StoredRating[], cells: ReadonlyMap<string, CellStanding>) {
  return Object.fromEntries(
    rows.map(({ cellId, rating, outcome, tags, note, version }) => [
      cells.get(cellId)?.address ?? cellId,
      { rating, outcome, tags, note, version },
    ]),
  );
}
