import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { MachinesModule } from '../machines/machines.module';
import { ShopsModule } from '../shops/shops.module';
import { CouponCorrectionsRepository } from './coupon-corrections.repository';
import { CouponCorrectionsService } from './coupon-corrections.service';
import { CouponCraterFitController } from './coupon-crater-fit.controller';
import { CouponCraterFitService } from './coupon-crater-fit.service';
import { CouponCraterPlaceService } from './coupon-crater-place.service';
import { CouponInspectionController } from './coupon-inspection.controller';
import { CouponInspectionReader } from './coupon-inspection.reader';
import { CouponInspectionRepository } from './coupon-inspection.repository';
import { CouponInspectionService } from './coupon-inspection.service';
import { CouponMeasurementsRepository } from './coupon-measurements.repository';
import { CouponMeasurementsService } from './coupon-measurements.service';
import { CouponRatingsController } from './coupon-ratings.controller';
import { CouponRatingsRepository } from './coupon-ratings.repository';
import { CouponRatingsService } from './coupon-ratings.service';
import { CouponSealingService } from './coupon-sealing.service';
import { CouponsModule } from './coupons.module';

/** What is found on a marked plate: criteria, ratings, measurements and what follows from them, the seal and corrections after it. */
@Module({
  imports: [CouponsModule, LedgerModule, MachinesModule, ShopsModule],
  controllers: [CouponInspectionController, CouponRatingsController, CouponCraterFitController],
  providers: [
    CouponInspectionService,
    CouponInspectionReader,
    CouponInspectionRepository,
    CouponRatingsService,
    CouponRatingsRepository,
    CouponMeasurementsService,
    CouponMeasurementsRepository,
    CouponSealingService,
    CouponCorrectionsService,
    CouponCorrectionsRepository,
    CouponCraterFitService,
    CouponCraterPlaceService,
  ],
})
export class CouponInspectionModule {}
