import { bigint, foreignKey, index, jsonb, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { moment, shopPolicy } from '../columns';
import { shop } from './shops';

/** Append-only trail of a shop: hash = SHA-256(previousHash ‖ seq ‖ canonical body). */
export const ledgerEvent = pgTable(
  'ledger_event',
  {
    shopId: uuid().notNull(),
    seq: bigint({ mode: 'number' }).notNull(),
    at: moment().notNull(),
    actorMemberId: uuid(),
    actorName: text().notNull(),
    sessionId: uuid(),
    action: text().notNull(),
    subjectType: text().notNull(),
    subjectId: uuid().notNull(),
    subjectCode: text(),
    before: jsonb().$type<unknown>(),
    after: jsonb().$type<unknown>(),
    bodyHash: text().notNull(),
    previousHash: text().notNull(),
    hash: text().notNull(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.seq] }),
    foreignKey({ columns: [t.shopId], foreignColumns: [shop.id], name: 'ledger_event_shop_fk' }),
    index('ledger_event_subject').on(t.shopId, t.subjectId, t.seq),
    index('ledger_event_code').on(t.shopId, t.subjectCode, t.seq),
    index('ledger_event_actor').on(t.shopId, t.actorMemberId, t.seq),
    shopPolicy('ledger_event'),
  ],
);

/** The last event of a shop's chain; locked last in each transaction. */
export const ledgerHead = pgTable(
  'ledger_head',
  {
    shopId: uuid().primaryKey(),
    seq: bigint({ mode: 'number' }).notNull().default(0),
    hash: text().notNull(),
  },
  (t) => [foreignKey({ columns: [t.shopId], foreignColumns: [shop.id], name: 'ledger_head_shop_fk' }), shopPolicy('ledger_head')],
);
