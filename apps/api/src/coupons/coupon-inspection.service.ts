import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { InvalidError, StaleError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { criteriaAsStored, criteriaProblems } from '../materials/effect-criteria';
import { CouponInspectionReader } from './coupon-inspection.reader';
import { CouponInspectionRepository } from './coupon-inspection.repository';
import { requireOpenForCriteria } from './coupon-inspection-state';
import { CouponsService } from './coupons.service';
import type { InspectionDto } from './dto/inspection.dto';
import type { RecordCriteriaDto } from './dto/record-criteria.dto';

@Injectable()
export class CouponInspectionService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
    private readonly repository: CouponInspectionRepository,
    private readonly reader: CouponInspectionReader,
    private readonly ledger: LedgerService,
  ) {}

  async get(actor: Actor, couponId: string): Promise<InspectionDto> {
    return this.unitOfWork.read(actor, (tx) => this.reader.read(tx, actor, couponId));
  }

  /** Records what a mark must meet; possible until the first rating or measurement. */
  async recordCriteria(actor: Actor, couponId: string, version: number, dto: RecordCriteriaDto): Promise<InspectionDto> {
    const problems = criteriaProblems(dto.criteria);
    if (problems.length > 0) throw new InvalidError('The criteria need another look.', problems);
    const criteria = criteriaAsStored(dto.criteria);
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.lockVersion(tx, actor, couponId, version);
      requireOpenForCriteria(coupon, await this.repository.hasResults(tx, actor.shopId, couponId));
      await this.repository.recordCriteria(tx, actor.shopId, couponId, criteria);
      const subject = { subjectType: 'coupon', subjectId: couponId, subjectCode: coupon.code };
      await this.ledger.record(tx, {
        actor,
        action: 'coupon.criteria-recorded',
        ...subject,
        before: { criteria: coupon.criteria },
        after: { criteria },
      });
      return this.reader.read(tx, actor, couponId);
    });
  }

  private async lockVersion(tx: Tx, actor: Actor, couponId: string, version: number) {
    const coupon = await this.coupons.lock(tx, actor.shopId, couponId);
    if (coupon.version !== version) throw new StaleError(await this.reader.read(tx, actor, couponId));
    return coupon;
  }
}
