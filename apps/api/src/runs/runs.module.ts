import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { MarkingTimesModule } from '../machines/marking-times.module';
import { MailModule } from '../mail/mail.module';
import { MaterialsModule } from '../materials/materials.module';
import { MembersModule } from '../members/members.module';
import { RecipesModule } from '../recipes/recipes.module';
import { ShopsModule } from '../shops/shops.module';
import { CitedRevisionsRepository } from './cited-revisions.repository';
import { CitedRevisionsService } from './cited-revisions.service';
import { DeviationsController } from './deviations.controller';
import { DeviationsRepository } from './deviations.repository';
import { DeviationsService } from './deviations.service';
import { HoldsController } from './holds.controller';
import { HoldsRepository } from './holds.repository';
import { HoldsService } from './holds.service';
import { PartSetUpsController } from './part-set-ups.controller';
import { PartSetUpsRepository } from './part-set-ups.repository';
import { PartSetUpsService } from './part-set-ups.service';
import { RunActs } from './run-acts.service';
import { RunLettersService } from './run-letters.service';
import { RunListService } from './run-list.service';
import { RunProgressService } from './run-progress.service';
import { RunStopsRepository } from './run-stops.repository';
import { RunSurroundingsService } from './run-surroundings.service';
import { RunTimesController } from './run-times.controller';
import { RunTimesRepository } from './run-times.repository';
import { RunTimesService } from './run-times.service';
import { RunsController } from './runs.controller';
import { RunsRepository } from './runs.repository';
import { RunsService } from './runs.service';
import { SettingRequestsController } from './setting-requests.controller';
import { SettingRequestsRepository } from './setting-requests.repository';
import { SettingRequestsService } from './setting-requests.service';

/** Runs with their first piece, counts and round parts, holds, deviations, and requests for settings. */
@Module({
  imports: [LedgerModule, MailModule, MarkingTimesModule, MaterialsModule, MembersModule, RecipesModule, ShopsModule],
  controllers: [RunsController, PartSetUpsController, RunTimesController, HoldsController, SettingRequestsController, DeviationsController],
  providers: [
    RunsService,
    RunActs,
    RunLettersService,
    RunSurroundingsService,
    RunStopsRepository,
    RunListService,
    RunProgressService,
    RunsRepository,
    PartSetUpsService,
    PartSetUpsRepository,
    RunTimesService,
    RunTimesRepository,
    CitedRevisionsService,
    CitedRevisionsRepository,
    HoldsService,
    HoldsRepository,
    DeviationsService,
    DeviationsRepository,
    SettingRequestsService,
    SettingRequestsRepository,
  ],
})
export class RunsModule {}
