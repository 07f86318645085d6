import { sql } from 'drizzle-orm';
import {
  boolean,
  check,
  doublePrecision,
  foreignKey,
  index,
  integer,
  jsonb,
  pgTable,
  primaryKey,
  text,
  unique,
  uuid,
} from 'drizzle-orm/pg-core';
import { authorship, shopPolicy, tenantKey } from '../columns';
import { cell, coupon } from './coupons';
import { machine, machineProfile } from './machines';
import { member } from './people';
import { run } from './runs';

/**
 * A mark that somebody clocked on a machine: what was marked, copied as physical values, and the seconds. Never changed: a mistake is
 * superseded by another row, which says why and may take the time out of the count.
 */
export const loggedTime = pgTable(
  'logged_time',
  {
    ...tenantKey(),
    machineId: uuid().notNull(),
    /** Profile that was in force, so that a changed scan head starts anew. */
    profileNumber: integer().notNull(),
    runId: uuid(),
    couponId: uuid(),
    /** One cell of the coupon; absent: all of its marked cells. */
    cellId: uuid(),
    areas: jsonb().$type<Record<string, unknown>[]>().notNull(),
    /** Pauses between mark steps within the time, known from the setting. */
    pausesS: doublePrecision().notNull().default(0),
    seconds: doublePrecision().notNull(),
    counts: boolean().notNull().default(true),
    supersedesId: uuid(),
    reason: text().notNull().default(''),
    loggedByName: text().notNull(),
    ...authorship(),
  },
  (t) => [
    primaryKey({ columns: [t.shopId, t.id] }),
    unique('logged_time_machine_unique').on(t.shopId, t.machineId, t.id),
    unique('logged_time_superseded_once').on(t.shopId, t.supersedesId),
    foreignKey({ columns: [t.shopId, t.machineId], foreignColumns: [machine.shopId, machine.id], name: 'logged_time_machine_fk' }),
    foreignKey({
      columns: [t.shopId, t.machineId, t.profileNumber],
      foreignColumns: [machineProfile.shopId, machineProfile.machineId, machineProfile.number],
      name: 'logged_time_profile_fk',
    }),
    foreignKey({ columns: [t.shopId, t.runId], foreignColumns: [run.shopId, run.id], name: 'logged_time_run_fk' }),
    foreignKey({ columns: [t.shopId, t.couponId], foreignColumns: [coupon.shopId, coupon.id], name: 'logged_time_coupon_fk' }),
    foreignKey({
      columns: [t.shopId, t.couponId, t.cellId],
      foreignColumns: [cell.shopId, cell.couponId, cell.id],
      name: 'logged_time_cell_fk',
    }),
    foreignKey({
      columns: [t.shopId, t.machineId, t.supersedesId],
      foreignColumns: [t.shopId, t.machineId, t.id],
      name: 'logged_time_supersedes_fk',
    }),
    foreignKey({ columns: [t.shopId, t.createdBy], foreignColumns: [member.shopId, member.id], name: 'logged_time_author_fk' }),
    check('logged_time_seconds', sql`${t.pausesS} >= 0 and ${t.seconds} > ${t.pausesS}`),
    check(
      'logged_time_subject',
      sql`(${t.runId} is null) <> (${t.couponId} is null) and (${t.cellId} is null or ${t.couponId} is not null)`,
    ),
    check('logged_time_correction', sql`case when ${t.supersedesId} is null then ${t.counts} else ${t.reason} <> '' end`),
    index('logged_time_of_machine').on(t.shopId, t.machineId, t.createdAt),
    index('logged_time_of_run').on(t.shopId, t.runId),
    index('logged_time_of_coupon').on(t.shopId, t.couponId),
    shopPolicy('logged_time'),
  ],
);
