import { Injectable } from '@nestjs/common';
import { sql } from 'drizzle-orm';
import type { Executor } from '../database/unit-of-work';

export type TryLimit = {
  /** Tries per window. */
  readonly limit: number;
  readonly windowMinutes: number;
  /** Tries without a pause; each one beyond doubles it. */
  readonly free: number;
  /** Failures in a row after which only a reset helps. */
  readonly rowLimit: number;
};

@Injectable()
export class ThrottleRepository {
  /** 0: go on; above: seconds to wait; below: only a reset helps. */
  async take(db: Executor, subject: string, { limit, windowMinutes, free, rowLimit }: TryLimit): Promise<number> {
    const [row] = await db.execute<{ wait: number }>(sql`select account_take_try(${subject}::text, ${limit}::int,
      make_interval(mins => ${windowMinutes}::int), ${free}::int, ${rowLimit}::int) as wait`);
    return row?.wait ?? 0;
  }

  async succeeded(db: Executor, subject: string, startsAfresh: boolean): Promise<void> {
    await db.execute(sql`select account_try_succeeded(${subject}::text, ${startsAfresh}::boolean)`);
  }
}
