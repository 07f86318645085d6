import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { LoggedTimesRepository } from './logged-times.repository';
import { MachinesModule } from './machines.module';
import { MarkingTimesController } from './marking-times.controller';
import { MarkingTimesService } from './marking-times.service';

@Module({
  imports: [LedgerModule, MachinesModule],
  controllers: [MarkingTimesController],
  providers: [MarkingTimesService, LoggedTimesRepository],
  exports: [MarkingTimesService],
})
export class MarkingTimesModule {}
