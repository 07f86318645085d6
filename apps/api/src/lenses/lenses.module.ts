import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { LensesController } from './lenses.controller';
import { LensesRepository } from './lenses.repository';
import { LensesService } from './lenses.service';

@Module({
  imports: [LedgerModule],
  controllers: [LensesController],
  providers: [LensesService, LensesRepository],
  exports: [LensesService],
})
export class LensesModule {}
