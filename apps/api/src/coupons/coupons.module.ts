import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { MachinesModule } from '../machines/machines.module';
import { MarkingTimesModule } from '../machines/marking-times.module';
import { PhotosModule } from '../photos/photos.module';
import { ShopsModule } from '../shops/shops.module';
import { CouponArtworkController } from './coupon-artwork.controller';
import { CouponArtworkService } from './coupon-artwork.service';
import { CouponImportController } from './coupon-import.controller';
import { CouponImportService } from './coupon-import.service';
import { CouponListRepository } from './coupon-list.repository';
import { CouponListService } from './coupon-list.service';
import { CouponMarkingController } from './coupon-marking.controller';
import { CouponMarkingRepository } from './coupon-marking.repository';
import { CouponMarkingService } from './coupon-marking.service';
import { CouponPlanCatalogueService } from './coupon-plan-catalogue.service';
import { CouponPlanGroundService } from './coupon-plan-ground.service';
import { CouponPlansController } from './coupon-plans.controller';
import { CouponPlansRepository } from './coupon-plans.repository';
import { CouponPlansService } from './coupon-plans.service';
import { CouponConfirmationService } from './coupon-plans-confirmation.service';
import { CouponStoreService } from './coupon-plans-store.service';
import { CouponTimesController } from './coupon-times.controller';
import { CouponTimesService } from './coupon-times.service';
import { CouponsController } from './coupons.controller';
import { CouponsRepository } from './coupons.repository';
import { CouponsService } from './coupons.service';
import { DoseCautionService } from './dose-caution.service';

@Module({
  imports: [LedgerModule, MachinesModule, MarkingTimesModule, PhotosModule, ShopsModule],
  controllers: [
    CouponsController,
    CouponPlansController,
    CouponMarkingController,
    CouponArtworkController,
    CouponImportController,
    CouponTimesController,
  ],
  providers: [
    CouponsService,
    CouponsRepository,
    CouponListService,
    CouponListRepository,
    CouponPlansService,
    CouponConfirmationService,
    CouponStoreService,
    CouponPlanGroundService,
    CouponPlanCatalogueService,
    CouponPlansRepository,
    DoseCautionService,
    CouponMarkingService,
    CouponMarkingRepository,
    CouponArtworkService,
    CouponImportService,
    CouponTimesService,
  ],
  exports: [CouponsService, DoseCautionService],
})
export class CouponsModule {}
