import { Inject, Injectable } from '@nestjs/common';
import { type DbHandle, expectedSchemaLevel } from '@proofplate/db';
import { sql } from 'drizzle-orm';
import { DATABASE } from '../database/unit-of-work';

/** Asks outside any shop, so outside the unit of work. */
@Injectable()
export class HealthRepository {
  private readonly expected = expectedSchemaLevel();

  constructor(@Inject(DATABASE) private readonly handle: DbHandle) {}

  /** True when the database answers and is at least at the level that this code was built for (a newer one must stay compatible). */
  async isAtExpectedLevel(): Promise<boolean> {
    const [row] = await this.handle.db.execute<{ level: number }>(sql`select schema_level() as level`);
    return row !== undefined && row.level >= this.expected;
  }
}
