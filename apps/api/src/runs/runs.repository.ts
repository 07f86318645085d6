import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { MarkStep, Panel, PhysicalProfile, RevisionContent, RevisionState, RunKind } from '@proofplate/recipe-model';
import { and, desc, eq, isNull, or, type SQL, sql } from 'drizzle-orm';
import { alias } from 'drizzle-orm/pg-core';
import { containsText } from '../database/contains-text';
import type { RunState } from './dto/run.dto';
import type { OpenHold } from './runs.errors';

const { run, recipe, revisionNow, machine, machineProfile, material, finish, effect, lens, machineLens, member, deviation, hold, photo } =
  schema;
const fitted = alias(lens, 'fitted');

type Named = { id: string; name: string };
export type RunRow = Omit<typeof run.$inferSelect, 'kind' | 'state' | 'steps'> & {
  kind: RunKind;
  state: RunState;
  steps: MarkStep[] | null;
};
export type RunView = {
  run: RunRow;
  recipe: { id: string; code: string; title: string };
  revision: { id: string; number: number | null; state: RevisionState; content: RevisionContent };
  machine: Named;
  material: Named;
  finish: Named;
  effect: Named;
  lensFitted: Named | null;
  startedBy: Named;
  deviation: { id: string; description: string; grantedBy: string; endsAt: Date | null; maximumQuantity: number | null } | null;
  panel: Panel;
  physical: PhysicalProfile;
  optics: { focalLengthMm: number; measuredSpotUm: number | null };
};
export type RunFilter = {
  startedBy?: string;
  jobReference?: string;
  recipeId?: string;
  machineId?: string;
  kind?: RunKind;
  state?: RunState;
  words: readonly string[];
};
export type NewRun = Omit<typeof run.$inferInsert, 'shopId' | 'createdBy' | 'id'>;
export type RunChange = Partial<
  Pick<typeof run.$inferInsert, 'ticks' | 'firstPiece' | 'badResult' | 'state' | 'goodCount' | 'scrapCount' | 'measurements' | 'notes'>
>;

const CODE = /^J-\d+$/u;
/** A cursor carries milliseconds, so the order must not be finer than that. */
const startedToTheMs = sql`date_trunc('milliseconds', ${run.startedAt})`;

@Injectable()
export class RunsRepository {
  /** By id, or by the code that people read. */
  async findView(tx: Tx, shopId: string, key: string): Promise<RunView | undefined> {
    const [view] = await this.views(tx, and(eq(run.shopId, shopId), CODE.test(key) ? eq(run.code, key) : eq(run.id, key)), 1);
    return view;
  }

  async findByClientId(tx: Tx, shopId: string, clientId: string): Promise<RunView | undefined> {
    const [view] = await this.views(tx, and(eq(run.shopId, shopId), eq(run.clientId, clientId)), 1);
    return view;
  }

  /** Newest first. */
  async list(
    tx: Tx,
    shopId: string,
    { filter, after, limit }: { filter: RunFilter; after?: { startedAt: string; id: string }; limit: number },
  ): Promise<RunView[]> {
    const isAfter =
      after === undefined ? undefined : sql`(${startedToTheMs}, ${run.id}) < (${after.startedAt}::timestamptz, ${after.id}::uuid)`;
    return this.views(tx, and(isWanted(shopId, filter), isAfter), limit);
  }

  async lock(tx: Tx, shopId: string, id: string): Promise<RunRow | undefined> {
    const [row] = await tx
      .select()
      .from(run)
      .where(and(eq(run.shopId, shopId), eq(run.id, id)))
      .for('update');
    return row === undefined ? undefined : toRunRow(row);
  }

  /** Undefined when the device sent this run before. */
  async insert(tx: Tx, shopId: string, createdBy: string, values: NewRun): Promise<string | undefined> {
    const [row] = await tx
      .insert(run)
      .values({ shopId, createdBy, ...values })
      .onConflictDoNothing({ target: [run.shopId, run.clientId] })
      .returning({ id: run.id });
    return row?.id;
  }

  async update(tx: Tx, shopId: string, id: string, change: RunChange): Promise<void> {
    await tx
      .update(run)
      .set({ ...change, ...(change.state === 'finished' ? { finishedAt: sql`now()` } : {}), version: sql`${run.version} + 1` })
      .where(and(eq(run.shopId, shopId), eq(run.id, id)));
  }

  /** Open holds on a recipe or its machine, oldest first. */
  async openHolds(tx: Tx, shopId: string, on: { recipeId: string; machineId: string }): Promise<OpenHold[]> {
    const rows = await tx
      .select({ id: hold.id, recipeId: hold.recipeId, reason: hold.reason, placedBy: hold.placedByName })
      .from(hold)
      .where(and(eq(hold.shopId, shopId), isNull(hold.releasedAt), or(eq(hold.recipeId, on.recipeId), eq(hold.machineId, on.machineId))))
      .orderBy(hold.createdAt);
    return rows.map(({ id, recipeId, reason, placedBy }) => ({ id, subject: recipeId === null ? 'machine' : 'recipe', reason, placedBy }));
  }

