import { Module } from '@nestjs/common';
import { JobsModule } from '../jobs/jobs.module';
import { Mailer } from './mailer';
import { OutboxRepository } from './outbox.repository';
import { OutboxConsumer } from './outbox-consumer';

/** Sending mail: in the worker process only. */
@Module({ imports: [JobsModule], providers: [OutboxConsumer, OutboxRepository, Mailer], exports: [OutboxConsumer] })
export class MailWorkerModule {}
