import { Module } from '@nestjs/common';
import { PhotosModule } from '../photos/photos.module';
import { FinderController } from './finder.controller';
import { FinderRepository } from './finder.repository';
import { FinderService } from './finder.service';
import { FinderAnswersRepository } from './finder-answers.repository';
import { RecordSearchRepository } from './record-search.repository';
import { RecordSearchService } from './record-search.service';

/** Look-up at the machine and search: read-only queries of its own across the other modules' tables. */
@Module({
  imports: [PhotosModule],
  controllers: [FinderController],
  providers: [FinderService, FinderRepository, FinderAnswersRepository, RecordSearchService, RecordSearchRepository],
})
export class FinderModule {}