  async isPhotoOfShop(tx: Tx, shopId: string, photoId: string): Promise<boolean> {
    const rows = await tx
      .select({ id: photo.id })
      .from(photo)
      .where(and(eq(photo.shopId, shopId), eq(photo.id, photoId)));
    return rows.length > 0;
  }

  private async views(tx: Tx, isWanted: SQL | undefined, limit: number): Promise<RunView[]> {
    const shop = run.shopId;
    const rows = await tx
      .select({
        run,
        recipe: { id: recipe.id, code: recipe.code, title: recipe.title },
        revision: { id: revisionNow.id, number: revisionNow.number, state: revisionNow.state, content: revisionNow.content },
        machine: { id: machine.id, name: machine.name },
        material: { id: material.id, name: material.name },
        finish: { id: finish.id, name: finish.name },
        effect: { id: effect.id, name: effect.name },
        lensFitted: { id: fitted.id, name: fitted.name },
        startedBy: { id: member.id, name: member.printedName },
        deviation: {
          id: deviation.id,
          description: deviation.description,
          grantedBy: deviation.grantedByName,
          endsAt: deviation.endsAt,
          maximumQuantity: deviation.maximumQuantity,
        },
        panel: machineProfile.panel,
        physical: machineProfile.physical,
        optics: { focalLengthMm: lens.focalLengthMm, measuredSpotUm: machineLens.measuredSpotUm },
      })
      .from(run)
      .innerJoin(recipe, and(eq(recipe.shopId, shop), eq(recipe.id, run.recipeId)))
      .innerJoin(revisionNow, and(eq(revisionNow.shopId, shop), eq(revisionNow.id, run.revisionId)))
      .innerJoin(machineProfile, and(eq(machineProfile.shopId, shop), eq(machineProfile.id, revisionNow.profileId)))
      .innerJoin(machine, and(eq(machine.shopId, shop), eq(machine.id, run.machineId)))
      .innerJoin(material, and(eq(material.shopId, shop), eq(material.id, recipe.materialId)))
      .innerJoin(finish, and(eq(finish.shopId, shop), eq(finish.id, recipe.finishId)))
      .innerJoin(effect, and(eq(effect.shopId, shop), eq(effect.id, recipe.effectId)))
      .innerJoin(member, and(eq(member.shopId, shop), eq(member.id, run.createdBy)))
      .innerJoin(lens, and(eq(lens.shopId, shop), eq(lens.id, recipe.lensId)))
      .leftJoin(
        machineLens,
        and(eq(machineLens.shopId, shop), eq(machineLens.machineId, run.machineId), eq(machineLens.lensId, recipe.lensId)),
      )
      .leftJoin(fitted, and(eq(fitted.shopId, shop), eq(fitted.id, run.lensFittedId)))
      .leftJoin(deviation, and(eq(deviation.shopId, shop), eq(deviation.id, run.deviationId)))
      .where(isWanted)
      .orderBy(desc(startedToTheMs), desc(run.id))
      .limit(limit);
    return rows.map((row) => ({
      ...row,
      run: toRunRow(row.run),
      // constraints and the request classes of recipes and machines are the only ways into these columns
      revision: {
        ...row.revision,
        state: row.revision.state as RevisionState,
        content: row.revision.content as unknown as RevisionContent,
      },
      panel: row.panel as unknown as Panel,
      physical: row.physical as unknown as PhysicalProfile,
    }));
  }
}

/** Constraints hold kind and state to the lists; steps come out of a revision's content. */
function toRunRow(row: typeof run.$inferSelect): RunRow {
  return { ...row, kind: row.kind as RunKind, state: row.state as RunState, steps: row.steps as MarkStep[] | null };
}

function isWanted(shopId: string, { startedBy, jobReference, recipeId, machineId, kind, state, words }: RunFilter): SQL | undefined {
  return and(
    eq(run.shopId, shopId),
    startedBy === undefined ? undefined : eq(run.createdBy, startedBy),
    jobReference === undefined ? undefined : eq(run.jobReference, jobReference),
    recipeId === undefined ? undefined : eq(run.recipeId, recipeId),
    machineId === undefined ? undefined : eq(run.machineId, machineId),
    kind === undefined ? undefined : eq(run.kind, kind),
    state === undefined ? undefined : eq(run.state, state),
    ...words.map(
      (word) =>
        sql`concat_ws(' ', ${run.code}, ${run.jobReference}, ${run.part}, ${run.lot}, ${recipe.code}, ${recipe.title}, ${material.name}) ilike ${containsText(word)}`,
    ),
  );
}
