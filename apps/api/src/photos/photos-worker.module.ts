import { Module } from '@nestjs/common';
import { JobsModule } from '../jobs/jobs.module';
import { LedgerModule } from '../ledger/ledger.module';
import { StorageModule } from '../storage/storage.module';
import { PhotoDeveloperService } from './photo-developer.service';
import { PhotoSweepService } from './photo-sweep.service';
import { PhotosRepository } from './photos.repository';

/** Decoding and sweeping: in the worker process only. */
@Module({
  imports: [JobsModule, LedgerModule, StorageModule],
  providers: [PhotoDeveloperService, PhotoSweepService, PhotosRepository],
  exports: [PhotoDeveloperService, PhotoSweepService],
})
export class PhotosWorkerModule {}
