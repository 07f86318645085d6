import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';

/** What the worker is told to do after the commit. `kind` names the mail template or job. */
export type OutboxMessage = { readonly kind: string; readonly payload: Readonly<Record<string, unknown>> };

/** Messages written in the transaction of the change they tell of; sent later by the worker process. */
@Injectable()
export class Outbox {
  async add(tx: Tx, shopId: string, message: OutboxMessage): Promise<void> {
    await tx.insert(schema.outbox).values({ shopId, kind: message.kind, payload: { ...message.payload } });
  }
}
