import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { sql } from 'drizzle-orm';

const { codeCounter } = schema;

export type CodeKind = 'coupon' | 'recipe' | 'run';
const LETTERS: Readonly<Record<CodeKind, string>> = { coupon: 'C', recipe: 'R', run: 'J' };
const MIN_DIGITS = 4;

/** Codes that people read: C-0001, R-0001, J-0001. Per shop, never reused; a rolled back transaction leaves no gap. */
@Injectable()
export class Codes {
  /** The counter row stays locked until the transaction ends, so take the code late. */
  async nextCode(tx: Tx, shopId: string, kind: CodeKind): Promise<string> {
    const [counter] = await tx
      .insert(codeCounter)
      .values({ shopId, kind, lastNumber: 1 })
      .onConflictDoUpdate({ target: [codeCounter.shopId, codeCounter.kind], set: { lastNumber: sql`${codeCounter.lastNumber} + 1` } })
      .returning({ number: codeCounter.lastNumber });
    if (counter === undefined) throw new Error('the code counter gave no number');
    return `${LETTERS[kind]}-${String(counter.number).padStart(MIN_DIGITS, '0')}`;
  }
}
