import { Injectable } from '@nestjs/common';
import { RUN_KINDS } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { ForbiddenError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { CautionsService } from '../materials/cautions.service';
import type { CitedRevision } from './cited-revisions.repository';
import { CitedRevisionsService } from './cited-revisions.service';
import { DeviationsService } from './deviations.service';
import type { RunDto } from './dto/run.dto';
import type { StartRunDto } from './dto/start-run.dto';
import type { StartSheetDto } from './dto/start-sheet.dto';
import { whyNotUsable } from './revision-use';
import { RunActs } from './run-acts.service';
import { RunSurroundingsService, workOf } from './run-surroundings.service';
import { tickProblems } from './run-ticks';
import { ClientIdTakenError, NotReadyToStartError, OnHoldError, ReviewOverdueError, RevisionNotUsableError } from './runs.errors';
import { mayStart } from './runs.policy';
import { RunsRepository } from './runs.repository';

/** Starts runs: the last look before a laser is let at a customer's part. */
@Injectable()
export class RunsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly runs: RunsRepository,
    private readonly cited: CitedRevisionsService,
    private readonly deviations: DeviationsService,
    private readonly cautions: CautionsService,
    private readonly surroundings: RunSurroundingsService,
    private readonly acts: RunActs,
  ) {}

  /** What has to be known and done before a run of the revision starts. Trainees see approved ones only. */
  async startSheet(actor: Actor, revisionId: string): Promise<StartSheetDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const revision = await this.cited.get(tx, actor, revisionId);
      const holds = await this.runs.openHolds(tx, actor.shopId, { recipeId: revision.recipe.id, machineId: revision.machine.id });
      // trainees read approved settings; of another one they see how it stands, not what is in it
      const isHidden = actor.role === 'trainee' && whyNotUsable('production', revision.state) !== undefined;
      const { id, number, state, content, recipe, machine, lens, material, finish, effect, panel } = revision;
      return {
        recipe,
        revision: { id, number, state },
        machine: { id: machine.id, name: machine.name },
        ...{ material, finish, effect, lens, panel },
        lenses: await this.cited.lenses(tx, actor.shopId),
        steps: isHidden ? [] : content.steps,
        setUpSteps: isHidden ? [] : content.setUpSteps,
        cautions: await this.surroundings.cautionsOf(tx, actor.shopId, { ...revision, sourceKind: machine.sourceKind }),
        holds,
        deviations: await this.deviations.liveOf(tx, actor.shopId, id),
        kinds: RUN_KINDS.filter((kind) => mayStart(actor, kind) && whyNotUsable(kind, state) === undefined),
      };
    });
  }

  /** Starts a run, or refuses it with every reason at its place. The same client id again answers the run that it made. */
  async start(actor: Actor, dto: StartRunDto): Promise<RunDto> {
    if (!mayStart(actor, dto.kind)) throw new ForbiddenError('Confirmation runs are for operators and leads.');
    return this.unitOfWork.run(actor, async (tx) => {
      const earlier = await this.runs.findByClientId(tx, actor.shopId, dto.clientId);
      if (earlier !== undefined) return this.sameRun(tx, actor, dto, earlier.run.id);
      const revision = await this.cited.lock(tx, actor, dto);
      await this.refuseUnfit(tx, actor, dto, revision);
      const id = await this.acts.insertStarted(tx, actor, dto, revision);
      return id === undefined ? this.sameRun(tx, actor, dto) : this.acts.toDto(tx, actor, id);
    });
  }

  private async refuseUnfit(tx: Tx, actor: Actor, dto: StartRunDto, revision: CitedRevision): Promise<void> {
    const { recipe, machine, lens, content } = revision;
    const holds = await this.runs.openHolds(tx, actor.shopId, { recipeId: recipe.id, machineId: machine.id });
    if (holds.length > 0) throw new OnHoldError(holds);
    await this.cautions.assertMayBeMarked(tx, actor.shopId, workOf({ ...revision, sourceKind: machine.sourceKind }));
    const unusable = whyNotUsable(dto.kind, revision.state);
    if (unusable !== undefined) throw new RevisionNotUsableError(unusable);
    if (dto.kind === 'production' && revision.isOverdue && revision.overdueBlocks) throw new ReviewOverdueError();
    const lensProblem =
      dto.lensFittedId === lens.id
        ? []
        : [{ pointer: '#/lensFittedId', detail: `Fit ${lens.name}: the setting was proved with it, and another lens makes another mark.` }];
    const problems = [...lensProblem, ...tickProblems(content, dto.ticks, { isStart: true })];
    if (problems.length > 0) throw new NotReadyToStartError(problems);
    if (dto.deviationId !== undefined) await this.deviations.assertLive(tx, actor.shopId, { id: dto.deviationId, revisionId: revision.id });
  }

  private async sameRun(tx: Tx, actor: Actor, dto: StartRunDto, id?: string): Promise<RunDto> {
    const view =
      id === undefined ? await this.runs.findByClientId(tx, actor.shopId, dto.clientId) : await this.runs.findView(tx, actor.shopId, id);
    const isSame =
      view !== undefined && view.startedBy.id === actor.memberId && view.run.revisionId === dto.revisionId && view.run.kind === dto.kind;
    if (!isSame) throw new ClientIdTakenError();
    return this.acts.toDto(tx, actor, view.run.id);
  }
}
