import { Module } from '@nestjs/common';
import { LedgerController } from './ledger.controller';
import { LedgerRepository } from './ledger.repository';
import { LedgerService } from './ledger.service';
import { LedgerExportService } from './ledger-export.service';

@Module({ controllers: [LedgerController], providers: [LedgerService, LedgerExportService, LedgerRepository], exports: [LedgerService] })
export class LedgerModule {}
