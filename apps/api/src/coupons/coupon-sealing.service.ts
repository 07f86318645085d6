import { Injectable } from '@nestjs/common';
import { type CouponAction, nextCouponState } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type FieldProblem, InvalidError, StaleError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CouponSealedError } from '../photos/photos.errors';
import { InspectionIncompleteError, NotReadyToSealError } from './coupon-inspection.errors';
import { CouponInspectionReader } from './coupon-inspection.reader';
import { CouponInspectionRepository } from './coupon-inspection.repository';
import { blocking, type InspectionFacts, missingToInspect, missingToSeal, NOT_RATED_TAG } from './coupon-inspection-missing';
import { CouponRatingsRepository } from './coupon-ratings.repository';
import { CouponStateError } from './coupons.errors';
import type { StoredCoupon } from './coupons.repository';
import { CouponsService } from './coupons.service';
import type { CouponDto } from './dto/coupon.dto';
import type { InspectCouponDto, UnratedCellDto } from './dto/inspect-coupon.dto';

/** The two last steps of a coupon: the inspection ends, and it is sealed for good. */
@Injectable()
export class CouponSealingService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
    private readonly repository: CouponInspectionRepository,
    private readonly reader: CouponInspectionReader,
    private readonly ratings: CouponRatingsRepository,
    private readonly ledger: LedgerService,
  ) {}

  /** marked → inspected. Every cell is rated, skipped, or named here with the reason why nobody rates it. */
  async inspect(actor: Actor, couponId: string, version: number, { unratedCells = [] }: InspectCouponDto): Promise<CouponDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.lockFor(tx, actor, couponId, { version, action: 'inspect' });
      const facts = await this.reader.lockedFacts(tx, actor.shopId, couponId);
      refuseUnknown(unratedCells, facts);
      const noted = facts.coupon.criteriaRecordedAt === null ? [] : unratedCells;
      const missing = blocking(missingToInspect({ ...facts, ratings: [...facts.ratings, ...noted.map(asRating)] }));
      if (missing.length > 0) throw new InspectionIncompleteError(missing);
      await this.noteUnrated(tx, actor, unratedCells);
      await this.repository.finishInspection(tx, actor.shopId, couponId, actor.memberId);
      const after = {
        state: 'inspected',
        unratedCells: unratedCells.map((cell) => ({ address: addressOf(cell, facts), reason: cell.reason })),
      };
      await this.tell(tx, actor, coupon, { action: 'coupon.inspected', after });
      return this.coupons.getDto(tx, actor, couponId);
    });
  }

  /** inspected → sealed. From then on nothing of the coupon changes; corrections stand beside it. */
  async seal(actor: Actor, couponId: string, version: number): Promise<CouponDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.lockFor(tx, actor, couponId, { version, action: 'seal' });
      const facts = await this.reader.lockedFacts(tx, actor.shopId, couponId);
      const missing = blocking(missingToSeal(facts));
      if (missing.length > 0) throw new NotReadyToSealError(missing);
      await this.repository.seal(tx, actor.shopId, couponId, actor.memberId);
      const photoIds = facts.photos.filter(({ state }) => state === 'ready').map(({ id }) => id);
      await this.tell(tx, actor, coupon, { action: 'coupon.sealed', after: { state: 'sealed', photoIds } });
      return this.coupons.getDto(tx, actor, couponId);
    });
  }

  private async lockFor(tx: Tx, actor: Actor, couponId: string, { version, action }: { version: number; action: CouponAction }) {
    const coupon = await this.coupons.lock(tx, actor.shopId, couponId);
    if (coupon.version !== version) throw new StaleError(await this.reader.read(tx, actor, couponId));
    if (coupon.state === 'sealed') throw new CouponSealedError();
    const moved = nextCouponState(coupon.state, action);
    // sealing a marked plate is told everything that is missing, the inspection among it
    if (moved.kind === 'refused' && !(action === 'seal' && coupon.state === 'marked')) throw new CouponStateError(moved.message);
    return coupon;
  }

  /** The reason stands on the cell like a rating does, under the name of who gave it. */
  private async noteUnrated(tx: Tx, { shopId, memberId, printedName }: Actor, cells: readonly UnratedCellDto[]): Promise<void> {
    if (cells.length === 0) return;
    const cellIds = cells.map(({ cellId }) => cellId);
    const own = new Map((await this.ratings.lockOwn(tx, shopId, memberId, cellIds)).map((row) => [row.cellId, row]));
    const changes = cells.map(({ cellId, reason }) => {
      const { version = 0, outcome = null, tags = [], note = '' } = own.get(cellId) ?? {};
      const kept = { outcome, tags: [...new Set([...tags, NOT_RATED_TAG])], note: note === '' ? reason : `${note} – ${reason}` };
      return { cellId, seenVersion: version, rating: null, ...kept };
    });
    await this.ratings.save(tx, { shopId, memberId, by: printedName }, changes);
  }

  private async tell(tx: Tx, actor: Actor, { id, code, state }: StoredCoupon, { action, after }: { action: string; after: object }) {
    const subject = { subjectType: 'coupon', subjectId: id, subjectCode: code };
    await this.ledger.record(tx, { actor, action, ...subject, before: { state }, after });
  }
}

const asRating = ({ cellId }: UnratedCellDto) => ({ cellId, rating: null, tags: [NOT_RATED_TAG] });
const addressOf = ({ cellId }: UnratedCellDto, { cells }: InspectionFacts) => cells.find(({ id }) => id === cellId)?.address ?? cellId;

function refuseUnknown(unratedCells: readonly UnratedCellDto[], { cells, ratings }: InspectionFacts): void {
  const problems = unratedCells.flatMap(({ cellId }, index): FieldProblem[] => {
    const pointer = `#/unratedCells/${index}/cellId`;
    const cell = cells.find(({ id }) => id === cellId);
    if (cell === undefined) return [{ pointer, detail: 'This cell is not on the coupon.' }];
    const isRated = ratings.some((row) => row.cellId === cellId && row.rating !== null);
    return isRated ? [{ pointer, detail: `${cell.address} is rated. Leave it out.` }] : [];
  });
  if (problems.length > 0) throw new InvalidError('Some of the cells without a rating need another look.', problems);
}
