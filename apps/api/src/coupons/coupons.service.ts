import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { IdPipe } from '../common/pipes/id.pipe';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { CouponNotFoundError } from './coupons.errors';
import { toCouponDto, type WholeCoupon } from './coupons.mapper';
import { CouponsRepository, type StoredCoupon } from './coupons.repository';
import { DoseCautionService } from './dose-caution.service';
import type { CouponDto } from './dto/coupon.dto';

const CODE = /^C-\d{4,9}$/u;

@Injectable()
export class CouponsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsRepository,
    private readonly doseCautions: DoseCautionService,
  ) {}

  /** By id, or by the code that stands on the plate and in addresses. */
  async get(actor: Actor, idOrCode: string): Promise<CouponDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const code = idOrCode.toUpperCase();
      if (!CODE.test(code)) return this.getDto(tx, actor, new IdPipe().transform(idOrCode));
      const id = await this.coupons.findIdByCode(tx, actor.shopId, code);
      if (id === undefined) throw new CouponNotFoundError();
      return this.getDto(tx, actor, id);
    });
  }

  /** The answer of every act on a coupon. @throws CouponNotFoundError also for another shop's coupon */
  async getDto(tx: Tx, actor: Actor, id: string): Promise<CouponDto> {
    const whole = await this.getWhole(tx, actor.shopId, id);
    return toCouponDto(whole, { actor, doseCaution: await this.doseCautions.find(tx, actor.shopId, whole.view.coupon) });
  }

  /** A coupon with its grids and cells. @throws CouponNotFoundError also for another shop's coupon */
  async getWhole(tx: Tx, shopId: string, id: string): Promise<WholeCoupon> {
    const view = await this.coupons.findView(tx, shopId, id);
    if (view === undefined) throw new CouponNotFoundError();
    return { view, grids: await this.coupons.grids(tx, shopId, id), cells: await this.coupons.cells(tx, shopId, id) };
  }

  /** Locks the coupon before its parts. @throws CouponNotFoundError also for another shop's coupon */
  async lock(tx: Tx, shopId: string, id: string): Promise<StoredCoupon> {
    const row = await this.coupons.lock(tx, shopId, id);
    if (row === undefined) throw new CouponNotFoundError();
    return row;
  }
}
