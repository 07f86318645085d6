import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq } from 'drizzle-orm';

const { signOff, revisionNow } = schema;

export type WithdrawalRow = { readonly by: string; readonly at: Date; readonly reason: string };

/** Why a run that is under way must go no further: what became of its revision since it was started. */
@Injectable()
export class RunStopsRepository {
  async withdrawal(tx: Tx, shopId: string, revisionId: string): Promise<WithdrawalRow | undefined> {
    const [row] = await tx
      .select({ by: signOff.printedName, at: signOff.signedAt, reason: signOff.comment })
      .from(signOff)
      .where(and(eq(signOff.shopId, shopId), eq(signOff.revisionId, revisionId), eq(signOff.meaning, 'withdrawn')))
      .orderBy(desc(signOff.signedAt))
      .limit(1);
    return row;
  }

  /** Number of the revision of the recipe that is approved now. */
  async approvedNumber(tx: Tx, shopId: string, recipeId: string): Promise<number | null> {
    const [row] = await tx
      .select({ number: revisionNow.number })
      .from(revisionNow)
      .where(and(eq(revisionNow.shopId, shopId), eq(revisionNow.recipeId, recipeId), eq(revisionNow.state, 'approved')));
    return row?.number ?? null;
  }
}
