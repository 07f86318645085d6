import { sql } from 'drizzle-orm';
import { integer, pgPolicy, timestamp, uuid } from 'drizzle-orm/pg-core';
import { uuidv7 } from 'uuidv7';

/** Time of an act, with zone; the database's clock unless the caller names a past moment. */
export const moment = () => timestamp({ withTimezone: true, mode: 'date' });

/** Key columns of every tenant table: (shop_id, id), id a uuid v7. */
export const tenantKey = () => ({
  shopId: uuid().notNull(),
  id: uuid()
    .notNull()
    .$defaultFn(() => uuidv7()),
});

/** Who made the row and when. `createdBy` is a member of the same shop. */
export const authorship = () => ({
  createdAt: moment().notNull().defaultNow(),
  createdBy: uuid().notNull(),
});

/** Strong ETag of editable rows. */
export const editVersion = () => ({ version: integer().notNull().default(1) });

/**
 * Row-level security of a tenant table. Fails closed: without the transaction's setting the cast raises an error instead of
 * yielding no rows. The scalar sub-select makes it one init plan, so that indexes on shop_id stay usable.
 */
export const shopPolicy = (table: string) =>
  pgPolicy(`${table}_shop`, {
    as: 'permissive',
    for: 'all',
    to: 'public',
    using: sql`shop_id = (select current_setting('app.shop_id')::uuid)`,
    withCheck: sql`shop_id = (select current_setting('app.shop_id')::uuid)`,
  });
