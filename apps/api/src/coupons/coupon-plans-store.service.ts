import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { Codes } from '../database/codes.repository';
import type { Tx } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CouponPlansRepository, type NewCell, type NewCoupon, type NewGrid } from './coupon-plans.repository';
import { CouponsService } from './coupons.service';
import type { CouponDto } from './dto/coupon.dto';

export type NewPlate = {
  readonly coupon: Omit<NewCoupon, 'code'>;
  readonly grid: NewGrid;
  readonly cells: readonly NewCell[];
  readonly action: string;
};

/** The one way in which a coupon comes into the shop, planned or burnt before. */
@Injectable()
export class CouponStoreService {
  constructor(
    private readonly codes: Codes,
    private readonly plans: CouponPlansRepository,
    private readonly coupons: CouponsService,
    private readonly ledger: LedgerService,
  ) {}

  /** Stores coupon, grid and cells in the caller's transaction, with the next code and a ledger event. */
  async add(tx: Tx, actor: Actor, { coupon, grid, cells, action }: NewPlate): Promise<CouponDto> {
    const code = await this.codes.nextCode(tx, actor.shopId, 'coupon');
    const couponId = await this.plans.insertCoupon(tx, actor.shopId, actor.memberId, { ...coupon, code });
    const gridId = await this.plans.insertGrid(tx, actor.shopId, actor.memberId, { couponId, grid });
    await this.plans.insertCells(tx, actor.shopId, { couponId, gridId }, cells);
    const plan = { rows: grid.rows, columns: grid.columns, rowFactor: grid.rowFactor, columnFactor: grid.columnFactor };
    const after = { ...coupon, ...plan, baseSetting: grid.baseSetting, runOrderSeed: grid.runOrderSeed, cells: cells.length };
    await this.ledger.record(tx, { actor, action, subjectType: 'coupon', subjectId: couponId, subjectCode: code, after });
    return this.coupons.getDto(tx, actor, couponId);
  }
}
