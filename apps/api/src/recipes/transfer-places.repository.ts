import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { Panel, PhysicalProfile } from '@proofplate/recipe-model';
import { and, asc, eq, isNull } from 'drizzle-orm';
import type { KeyIds } from './stored-revision';

const { machine, machineProfile, machineLens, lens, recipe } = schema;

/** A machine in use with one of its lenses, as it is now. */
export type PlaceRow = {
  readonly machineId: string;
  readonly machineName: string;
  readonly lensId: string;
  readonly lensName: string;
  readonly focalLengthMm: number;
  readonly measuredSpotUm: number | null;
  readonly physical: PhysicalProfile;
  readonly panel: Panel;
};
export type RecipeThere = {
  readonly id: string;
  readonly code: string;
  readonly title: string;
  readonly machineId: string;
  readonly lensId: string;
};

@Injectable()
export class TransferPlacesRepository {
  /** Every machine and lens of the shop that is in use, by name. */
  async places(tx: Tx, shopId: string): Promise<PlaceRow[]> {
    const rows = await tx
      .select({
        machineId: machine.id,
        machineName: machine.name,
        lensId: lens.id,
        lensName: lens.name,
        focalLengthMm: lens.focalLengthMm,
        measuredSpotUm: machineLens.measuredSpotUm,
        physical: machineProfile.physical,
        panel: machineProfile.panel,
      })
      .from(machineLens)
      .innerJoin(lens, and(eq(lens.shopId, machineLens.shopId), eq(lens.id, machineLens.lensId), isNull(lens.archivedAt)))
      .innerJoin(machine, and(eq(machine.shopId, machineLens.shopId), eq(machine.id, machineLens.machineId), isNull(machine.archivedAt)))
      .innerJoin(
        machineProfile,
        and(
          eq(machineProfile.shopId, machine.shopId),
          eq(machineProfile.machineId, machine.id),
          eq(machineProfile.number, machine.profileNumber),
        ),
      )
      .where(eq(machineLens.shopId, shopId))
      .orderBy(asc(machine.name), asc(lens.name), asc(machineLens.id));
    // the machines module is the only way into these columns, so they hold the model's shapes
    return rows.map((row) => ({
      ...row,
      physical: row.physical as unknown as PhysicalProfile,
      panel: row.panel as unknown as Panel,
    }));
  }

  /** Recipes of the same material, finish and effect, wherever they run. */
  async recipesOf(tx: Tx, shopId: string, keys: Pick<KeyIds, 'materialId' | 'finishId' | 'effectId'>): Promise<RecipeThere[]> {
    const { id, code, title, machineId, lensId } = recipe;
    return tx
      .select({ id, code, title, machineId, lensId })
      .from(recipe)
      .where(
        and(
          eq(recipe.shopId, shopId),
          eq(recipe.materialId, keys.materialId),
          eq(recipe.finishId, keys.finishId),
          eq(recipe.effectId, keys.effectId),
        ),
      )
      .orderBy(asc(recipe.code));
  }
}
