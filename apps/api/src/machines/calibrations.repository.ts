import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, desc, eq, inArray, sql } from 'drizzle-orm';

const { powerCalibration, member } = schema;

export type CalibrationRow = typeof powerCalibration.$inferSelect;
export type CalibrationView = { calibration: CalibrationRow; createdByName: string };
export type CalibrationValues = Omit<CalibrationRow, 'shopId' | 'id' | 'createdAt' | 'createdBy'>;

@Injectable()
export class CalibrationsRepository {
  /** Newest reading first; readings of one day in the order in which they were entered, last first. */
  async list(
    tx: Tx,
    shopId: string,
    machineId: string,
    { before, limit }: { before?: { measuredOn: string; id: string }; limit: number },
  ): Promise<CalibrationView[]> {
    const isBefore =
      before === undefined
        ? undefined
        : sql`(${powerCalibration.measuredOn}, ${powerCalibration.id}) < (${before.measuredOn}::date, ${before.id}::uuid)`;
    return tx
      .select({ calibration: powerCalibration, createdByName: member.printedName })
      .from(powerCalibration)
      .innerJoin(member, and(eq(member.shopId, powerCalibration.shopId), eq(member.id, powerCalibration.createdBy)))
      .where(and(eq(powerCalibration.shopId, shopId), eq(powerCalibration.machineId, machineId), isBefore))
      .orderBy(desc(powerCalibration.measuredOn), desc(powerCalibration.id))
      .limit(limit);
  }

  /** Every reading of these machines, newest first. */
  async ofMachines(tx: Tx, shopId: string, machineIds: readonly string[]): Promise<CalibrationRow[]> {
    if (machineIds.length === 0) return [];
    return tx
      .select()
      .from(powerCalibration)
      .where(and(eq(powerCalibration.shopId, shopId), inArray(powerCalibration.machineId, [...machineIds])))
      .orderBy(desc(powerCalibration.measuredOn), desc(powerCalibration.id));
  }

  async find(tx: Tx, shopId: string, id: string): Promise<CalibrationView | undefined> {
    const [view] = await tx
      .select({ calibration: powerCalibration, createdByName: member.printedName })
      .from(powerCalibration)
      .innerJoin(member, and(eq(member.shopId, powerCalibration.shopId), eq(member.id, powerCalibration.createdBy)))
      .where(and(eq(powerCalibration.shopId, shopId), eq(powerCalibration.id, id)));
    return view;
  }

  async insert(tx: Tx, shopId: string, createdBy: string, values: CalibrationValues): Promise<string> {
    const [row] = await tx
      .insert(powerCalibration)
      .values({ shopId, createdBy, ...values })
      .returning({ id: powerCalibration.id });
    if (row === undefined) throw new Error('the calibration was not stored');
    return row.id;
  }
}
