import { Module } from '@nestjs/common';
import { JobsModule } from '../jobs/jobs.module';
import { LedgerModule } from '../ledger/ledger.module';
import { StorageModule } from '../storage/storage.module';
import { CouponPhotosController } from './coupon-photos.controller';
import { PhotoFilesController } from './photo-files.controller';
import { PhotoIntakeService } from './photo-intake.service';
import { PhotosController } from './photos.controller';
import { PhotosRepository } from './photos.repository';
import { PhotosService } from './photos.service';

/** Receiving, showing and placing photos. Decoding happens in the worker process only. */
@Module({
  imports: [JobsModule, LedgerModule, StorageModule],
  controllers: [CouponPhotosController, PhotosController, PhotoFilesController],
  providers: [PhotosService, PhotoIntakeService, PhotosRepository],
  exports: [PhotosService],
})
export class PhotosModule {}
