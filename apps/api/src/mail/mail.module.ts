import { Module } from '@nestjs/common';
import { JobsModule } from '../jobs/jobs.module';
import { OutboxRepository } from './outbox.repository';
import { OutboxService } from './outbox.service';

/** Writing mail: all that the api needs. */
@Module({ imports: [JobsModule], providers: [OutboxService, OutboxRepository], exports: [OutboxService] })
export class MailModule {}
