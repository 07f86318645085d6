import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, asc, desc, eq, gt, lt, lte, notInArray, type SQL, sql } from 'drizzle-orm';
import { GENESIS_HASH, type LinkedEvent } from './ledger-chain';

const { ledgerEvent, ledgerHead } = schema;

export type LedgerFilter = {
  readonly beforeSeq?: number;
  readonly subjectType?: string;
  readonly subjectId?: string;
  readonly action?: string;
  readonly actorMemberId?: string;
  readonly hiddenSubjectTypes: readonly string[];
};
export type ChainHead = { readonly seq: number; readonly hash: string };

@Injectable()
export class LedgerRepository {
  async insertHead(tx: Tx, shopId: string): Promise<void> {
    await tx.insert(ledgerHead).values({ shopId, seq: 0, hash: GENESIS_HASH });
  }

  /** Locks the end of the shop's chain and reads the database's clock in whole milliseconds, as hashes hold it. */
  async lockHead(tx: Tx, shopId: string): Promise<ChainHead & { readonly at: Date }> {
    const [head] = await tx
      .select({ seq: ledgerHead.seq, hash: ledgerHead.hash, at: sql<string>`(extract(epoch from clock_timestamp()) * 1000)::bigint::text` })
      .from(ledgerHead)
      .where(eq(ledgerHead.shopId, shopId))
      .for('update');
    if (head === undefined) throw new Error('the shop has no ledger');
    return { seq: head.seq, hash: head.hash, at: new Date(Number(head.at)) };
  }

  async head(tx: Tx, shopId: string): Promise<ChainHead> {
    const [head] = await tx.select({ seq: ledgerHead.seq, hash: ledgerHead.hash }).from(ledgerHead).where(eq(ledgerHead.shopId, shopId));
    if (head === undefined) throw new Error('the shop has no ledger');
    return head;
  }

  async append(tx: Tx, event: LinkedEvent): Promise<void> {
    await tx.insert(ledgerEvent).values({ ...event, at: new Date(event.at) });
    await tx.update(ledgerHead).set({ seq: event.seq, hash: event.hash }).where(eq(ledgerHead.shopId, event.shopId));
  }

  /** Newest first. */
  async list(tx: Tx, shopId: string, filter: LedgerFilter, limit: number): Promise<LinkedEvent[]> {
    const conditions: (SQL | undefined)[] = [
      eq(ledgerEvent.shopId, shopId),
      filter.beforeSeq === undefined ? undefined : lt(ledgerEvent.seq, filter.beforeSeq),
      filter.subjectType === undefined ? undefined : eq(ledgerEvent.subjectType, filter.subjectType),
      filter.subjectId === undefined ? undefined : eq(ledgerEvent.subjectId, filter.subjectId),
      filter.action === undefined ? undefined : eq(ledgerEvent.action, filter.action),
      filter.actorMemberId === undefined ? undefined : eq(ledgerEvent.actorMemberId, filter.actorMemberId),
      filter.hiddenSubjectTypes.length === 0 ? undefined : notInArray(ledgerEvent.subjectType, [...filter.hiddenSubjectTypes]),
    ];
    const rows = await tx
      .select()
      .from(ledgerEvent)
      .where(and(...conditions))
      .orderBy(desc(ledgerEvent.seq))
      .limit(limit);
    return rows.map(toLinkedEvent);
  }

  /** A stretch of the chain in order. */
  async stretch(
    tx: Tx,
    shopId: string,
    range: { readonly afterSeq: number; readonly upToSeq: number },
    limit: number,
  ): Promise<LinkedEvent[]> {
    const rows = await tx
      .select()
      .from(ledgerEvent)
      .where(and(eq(ledgerEvent.shopId, shopId), gt(ledgerEvent.seq, range.afterSeq), lte(ledgerEvent.seq, range.upToSeq)))
      .orderBy(asc(ledgerEvent.seq))
      .limit(limit);
    return rows.map(toLinkedEvent);
  }
}

const toLinkedEvent = (row: typeof ledgerEvent.$inferSelect): LinkedEvent => ({ ...row, at: row.at.toISOString() });
