import { Module } from '@nestjs/common';
import { LedgerModule } from '../ledger/ledger.module';
import { MachinesModule } from '../machines/machines.module';
import { MailModule } from '../mail/mail.module';
import { RecipesModule } from '../recipes/recipes.module';
import { ShopsModule } from '../shops/shops.module';
import { ApprovalChecksService } from './approval-checks.service';
import { ApprovalsService } from './approvals.service';
import { SignOffLettersService } from './sign-off-letters.service';
import { SignOffQueueController } from './sign-off-queue.controller';
import { SignOffQueueService } from './sign-off-queue.service';
import { SignOffsController } from './sign-offs.controller';
import { SignOffsRepository } from './sign-offs.repository';
import { SignOffsService } from './sign-offs.service';
import { SignaturesService } from './signatures.service';
import { SigningActsService } from './signing-acts.service';

/** Who may say what of a revision, and what it takes. */
@Module({
  imports: [LedgerModule, MachinesModule, MailModule, RecipesModule, ShopsModule],
  controllers: [SignOffsController, SignOffQueueController],
  providers: [
    SignOffsService,
    ApprovalsService,
    SigningActsService,
    ApprovalChecksService,
    SignOffQueueService,
    SignOffLettersService,
    SignaturesService,
    SignOffsRepository,
  ],
})
export class SignOffsModule {}
