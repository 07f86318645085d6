import { Injectable } from '@nestjs/common';
import { schema, type Tx } from '@proofplate/db';
import type { MarkStep, RevisionContent } from '@proofplate/recipe-model';
import { and, eq } from 'drizzle-orm';

const { revision, run } = schema;

export type TimedRun = { id: string; code: string; machineId: string; steps: readonly MarkStep[] };

@Injectable()
export class RunTimesRepository {
  /** The run with the mark steps that were dialled in. */
  async find(tx: Tx, shopId: string, runId: string): Promise<TimedRun | undefined> {
    const [row] = await tx
      .select({ id: run.id, code: run.code, machineId: run.machineId, steps: run.steps, content: revision.content })
      .from(run)
      .innerJoin(revision, and(eq(revision.shopId, run.shopId), eq(revision.id, run.revisionId)))
      .where(and(eq(run.shopId, shopId), eq(run.id, runId)));
    if (row === undefined) return undefined;
    const { content, steps, ...rest } = row;
    // constraints and the request classes of recipes are the only ways into these columns;
    // a confirmation run keeps the steps of a draft that may since have changed
    return { ...rest, steps: (steps as MarkStep[] | null) ?? (content as unknown as RevisionContent).steps };
  }
}
