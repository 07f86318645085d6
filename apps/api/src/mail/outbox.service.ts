import { Injectable } from '@nestjs/common';
import type { Tx } from '../database/unit-of-work';
import { JobsService } from '../jobs/jobs.service';
import type { Mail } from './mail-kinds';
import { OutboxRepository } from './outbox.repository';

export type DeadLetter = {
  readonly id: string;
  readonly kind: string;
  readonly address: string;
  readonly reason: string;
  readonly writtenAt: Date;
};

const MOST_DEAD_LETTERS = 100;

/** Writes mail as part of the caller's transaction; the worker sends it after the commit. No request ever waits for a mail server. */
@Injectable()
export class OutboxService {
  constructor(
    private readonly repository: OutboxRepository,
    private readonly jobs: JobsService,
  ) {}

  /** One mail to one person. */
  async add(tx: Tx, { shopId, kind, payload }: Mail & { readonly shopId: string }): Promise<void> {
    const outboxId = await this.repository.insert(tx, { shopId, kind, payload: { ...payload } });
    await this.jobs.add(tx, 'mail.send', { outboxId }, { key: outboxId });
  }

  /** Mail that was refused for good or given up, newest first. */
  async listDeadLetters(tx: Tx, shopId: string): Promise<DeadLetter[]> {
    const rows = await this.repository.listFailed(tx, shopId, MOST_DEAD_LETTERS);
    return rows.map((row) => ({
      id: row.id,
      kind: row.kind,
      address: addressOf(row.payload),
      reason: row.failure ?? '',
      writtenAt: row.createdAt,
    }));
  }
}

function addressOf(payload: Record<string, unknown>): string {
  const { to } = payload;
  return typeof to === 'object' && to !== null && 'address' in to ? String(to.address) : '';
}
