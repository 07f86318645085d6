import { schema } from '@proofplate/db';
import { and, eq, sql } from 'drizzle-orm';
import { minutesAfter, type Turn } from '../stage/stage';
import type { CouponRecord } from './records';

const { cell, coupon } = schema;

const MINUTES_PER_CELL = 0.5;
const AMBIENT = '21 °C, extraction on';

export const minutesOfMarking = ({ cells }: CouponRecord) => cells.length * MINUTES_PER_CELL;

/** Marks a plate cell by cell in run order; `share` of it when somebody was called away. */
export async function markCoupon(turn: Turn, record: CouponRecord, share = 1): Promise<void> {
  const { id, code, cells } = record;
  const subject = { subjectType: 'coupon', subjectId: id, subjectCode: code, before: { state: 'planned' } };
  const isCoupon = and(eq(coupon.shopId, turn.shopId), eq(coupon.id, id));
  await turn.tx.update(coupon).set({ markingStartedAt: turn.at, version: 2 }).where(isCoupon);
  await turn.tell({ action: 'coupon.marking-started', ...subject });
  const marked = cells.slice(0, Math.ceil(cells.length * share));
  for (const [index, { id: cellId, address }] of marked.entries()) {
    const at = minutesAfter(turn.at, (index + 1) * MINUTES_PER_CELL);
    const isCell = and(eq(cell.shopId, turn.shopId), eq(cell.id, cellId));
    await turn.tx
      .update(cell)
      .set({ markState: 'marked', markedAt: at, markedBy: turn.by.memberId, version: sql`${cell.version} + 1` })
      .where(isCell);
    const states = { before: body('planned'), after: body('marked') };
    await turn.tell(
      { action: 'cell.marked', subjectType: 'cell', subjectId: cellId, subjectCode: `${code} ${address}`, ...states },
      { at },
    );
  }
  if (marked.length < cells.length) return;
  const markedAt = minutesAfter(turn.at, minutesOfMarking(record));
  record.markedAt = markedAt;
  const change = { state: 'marked', markedAt, markedBy: turn.by.memberId, ambientNotes: AMBIENT };
  await turn.tx
    .update(coupon)
    .set({ ...change, version: 3 })
    .where(isCoupon);
  await turn.tell({ action: 'coupon.marked', ...subject, after: change }, { at: markedAt });
}

const body = (markState: string) => ({ markState, markNote: '', actualParameters: null });
