import { Injectable } from '@nestjs/common';
import { Env } from '../config/env.validation';
import { UnitOfWork } from '../database/unit-of-work';
import type { Job } from '../jobs/job-tasks';
import { JobsService } from '../jobs/jobs.service';
import { composeLetter } from './compose-letter';
import type { Mail } from './mail-kinds';
import { mailLinks } from './mail-links';
import { type Delivery, Mailer } from './mailer';
import { OutboxRepository, type OutboxRow } from './outbox.repository';
import { isPastPatience, retryDelayS } from './retry-delay';

/**
 * Sends what stands in the outbox, at least once: a crash between the server's yes and our note of it sends the mail again, with the same
 * Message-ID. The job is unique per row, so two workers never send one mail at the same time.
 */
@Injectable()
export class OutboxConsumer {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly repository: OutboxRepository,
    private readonly jobs: JobsService,
    private readonly mailer: Mailer,
    private readonly env: Env,
  ) {}

  async send({ shopId, outboxId }: Job<'mail.send'>): Promise<void> {
    const found = await this.unitOfWork.read({ shopId }, async (tx) => ({
      row: await this.repository.find(tx, shopId, outboxId),
      timeZone: await this.repository.timeZoneOf(tx, shopId),
    }));
    const { row, timeZone } = found;
    if (row?.state !== 'waiting') return;
    const delivery = await this.deliver(row, timeZone);
    await this.settle(row, delivery);
  }

  private async deliver(row: OutboxRow, timeZone: string): Promise<Delivery> {
    // The row was written by OutboxService.add, which takes nothing but a Mail.
    const mail = { kind: row.kind, payload: row.payload } as unknown as Mail;
    const letter = composeLetter(mail, mailLinks(this.env.PUBLIC_ORIGIN), timeZone);
    if (letter === undefined) return { outcome: 'never', reason: `There is no template for ${row.kind}.` };
    return this.mailer.deliver(row.id, mail.payload.to, letter);
  }

  /** A mail that may pass later gets a new job: the queue's own pauses grow too long for a mail server that was away for ten minutes. */
  private async settle(row: OutboxRow, delivery: Delivery): Promise<void> {
    const { shopId, id } = row;
    await this.unitOfWork.run({ shopId }, async (tx) => {
      if (delivery.outcome === 'sent') return this.repository.markSent(tx, shopId, id);
      if (delivery.outcome === 'never' || isPastPatience(row.createdAt, new Date())) {
        return this.repository.markFailed(tx, shopId, id, delivery.reason);
      }
      await this.repository.markTried(tx, shopId, id, delivery.reason);
      await this.jobs.add(tx, 'mail.send', { outboxId: id }, { key: id, delayS: retryDelayS(row.attempts + 1, Math.random()) });
    });
  }
}
