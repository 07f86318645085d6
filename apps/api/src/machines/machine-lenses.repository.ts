import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import { and, asc, eq, isNull, sql } from 'drizzle-orm';

const { machineLens, lens, machine } = schema;

export type MachineLensRow = typeof machineLens.$inferSelect;
export type MachineLensValues = Pick<
  MachineLensRow,
  'workingDistanceMm' | 'focusMethod' | 'measuredSpotUm' | 'spotMethod' | 'spotMeasuredOn'
>;
/** A lens on a machine of which nobody has said more yet. */
export const NOTHING_KNOWN: MachineLensValues = {
  workingDistanceMm: null,
  focusMethod: '',
  measuredSpotUm: null,
  spotMethod: null,
  spotMeasuredOn: null,
};

export type MachineLensView = {
  pair: MachineLensRow;
  lens: { id: string; name: string; focalLengthMm: number; fieldSizeMm: number };
  isMounted: boolean;
};

@Injectable()
export class MachineLensesRepository {
  async list(tx: Tx, shopId: string, machineId: string): Promise<MachineLensView[]> {
    return this.views(tx, shopId, machineId);
  }

  async find(tx: Tx, shopId: string, machineId: string, lensId: string): Promise<MachineLensView | undefined> {
    const [view] = await this.views(tx, shopId, machineId, lensId);
    return view;
  }

  async lock(tx: Tx, shopId: string, machineId: string, lensId: string): Promise<MachineLensRow | undefined> {
    const [row] = await tx
      .select()
      .from(machineLens)
      .where(and(eq(machineLens.shopId, shopId), eq(machineLens.machineId, machineId), eq(machineLens.lensId, lensId)))
      .for('update');
    return row;
  }

  async isLensInUse(tx: Tx, shopId: string, lensId: string): Promise<boolean> {
    const [row] = await tx
      .select({ id: lens.id })
      .from(lens)
      .where(and(eq(lens.shopId, shopId), eq(lens.id, lensId), isNull(lens.archivedAt)));
    return row !== undefined;
  }

  async insert(
    tx: Tx,
    shopId: string,
    createdBy: string,
    pair: MachineLensValues & { machineId: string; lensId: string },
  ): Promise<string> {
    const [row] = await tx
      .insert(machineLens)
      .values({ shopId, createdBy, ...pair })
      .returning({ id: machineLens.id });
    if (row === undefined) throw new Error('the lens was not put on the machine');
    return row.id;
  }

  async update(tx: Tx, shopId: string, id: string, values: MachineLensValues): Promise<void> {
    await tx
      .update(machineLens)
      .set({ ...values, version: sql`${machineLens.version} + 1` })
      .where(and(eq(machineLens.shopId, shopId), eq(machineLens.id, id)));
  }

  private async views(tx: Tx, shopId: string, machineId: string, lensId?: string): Promise<MachineLensView[]> {
    return tx
      .select({
        pair: machineLens,
        lens: { id: lens.id, name: lens.name, focalLengthMm: lens.focalLengthMm, fieldSizeMm: lens.fieldSizeMm },
        isMounted: sql<boolean>`coalesce(${machine.mountedLensId} = ${machineLens.lensId}, false)`,
      })
      .from(machineLens)
      .innerJoin(lens, and(eq(lens.shopId, machineLens.shopId), eq(lens.id, machineLens.lensId)))
      .innerJoin(machine, and(eq(machine.shopId, machineLens.shopId), eq(machine.id, machineLens.machineId)))
      .where(
        and(
          eq(machineLens.shopId, shopId),
          eq(machineLens.machineId, machineId),
          lensId === undefined ? undefined : eq(machineLens.lensId, lensId),
        ),
      )
      .orderBy(asc(lens.name), asc(lens.id));
  }
}
