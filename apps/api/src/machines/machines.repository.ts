import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Panel, PhysicalProfile, SourceKind } from '@proofplate/recipe-model';
import { and, asc, desc, eq, isNotNull, isNull, ne, type SQL, sql } from 'drizzle-orm';

const { machine, machineProfile, lens, member, powerCalibration } = schema;

export type MachineRow = typeof machine.$inferSelect;
export type MachineProfileRow = {
  id: string;
  machineId: string;
  number: number;
  physicalNumber: number;
  sourceKind: SourceKind;
  physical: PhysicalProfile;
  panel: Panel;
  createdAt: Date;
  createdByName: string;
};
export type MachineView = {
  machine: MachineRow;
  profile: MachineProfileRow;
  mountedLens: { id: string; name: string } | null;
  latestCalibrationOn: string | null;
};
export type MachineValues = Pick<MachineRow, 'name' | 'serialNumber' | 'warmUpMinutes' | 'mountedLensId' | 'sourceKind' | 'profileNumber'>;

const profileColumns = {
  id: machineProfile.id,
  machineId: machineProfile.machineId,
  number: machineProfile.number,
  physicalNumber: machineProfile.physicalNumber,
  sourceKind: machineProfile.sourceKind,
  physical: machineProfile.physical,
  panel: machineProfile.panel,
  createdAt: machineProfile.createdAt,
  createdByName: member.printedName,
};
const latestCalibrationOn = sql<string | null>`(select max(${powerCalibration.measuredOn})::text from ${powerCalibration}
  where ${powerCalibration.shopId} = ${machine.shopId} and ${powerCalibration.machineId} = ${machine.id})`;

@Injectable()
export class MachinesRepository {
  async list(
    tx: Tx,
    shopId: string,
    { archived, after, limit }: { archived: boolean; after?: { name: string; id: string }; limit: number },
  ): Promise<MachineView[]> {
    const isWanted = and(
      archived ? isNotNull(machine.archivedAt) : isNull(machine.archivedAt),
      after === undefined ? undefined : sql`(${machine.name}, ${machine.id}) > (${after.name}, ${after.id}::uuid)`,
    );
    return this.views(tx, shopId, isWanted, limit);
  }

  async findView(tx: Tx, shopId: string, id: string): Promise<MachineView | undefined> {
    const [view] = await this.views(tx, shopId, eq(machine.id, id), 1);
    return view;
  }

  async lockById(tx: Tx, shopId: string, id: string): Promise<MachineRow | undefined> {
    const [row] = await tx
      .select()
      .from(machine)
      .where(and(eq(machine.shopId, shopId), eq(machine.id, id)))
      .for('update');
    return row;
  }

  async isNameTaken(tx: Tx, shopId: string, name: string, exceptId?: string): Promise<boolean> {
    const isOther = exceptId === undefined ? undefined : ne(machine.id, exceptId);
    const [row] = await tx
      .select({ id: machine.id })
      .from(machine)
      .where(and(eq(machine.shopId, shopId), eq(machine.name, name), isOther));
    return row !== undefined;
  }

  async isLensOfShop(tx: Tx, shopId: string, lensId: string): Promise<boolean> {
    const [row] = await tx
      .select({ id: lens.id })
      .from(lens)
      .where(and(eq(lens.shopId, shopId), eq(lens.id, lensId), isNull(lens.archivedAt)));
    return row !== undefined;
  }

  async insert(tx: Tx, shopId: string, createdBy: string, values: MachineValues): Promise<MachineRow> {
    const [row] = await tx
      .insert(machine)
      .values({ shopId, createdBy, ...values })
      .returning();
    if (row === undefined) throw new Error('the machine was not stored');
    return row;
  }

  async update(tx: Tx, shopId: string, id: string, values: Partial<MachineValues> & { archivedAt?: Date | null }): Promise<void> {
    await tx
      .update(machine)
      .set({ ...values, version: sql`${machine.version} + 1` })
      .where(and(eq(machine.shopId, shopId), eq(machine.id, id)));
  }

  async insertProfile(
    tx: Tx,
    shopId: string,
    createdBy: string,
    profile: Pick<MachineProfileRow, 'machineId' | 'number' | 'physicalNumber' | 'sourceKind' | 'physical' | 'panel'>,
  ): Promise<void> {
    await tx
      .insert(machineProfile)
      .values({ shopId, createdBy, ...profile, physical: { ...profile.physical }, panel: { ...profile.panel } });
  }

  /** Newest first. */
  async profiles(tx: Tx, shopId: string, machineId: string): Promise<MachineProfileRow[]> {
    const rows = await tx
      .select(profileColumns)
      .from(machineProfile)
      .innerJoin(member, and(eq(member.shopId, machineProfile.shopId), eq(member.id, machineProfile.createdBy)))
      .where(and(eq(machineProfile.shopId, shopId), eq(machineProfile.machineId, machineId)))
      .orderBy(desc(machineProfile.number));
    return rows.map(toProfileRow);
  }

  async findProfile(tx: Tx, shopId: string, profileId: string): Promise<MachineProfileRow | undefined> {
    const [row] = await tx
      .select(profileColumns)
      .from(machineProfile)
      .innerJoin(member, and(eq(member.shopId, machineProfile.shopId), eq(member.id, machineProfile.createdBy)))
      .where(and(eq(machineProfile.shopId, shopId), eq(machineProfile.id, profileId)));
    return row === undefined ? undefined : toProfileRow(row);
  }

  private async views(tx: Tx, shopId: string, isWanted: SQL | undefined, limit: number): Promise<MachineView[]> {
    const rows = await tx
      .select({ machine, profile: profileColumns, lens: { id: lens.id, name: lens.name }, latestCalibrationOn })
      .from(machine)
      .innerJoin(
        machineProfile,
        and(
          eq(machineProfile.shopId, machine.shopId),
          eq(machineProfile.machineId, machine.id),
          eq(machineProfile.number, machine.profileNumber),
        ),
      )
      .innerJoin(member, and(eq(member.shopId, machineProfile.shopId), eq(member.id, machineProfile.createdBy)))
      .leftJoin(lens, and(eq(lens.shopId, machine.shopId), eq(lens.id, machine.mountedLensId)))
      .where(and(eq(machine.shopId, shopId), isWanted))
      .orderBy(asc(machine.name), asc(machine.id))
      .limit(limit);
    return rows.map((row) => ({ ...row, profile: toProfileRow(row.profile), mountedLens: row.lens }));
  }
}

type StoredProfile = Omit<MachineProfileRow, 'sourceKind' | 'physical' | 'panel'> & { sourceKind: string; physical: object; panel: object };

/** A constraint and this module's request classes are the only ways into these columns, so they hold the model's shapes. */
function toProfileRow({ sourceKind, physical, panel, ...row }: StoredProfile): MachineProfileRow {
  return { ...row, sourceKind: sourceKind as SourceKind, physical: physical as PhysicalProfile, panel: panel as Panel };
}
