import { sql } from 'drizzle-orm';
import { check, foreignKey, integer, jsonb, pgPolicy, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { uuidv7 } from 'uuidv7';
import { editVersion, moment, shopPolicy, tenantKey } from '../columns';

/** A tenant. Its own id is the shop_id of every other table. */
export const shop = pgTable(
  'shop',
  {
    id: uuid()
      .primaryKey()
      .$defaultFn(() => uuidv7()),
    name: text().notNull(),
    unitSystem: text().notNull().default('metric'),
    timeZone: text().notNull().default('UTC'),
    locale: text().notNull().default('en-GB'),
    policy: jsonb().$type<ShopPolicyRow>().notNull(),
    createdAt: moment().notNull().defaultNow(),
    ...editVersion(),
  },
  (t) => [
    check('shop_unit_system', sql`${t.unitSystem} in ('metric','inch')`),
    pgPolicy('shop_shop', {
      as: 'permissive',
      for: 'all',
      to: 'public',
      using: sql`id = (select current_setting('app.shop_id')::uuid)`,
      withCheck: sql`id = (select current_setting('app.shop_id')::uuid)`,
    }),
  ],
);

/** Rules of the shop that only its owner changes, by a signed act. */
export type ShopPolicyRow = {
  minimumConfirmationMarks: number;
  authorMaySign: boolean;
  reviewEveryDays: number;
  overdueBlocks: boolean;
  photoRequired: boolean;
  calibrationAgeDays: number;
  powerShiftPercent: number;
  secondFactorForSigning: boolean;
};

/** The last number given out per kind of code; numbers are never reused. */
export const codeCounter = pgTable(
  'code_counter',
  { shopId: uuid().notNull(), kind: text().notNull(), lastNumber: integer().notNull().default(0) },
  (t) => [
    primaryKey({ columns: [t.shopId, t.kind] }),
    foreignKey({ columns: [t.shopId], foreignColumns: [shop.id], name: 'code_counter_shop_fk' }),
    check('code_counter_kind', sql`${t.kind} in ('coupon','recipe','run')`),
    shopPolicy('code_counter'),
  ],
);

/** One member's answer to a creating or signing call, kept so that a repeat gets the same answer. */
export const idempotencyKey = pgTable(
  'idempotency_key',
  {
    shopId: uuid().notNull(),
    memberId: uuid().notNull(),
    route: text().notNull(),
    key: text().notNull(),
    requestHash: text().notNull(),
    responseStatus: integer(),
    responseBody: jsonb().$type<unknown>(),
    createdAt: moment().notNull().defaultNow(),
  },
  (t) => [primaryKey({ columns: [t.shopId, t.memberId, t.route, t.key] }), shopPolicy('idempotency_key')],
);

/** Events that other systems are told about; written with the change, sent later by the worker. */
export const outbox = pgTable(
  'outbox',
  {
    ...tenantKey(),
    kind: text().notNull(),
    payload: jsonb().$type<Record<string, unknown>>().notNull(),
    state: text().notNull().default('waiting'),
    attempts: integer().notNull().default(0),
    failure: text(),
    createdAt: moment().notNull().defaultNow(),
    sentAt: moment(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({ columns: [t.shopId], foreignColumns: [shop.id], name: 'outbox_shop_fk' }),
    check('outbox_state', sql`${t.state} in ('waiting','sent','failed')`),
    shopPolicy('outbox'),
  ],
);
