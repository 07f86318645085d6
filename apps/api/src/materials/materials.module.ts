import { Global, Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { ShopStarterContent } from '../shops/shop-starter-content';
import { CautionsController } from './cautions.controller';
import { CautionsRepository } from './cautions.repository';
import { CautionsService } from './cautions.service';
import { EffectsController } from './effects.controller';
import { EffectsRepository } from './effects.repository';
import { EffectsService } from './effects.service';
import { FinishesController } from './finishes.controller';
import { FinishesRepository } from './finishes.repository';
import { FinishesService } from './finishes.service';
import { MaterialGroupsController } from './material-groups.controller';
import { MaterialGroupsRepository } from './material-groups.repository';
import { MaterialGroupsService } from './material-groups.service';
import { MaterialsController } from './materials.controller';
import { MaterialsRepository } from './materials.repository';
import { MaterialsService } from './materials.service';
import { MaterialsStarterContent } from './starter-content/materials-starter-content';

/** Global, because sign-up asks for the starter content and must not import a higher row. */
@Global()
@Module({
  imports: [LedgerModule],
  controllers: [MaterialsController, FinishesController, MaterialGroupsController, EffectsController, CautionsController],
  providers: [
    MaterialsService,
    FinishesService,
    MaterialGroupsService,
    EffectsService,
    CautionsService,
    MaterialsRepository,
    FinishesRepository,
    MaterialGroupsRepository,
    EffectsRepository,
    CautionsRepository,
    { provide: ShopStarterContent, useClass: MaterialsStarterContent },
  ],
  exports: [MaterialsService, FinishesService, MaterialGroupsService, EffectsService, CautionsService, ShopStarterContent],
})
export class MaterialsModule {}
