import { Module } from '@nestjs/common';
import { JobsModule } from '../jobs/jobs.module';
import { OutboxRepository } from './outbox.repository';
import { OutboxService } from './outbox.service';
import { UndeliveredLettersController } from './undelivered-letters.controller';

/** Writing mail: all that the api needs. */
@Module({
  imports: [JobsModule],
  controllers: [UndeliveredLettersController],
  providers: [OutboxService, OutboxRepository],
  exports: [OutboxService],
})
export class MailModule {}
