import { Module } from '@nestjs/common';
import { JobsModule } from '../jobs/jobs.module';
import { LedgerModule } from '../ledger/ledger.module';
import { RecipeRevisionsRepository } from './recipe-revisions.repository';
import { RecipesRepository } from './recipes.repository';
import { ScheduledRevisionsService } from './scheduled-revisions.service';

/** Revisions whose day has come: in the worker process. */
@Module({
  imports: [JobsModule, LedgerModule],
  providers: [ScheduledRevisionsService, RecipeRevisionsRepository, RecipesRepository],
  exports: [ScheduledRevisionsService],
})
export class RecipesWorkerModule {}
