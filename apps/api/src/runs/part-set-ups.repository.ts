import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { EnteredPart, MarkStep, PartResults, PhysicalProfile, RevisionContent } from '@proofplate/recipe-model';
import { and, desc, eq, type SQL, sql } from 'drizzle-orm';
import type { PartGroundDto } from './dto/part-set-up.dto';

const { lens, machine, machineLens, machineProfile, partSetUp, recipe, revision, run } = schema;

export type PartSetUpRow = Omit<typeof partSetUp.$inferSelect, 'entered' | 'ground' | 'results'> & {
  entered: EnteredPart;
  ground: PartGroundDto;
  results: PartResults;
};
export type NewPartSetUp = Pick<PartSetUpRow, 'runId' | 'entered' | 'ground' | 'results' | 'savedByName'>;

/** Where a part is worked out: the machine and lens of a revision, or those that a run has fitted. */
type Optics = Omit<PartGroundDto, 'focusOffsetsMm'>;

@Injectable()
export class PartSetUpsRepository {
  /** The last one saved for a run. */
  async findLast(tx: Tx, shopId: string, runId: string): Promise<PartSetUpRow | undefined> {
    const [row] = await tx
      .select()
      .from(partSetUp)
      .where(and(eq(partSetUp.shopId, shopId), eq(partSetUp.runId, runId)))
      .orderBy(desc(partSetUp.number))
      .limit(1);
    return row === undefined ? undefined : toRow(row);
  }

  /** Adds the next number of the run; the caller holds the run’s lock. */
  async insertNext(tx: Tx, shopId: string, createdBy: string, values: NewPartSetUp): Promise<PartSetUpRow> {
    const number = sql`(select coalesce(max(p.number), 0) + 1 from part_set_up p where p.shop_id = ${shopId} and p.run_id = ${values.runId})`;
    const lensId = values.ground.lens.id;
    const stored = { entered: { ...values.entered }, ground: { ...values.ground }, results: { ...values.results } };
    const [row] = await tx
      .insert(partSetUp)
      .values({ shopId, createdBy, ...values, ...stored, lensId, number })
      .returning();
    if (row === undefined) throw new Error('an insert without conflict clause answers its row');
    return toRow(row);
  }

  async groundOfRevision(tx: Tx, shopId: string, revisionId: string): Promise<PartGroundDto | undefined> {
    const [row] = await tx
      .select({ ...OPTICS, content: revision.content })
      .from(revision)
      .innerJoin(recipe, and(eq(recipe.shopId, revision.shopId), eq(recipe.id, revision.recipeId)))
      .innerJoin(machine, and(eq(machine.shopId, revision.shopId), eq(machine.id, recipe.machineId)))
      .innerJoin(machineProfile, PROFILE_IN_FORCE)
      .innerJoin(lens, and(eq(lens.shopId, revision.shopId), eq(lens.id, recipe.lensId)))
      .leftJoin(machineLens, PAIR)
      .where(and(eq(revision.shopId, shopId), eq(revision.id, revisionId)));
    return row === undefined ? undefined : groundOf(row, stepsOf(row.content));
  }

  async groundOfRun(tx: Tx, shopId: string, runId: string): Promise<PartGroundDto | undefined> {
    const [row] = await tx
      .select({ ...OPTICS, content: revision.content, steps: run.steps })
      .from(run)
      .innerJoin(revision, and(eq(revision.shopId, run.shopId), eq(revision.id, run.revisionId)))
      .innerJoin(recipe, and(eq(recipe.shopId, run.shopId), eq(recipe.id, run.recipeId)))
      .innerJoin(machine, and(eq(machine.shopId, run.shopId), eq(machine.id, run.machineId)))
      .innerJoin(machineProfile, PROFILE_IN_FORCE)
      .innerJoin(lens, and(eq(lens.shopId, run.shopId), eq(lens.id, sql`coalesce(${run.lensFittedId}, ${recipe.lensId})`)))
      .leftJoin(machineLens, PAIR)
      .where(and(eq(run.shopId, shopId), eq(run.id, runId)));
    // a confirmation run keeps the steps of a draft that may since have changed
    return row === undefined ? undefined : groundOf(row, asSteps(row.steps) ?? stepsOf(row.content));
  }
}

const OPTICS = {
  machine: { id: machine.id, name: machine.name },
  lens: { id: lens.id, name: lens.name },
  physical: machineProfile.physical,
  focalLengthMm: lens.focalLengthMm,
  fieldSizeMm: lens.fieldSizeMm,
  measuredSpotUm: machineLens.measuredSpotUm,
};
const PROFILE_IN_FORCE: SQL | undefined = and(
  eq(machineProfile.shopId, machine.shopId),
  eq(machineProfile.machineId, machine.id),
  eq(machineProfile.number, machine.profileNumber),
);
const PAIR: SQL | undefined = and(
  eq(machineLens.shopId, machine.shopId),
  eq(machineLens.machineId, machine.id),
  eq(machineLens.lensId, lens.id),
);

type OpticsRow = Pick<Optics, 'machine' | 'lens' | 'focalLengthMm' | 'fieldSizeMm' | 'measuredSpotUm'> & { readonly physical: unknown };

function groundOf(
  { machine: at, lens: through, physical, focalLengthMm, fieldSizeMm, measuredSpotUm }: OpticsRow,
  steps: readonly MarkStep[],
): PartGroundDto {
  // the request class of a machine is the only way into this column
  const { wavelengthNm, m2 = null, beamDiameterMm = null } = physical as PhysicalProfile;
  const focusOffsetsMm = [...new Set(steps.map(({ parameters }) => parameters.values.focusOffsetMm?.physical ?? 0))];
  return { machine: at, lens: through, wavelengthNm, m2, beamDiameterMm, focalLengthMm, fieldSizeMm, measuredSpotUm, focusOffsetsMm };
}

// constraints and the request classes of recipes are the only ways into these columns
const stepsOf = (content: unknown) => (content as RevisionContent).steps;
const asSteps = (steps: unknown) => steps as MarkStep[] | null;

/** Only insertNext writes these columns. */
function toRow(row: typeof partSetUp.$inferSelect): PartSetUpRow {
  return {
    ...row,
    entered: row.entered as unknown as EnteredPart,
    ground: row.ground as unknown as PartGroundDto,
    results: row.results as unknown as PartResults,
  };
}
