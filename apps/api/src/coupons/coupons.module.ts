import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { CouponListRepository } from './coupon-list.repository';
import { CouponListService } from './coupon-list.service';
import { CouponsController } from './coupons.controller';
import { CouponsRepository } from './coupons.repository';
import { CouponsService } from './coupons.service';

@Module({
  imports: [LedgerModule],
  controllers: [CouponsController],
  providers: [CouponsService, CouponsRepository, CouponListService, CouponListRepository],
  exports: [CouponsService],
})
export class CouponsModule {}
