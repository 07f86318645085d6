import { Injectable } from '@nestjs/common';
import type { RevisionContent, SourceKind } from '@proofplate/recipe-model';
import type { Tx } from '../database/unit-of-work';
import { isGeneralCaution } from '../materials/caution-order';
import { CautionsService, type WorkInHand } from '../materials/cautions.service';
import type { RunCautionDto, RunStopDto } from './dto/run-surroundings.dto';
import { stopsRun } from './revision-use';
import { RunStopsRepository } from './run-stops.repository';
import type { OpenHold } from './runs.errors';
import { RunsRepository, type RunView } from './runs.repository';

type Named = { readonly id: string };
export type CitedWork = {
  readonly material: Named;
  readonly finish: Named;
  readonly effect: Named;
  readonly sourceKind: SourceKind;
  readonly content: Pick<RevisionContent, 'scope' | 'limits'>;
};
export type RunSurroundings = {
  readonly holds: readonly OpenHold[];
  readonly stop: RunStopDto | null;
  readonly cautions: readonly RunCautionDto[];
};

/** What is not in a run itself but has to be read beside it: holds, the end of its revision, the cautions of its work. */
@Injectable()
export class RunSurroundingsService {
  constructor(
    private readonly runs: RunsRepository,
    private readonly stops: RunStopsRepository,
    private readonly cautions: CautionsService,
  ) {}

  async around(tx: Tx, shopId: string, view: RunView): Promise<RunSurroundings> {
    const holds = await this.runs.openHolds(tx, shopId, { recipeId: view.recipe.id, machineId: view.machine.id });
    const work = { ...view, sourceKind: view.physical.sourceKind, content: view.revision.content };
    return { holds, stop: await this.stopOf(tx, shopId, view), cautions: await this.cautionsOf(tx, shopId, work) };
  }

  private async stopOf(tx: Tx, shopId: string, { run, recipe, revision }: RunView): Promise<RunStopDto | null> {
    if (run.state !== 'started' || !stopsRun(revision.state)) return null;
    const approvedNumber = await this.stops.approvedNumber(tx, shopId, recipe.id);
    if (revision.state === 'superseded') return { because: 'superseded', by: null, at: null, reason: '', approvedNumber };
    const withdrawal = await this.stops.withdrawal(tx, shopId, revision.id);
    return {
      because: 'withdrawn',
      by: withdrawal?.by ?? null,
      at: withdrawal?.at.toISOString() ?? null,
      reason: withdrawal?.reason ?? '',
      approvedNumber,
    };
  }

  /** The cautions of a piece of work as they stand before its setting. */
  async cautionsOf(tx: Tx, shopId: string, cited: CitedWork): Promise<RunCautionDto[]> {
    const rows = await this.cautions.cautionsFor(tx, shopId, workOf(cited));
    return rows.map((row) => ({
      id: row.id,
      level: row.level,
      subject: row.subject,
      text: row.text,
      source: row.source,
      isGeneral: isGeneralCaution(row),
    }));
  }
}

/** The work as cautions ask for it: with every material that the revision covers. */
export function workOf({ material, finish, effect, sourceKind, content: { scope, limits } }: CitedWork): WorkInHand {
  return {
    materialId: material.id,
    finishId: finish.id,
    effectId: effect.id,
    sourceKind,
    roundPart: scope.partDiameterMm !== undefined || limits.partDiameterMm !== undefined,
    materialGroupId: scope.materialGroupId,
  };
}
