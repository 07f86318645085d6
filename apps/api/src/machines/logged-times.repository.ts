import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { MarkedArea } from '@proofplate/recipe-model';
import { and, desc, eq, notExists, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';

const { loggedTime, machineProfile, run, coupon, cell } = schema;
const before = alias(loggedTime, 'before');
const later = alias(loggedTime, 'later');

type Row = typeof loggedTime.$inferSelect;
export type LoggedTimeRow = Omit<Row, 'areas'> & { areas: MarkedArea[] };
export type NewLoggedTime = Omit<LoggedTimeRow, 'shopId' | 'id' | 'createdAt' | 'createdBy'>;
export type LoggedTimeView = {
  time: LoggedTimeRow;
  physicalNumber: number;
  runCode: string | null;
  couponCode: string | null;
  address: string | null;
  replaced: { seconds: number; loggedBy: string } | null;
};
/** Whose times are wanted. */
export type TimesOf = { readonly machineId: string } | { readonly runId: string } | { readonly couponId: string };

@Injectable()
export class LoggedTimesRepository {
  /** Those that nothing corrects, newest first. */
  async list(tx: Tx, shopId: string, of: TimesOf, limit: number): Promise<LoggedTimeView[]> {
    return this.views(tx, and(eq(loggedTime.shopId, shopId), conditionOf(of)), limit);
  }

  async find(tx: Tx, shopId: string, id: string): Promise<LoggedTimeView | undefined> {
    const [view] = await this.views(tx, and(eq(loggedTime.shopId, shopId), eq(loggedTime.id, id)), 1);
    return view;
  }

  /** False when another correction was quicker. */
  async insert(tx: Tx, shopId: string, createdBy: string, values: NewLoggedTime): Promise<string | undefined> {
    const [row] = await tx
      .insert(loggedTime)
      .values({ shopId, createdBy, ...values, areas: values.areas.map((area) => ({ ...area })) })
      .onConflictDoNothing({ target: [loggedTime.shopId, loggedTime.supersedesId] })
      .returning({ id: loggedTime.id });
    return row?.id;
  }

  private async views(tx: Tx, isWanted: SQL | undefined, limit: number): Promise<LoggedTimeView[]> {
    const supersededBy = tx
      .select({ one: sql`1` })
      .from(later)
      .where(and(eq(later.shopId, loggedTime.shopId), eq(later.supersedesId, loggedTime.id)));
    const rows = await tx
      .select({
        time: loggedTime,
        physicalNumber: machineProfile.physicalNumber,
        runCode: run.code,
        couponCode: coupon.code,
        address: cell.address,
        replacedSeconds: before.seconds,
        replacedBy: before.loggedByName,
      })
      .from(loggedTime)
      .innerJoin(
        machineProfile,
        and(
          eq(machineProfile.shopId, loggedTime.shopId),
          eq(machineProfile.machineId, loggedTime.machineId),
          eq(machineProfile.number, loggedTime.profileNumber),
        ),
      )
      .leftJoin(run, and(eq(run.shopId, loggedTime.shopId), eq(run.id, loggedTime.runId)))
      .leftJoin(coupon, and(eq(coupon.shopId, loggedTime.shopId), eq(coupon.id, loggedTime.couponId)))
      .leftJoin(cell, and(eq(cell.shopId, loggedTime.shopId), eq(cell.id, loggedTime.cellId)))
      .leftJoin(before, and(eq(before.shopId, loggedTime.shopId), eq(before.id, loggedTime.supersedesId)))
      .where(and(isWanted, notExists(supersededBy)))
      .orderBy(desc(loggedTime.createdAt), desc(loggedTime.id))
      .limit(limit);
    return rows.map(({ replacedSeconds, replacedBy, ...view }) => ({
      ...view,
      // only insert() writes this column
      time: { ...view.time, areas: view.time.areas as unknown as MarkedArea[] },
      replaced: replacedSeconds === null || replacedBy === null ? null : { seconds: replacedSeconds, loggedBy: replacedBy },
    }));
  }
}

function conditionOf(of: TimesOf): SQL {
  if ('machineId' in of) return eq(loggedTime.machineId, of.machineId);
  return 'runId' in of ? eq(loggedTime.runId, of.runId) : eq(loggedTime.couponId, of.couponId);
}
