import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError } from '../common/errors/domain-error';
import { UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CouponCorrectionsRepository } from './coupon-corrections.repository';
import { toCorrectionDto } from './coupon-inspection.mapper';
import { requireSealed } from './coupon-inspection-state';
import { CouponsService } from './coupons.service';
import type { CorrectCouponDto } from './dto/inspect-coupon.dto';
import type { CorrectionDto } from './dto/inspection.dto';

@Injectable()
export class CouponCorrectionsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
    private readonly corrections: CouponCorrectionsRepository,
    private readonly ledger: LedgerService,
  ) {}

  /** Says beside a sealed coupon what is right instead, and why. */
  async add(actor: Actor, couponId: string, { cellId, text, reason }: CorrectCouponDto): Promise<CorrectionDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.coupons.lock(tx, actor.shopId, couponId);
      requireSealed(coupon);
      const { cells } = await this.coupons.getWhole(tx, actor.shopId, couponId);
      const cell = cells.find(({ id }) => id === cellId);
      if (cellId !== undefined && cell === undefined) {
        throw new InvalidError('The cell is not on the coupon.', [{ pointer: '#/cellId', detail: 'This cell is not on the coupon.' }]);
      }
      const { shopId, memberId: createdBy, printedName } = actor;
      const id = await this.corrections.insert(tx, { shopId, couponId, cellId: cellId ?? null, text, reason, createdBy });
      const correction = {
        id,
        cellId: cellId ?? null,
        address: cell?.address ?? null,
        text,
        reason,
        createdAt: new Date(),
        by: printedName,
      };
      const subject = { subjectType: 'coupon', subjectId: couponId, subjectCode: coupon.code };
      await this.ledger.record(tx, { actor, action: 'coupon.corrected', ...subject, after: { address: correction.address, text, reason } });
      return toCorrectionDto(correction);
    });
  }
}
