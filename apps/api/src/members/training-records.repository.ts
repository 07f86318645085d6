import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq } from 'drizzle-orm';

const { trainingRecord, member } = schema;

export type NewTrainingRecord = {
  readonly id: string;
  readonly shopId: string;
  readonly memberId: string;
  readonly subject: string;
  readonly taughtBy: string;
  readonly taughtOn: Date;
  readonly expiresOn: Date | null;
  readonly createdBy: string;
};

@Injectable()
export class TrainingRecordsRepository {
  async insert(tx: Tx, record: NewTrainingRecord): Promise<void> {
    await tx.insert(trainingRecord).values(record);
  }

  /** The latest training first. */
  async list(tx: Tx, shopId: string, memberId: string) {
    return tx
      .select({ row: trainingRecord, recordedBy: member.printedName })
      .from(trainingRecord)
      .innerJoin(member, and(eq(member.shopId, trainingRecord.shopId), eq(member.id, trainingRecord.createdBy)))
      .where(and(eq(trainingRecord.shopId, shopId), eq(trainingRecord.memberId, memberId)))
      .orderBy(desc(trainingRecord.taughtOn), desc(trainingRecord.id));
  }
}
