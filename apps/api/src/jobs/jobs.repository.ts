import { Injectable } from '@nestjs/common';
import type { Tx } from '@proofplate/db';
import { sql } from 'drizzle-orm';

export type NewJob = {
  readonly task: string;
  readonly payload: Readonly<Record<string, string>>;
  readonly key: string | undefined;
  readonly delayS: number;
};

@Injectable()
export class JobsRepository {
  /** The application's role has no right on the queue itself, only on this function. */
  async insert(tx: Tx, { task, payload, key, delayS }: NewJob): Promise<void> {
    await tx.execute(
      sql`select queue.enqueue_job(${task}::text, ${JSON.stringify(payload)}::text::jsonb, ${key ?? null}::text, ${delayS}::integer)`,
    );
  }
}
