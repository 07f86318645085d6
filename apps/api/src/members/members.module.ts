import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { MailModule } from '../mail/mail.module';
import { ShopsModule } from '../shops/shops.module';
import { InvitationsController } from './invitations.controller';
import { InvitationsRepository } from './invitations.repository';
import { InvitationsService } from './invitations.service';
import { MembersController } from './members.controller';
import { MembersRepository } from './members.repository';
import { MembersService } from './members.service';
import { TrainingRecordsController } from './training-records.controller';
import { TrainingRecordsRepository } from './training-records.repository';
import { TrainingRecordsService } from './training-records.service';

@Module({
  imports: [LedgerModule, MailModule, ShopsModule],
  controllers: [MembersController, InvitationsController, TrainingRecordsController],
  providers: [
    MembersService,
    MembersRepository,
    InvitationsService,
    InvitationsRepository,
    TrainingRecordsService,
    TrainingRecordsRepository,
  ],
  exports: [MembersService, InvitationsService],
})
export class MembersModule {}
