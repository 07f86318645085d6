import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, asc, desc, eq, gt, lt, lte, notInArray, or, type SQL, sql } from 'drizzle-orm';
import { GENESIS_HASH, type LinkedEvent } from './ledger-chain';

const { ledgerEvent, ledgerHead, member } = schema;

export type LedgerFilter = {
  readonly subjectType?: string;
  readonly subjectId?: string;
  /** Also finds what belongs to the thing: C-0117 the cell C-0117 B4. */
  readonly subjectCode?: string;
  readonly action?: string;
  readonly actorMemberId?: string;
  /** Days of the shop's calendar, both included. */
  readonly fromDay?: string;
  readonly toDay?: string;
  readonly hiddenSubjectTypes: readonly string[];
};
export type SeqRange = { readonly beforeSeq?: number; readonly afterSeq?: number; readonly upToSeq?: number };
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
  async list(tx: Tx, shopId: string, { filter, range }: { filter: LedgerFilter; range: SeqRange }, limit: number): Promise<LinkedEvent[]> {
    const rows = await tx
      .select()
      .from(ledgerEvent)
      .where(and(matches(shopId, filter), within(range)))
      .orderBy(desc(ledgerEvent.seq))
      .limit(limit);
    return rows.map(toLinkedEvent);
  }

  /** Oldest first, for files. */
  async listInOrder(
    tx: Tx,
    shopId: string,
    { filter, range }: { filter: LedgerFilter; range: SeqRange },
    limit: number,
  ): Promise<LinkedEvent[]> {
    const rows = await tx
      .select()
      .from(ledgerEvent)
      .where(and(matches(shopId, filter), within(range)))
      .orderBy(asc(ledgerEvent.seq))
      .limit(limit);
    return rows.map(toLinkedEvent);
  }

  /** Everybody who is or was in the shop: whoever acted is among them. */
  async actors(tx: Tx, shopId: string): Promise<{ memberId: string; name: string; isActive: boolean }[]> {
    const rows = await tx
      .select({ memberId: member.id, name: member.printedName, state: member.state })
      .from(member)
      .where(eq(member.shopId, shopId))
      .orderBy(sql`lower(${member.printedName})`, member.id);
    return rows.map(({ memberId, name, state }) => ({ memberId, name, isActive: state === 'active' }));
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

function matches(shopId: string, filter: LedgerFilter): SQL | undefined {
  const { subjectType, subjectId, subjectCode, action, actorMemberId, fromDay, toDay, hiddenSubjectTypes } = filter;
  return and(
    eq(ledgerEvent.shopId, shopId),
    subjectType === undefined ? undefined : eq(ledgerEvent.subjectType, subjectType),
    subjectId === undefined ? undefined : eq(ledgerEvent.subjectId, subjectId),
    subjectCode === undefined ? undefined : or(eq(ledgerEvent.subjectCode, subjectCode), isPartOf(subjectCode)),
    action === undefined ? undefined : eq(ledgerEvent.action, action),
    actorMemberId === undefined ? undefined : eq(ledgerEvent.actorMemberId, actorMemberId),
    fromDay === undefined ? undefined : sql`${ledgerEvent.at} >= ${startOfDay(shopId, fromDay, 0)}`,
    toDay === undefined ? undefined : sql`${ledgerEvent.at} < ${startOfDay(shopId, toDay, 1)}`,
    hiddenSubjectTypes.length === 0 ? undefined : notInArray(ledgerEvent.subjectType, [...hiddenSubjectTypes]),
  );
}

function within({ beforeSeq, afterSeq, upToSeq }: SeqRange): SQL | undefined {
  return and(
    beforeSeq === undefined ? undefined : lt(ledgerEvent.seq, beforeSeq),
    afterSeq === undefined ? undefined : gt(ledgerEvent.seq, afterSeq),
    upToSeq === undefined ? undefined : lte(ledgerEvent.seq, upToSeq),
  );
}

/** Comparisons instead of LIKE: only they use an index under row-level security. "!" follows the space in the database's order. */
const isPartOf = (code: string) => and(sql`${ledgerEvent.subjectCode} >= ${`${code} `}`, sql`${ledgerEvent.subjectCode} < ${`${code}!`}`);

/** The moment a day begins where the shop is, some days later. */
const startOfDay = (shopId: string, day: string, laterDays: number) =>
  sql`((${day}::date + ${laterDays}::int)::timestamp at time zone (select time_zone from shop where id = ${shopId}::uuid))`;

const toLinkedEvent = (row: typeof ledgerEvent.$inferSelect): LinkedEvent => ({ ...row, at: row.at.toISOString() });
