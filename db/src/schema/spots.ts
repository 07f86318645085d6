import { sql } from 'drizzle-orm';
import { check, date, doublePrecision, foreignKey, index, jsonb, pgTable, primaryKey, text, uuid } from 'drizzle-orm/pg-core';
import { authorship, shopPolicy, tenantKey } from '../columns';
import { coupon } from './coupons';
import { machineLens } from './machines';
import { member } from './people';

/**
 * Every spot that was ever measured of a lens on a machine, typed or from the craters of a coupon. Never changed: machine_lens holds the
 * one in use. `fit` is what a coupon's craters gave on the day they were used.
 */
export const spotMeasurement = pgTable(
  'spot_measurement',
  {
    ...tenantKey(),
    machineLensId: uuid().notNull(),
    spotUm: doublePrecision().notNull(),
    standardErrorUm: doublePrecision(),
    method: text().notNull(),
    measuredOn: date().notNull(),
    couponId: uuid(),
    fit: jsonb().$type<Record<string, unknown>>(),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    foreignKey({
      columns: [t.shopId, t.machineLensId],
      foreignColumns: [machineLens.shopId, machineLens.id],
      name: 'spot_measurement_lens_fk',
    }),
    foreignKey({ columns: [t.shopId, t.couponId], foreignColumns: [coupon.shopId, coupon.id], name: 'spot_measurement_coupon_fk' }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'spot_measurement_author_fk' }),
    check('spot_measurement_sizes', sql`${t.spotUm} > 0 and coalesce(${t.standardErrorUm} >= 0, true)`),
    check('spot_measurement_fit_of_coupon', sql`(${t.couponId} is null) = (${t.fit} is null)`),
    index('spot_measurement_lens').on(t.shopId, t.machineLensId, t.createdAt),
    shopPolicy('spot_measurement'),
  ],
);
