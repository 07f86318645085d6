import { Module } from '@nestjs/common';
import { CouponsModule } from '../coupons/coupons.module';
import { JobsModule } from '../jobs/jobs.module';
import { LedgerModule } from '../ledger/ledger.module';
import { MachinesModule } from '../machines/machines.module';
import { PhotosModule } from '../photos/photos.module';
import { ShopsModule } from '../shops/shops.module';
import { DraftEntryService } from './draft-entry.service';
import { DraftGroundService } from './draft-ground.service';
import { DraftRecipeService } from './draft-recipe.service';
import { DraftRepositories } from './draft-repositories';
import { DraftStoreService } from './draft-store.service';
import { PowerShiftsService } from './power-shifts.service';
import { RecipeDraftingService } from './recipe-drafting.service';
import { RecipeListRepository } from './recipe-list.repository';
import { RecipeRevisionsController } from './recipe-revisions.controller';
import { RecipeRevisionsRepository } from './recipe-revisions.repository';
import { RecipeRevisionsService } from './recipe-revisions.service';
import { RecipeViewsService } from './recipe-views.service';
import { RecipesController } from './recipes.controller';
import { RecipesRepository } from './recipes.repository';
import { RecipesService } from './recipes.service';
import { RevisionDraftsService } from './revision-drafts.service';
import { RevisionEvidenceRepository } from './revision-evidence.repository';
import { RevisionRecordsService } from './revision-records.service';
import { RevisionViewsService } from './revision-views.service';
import { ScheduledRevisionsService } from './scheduled-revisions.service';
import { TransferGroundService } from './transfer-ground.service';
import { TransferPlacesRepository } from './transfer-places.repository';
import { TransfersController } from './transfers.controller';
import { TransfersService } from './transfers.service';

@Module({
  imports: [CouponsModule, JobsModule, LedgerModule, ShopsModule, MachinesModule, PhotosModule],
  controllers: [RecipesController, RecipeRevisionsController, TransfersController],
  providers: [
    RecipesService,
    RecipeViewsService,
    RecipeDraftingService,
    PowerShiftsService,
    RecipeRevisionsService,
    RevisionDraftsService,
    RevisionViewsService,
    RevisionRecordsService,
    ScheduledRevisionsService,
    DraftEntryService,
    DraftGroundService,
    DraftStoreService,
    DraftRecipeService,
    TransfersService,
    TransferGroundService,
    TransferPlacesRepository,
    DraftRepositories,
    RecipesRepository,
    RecipeListRepository,
    RecipeRevisionsRepository,
    RevisionEvidenceRepository,
  ],
  exports: [RecipeRevisionsService],
})
export class RecipesModule {}
