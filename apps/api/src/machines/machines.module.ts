import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { ShopsModule } from '../shops/shops.module';
import { CalibrationsController } from './calibrations.controller';
import { CalibrationsRepository } from './calibrations.repository';
import { CalibrationsService } from './calibrations.service';
import { MachineLensesController } from './machine-lenses.controller';
import { MachineLensesRepository } from './machine-lenses.repository';
import { MachineLensesService } from './machine-lenses.service';
import { MachinesController } from './machines.controller';
import { MachinesRepository } from './machines.repository';
import { MachinesService } from './machines.service';
import { SpotMeasurementsRepository } from './spot-measurements.repository';

@Module({
  imports: [LedgerModule, ShopsModule],
  controllers: [MachinesController, MachineLensesController, CalibrationsController],
  providers: [
    MachinesService,
    MachineLensesService,
    CalibrationsService,
    MachinesRepository,
    MachineLensesRepository,
    SpotMeasurementsRepository,
    CalibrationsRepository,
  ],
  exports: [MachinesService, MachineLensesService, CalibrationsService],
})
export class MachinesModule {}
