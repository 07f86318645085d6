import { Injectable } from '@nestjs/common';
import { pausesOf } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import type { LoggedTimeDto } from '../machines/dto/marking-time.dto';
import { MarkingTimesService } from '../machines/marking-times.service';
import { CitedRevisionsService } from './cited-revisions.service';
import type { AreaDto, LogRunTimeDto, RunTimesDto, SettingTimingDto } from './dto/run-times.dto';
import { PartSetUpsRepository } from './part-set-ups.repository';
import { RunActs } from './run-acts.service';
import { RunTimesRepository, type TimedRun } from './run-times.repository';
import { RunNotFoundError } from './runs.errors';
import { areasOfSteps, toSettingTimingDto } from './setting-timing';

/** How long a part takes, and how long it took. */
@Injectable()
export class RunTimesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly runs: RunTimesRepository,
    private readonly setUps: PartSetUpsRepository,
    private readonly times: MarkingTimesService,
    private readonly cited: CitedRevisionsService,
    private readonly acts: RunActs,
  ) {}

  /** What the time of a part is worked out with before a run exists. Trainees see approved settings only. */
  async timingOfRevision(actor: Actor, revisionId: string): Promise<SettingTimingDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { content, machine } = await this.cited.get(tx, actor, revisionId);
      return toSettingTimingDto(content.steps, await this.times.ground(tx, actor.shopId, machine.id));
    });
  }

  /** @throws RunNotFoundError also for another shop's run, and for a trainee somebody else's */
  async list(actor: Actor, runId: string): Promise<RunTimesDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { machineId, steps } = await this.getReadable(tx, actor, runId);
      return {
        timing: toSettingTimingDto(steps, await this.times.ground(tx, actor.shopId, machineId)),
        partArea: await this.partArea(tx, actor, runId),
        items: await this.times.list(tx, actor.shopId, machineId, { runId }),
      };
    });
  }

  /** A piece was clocked. Also after the run has ended: the time says something of the machine, not of the run. */
  async log(actor: Actor, runId: string, { seconds, widthMm, heightMm }: LogRunTimeDto): Promise<LoggedTimeDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { id, code, machineId, steps } = await this.getReadable(tx, actor, runId);
      return this.times.add(tx, actor, {
        ...{ machineId, seconds, runId, pausesS: pausesOf(steps) },
        marked: areasOfSteps(steps, { widthMm, heightMm }),
        subject: { type: 'run', id, code },
      });
    });
  }

  private async getReadable(tx: Tx, actor: Actor, runId: string): Promise<TimedRun> {
    await this.acts.assertReadable(tx, actor, runId);
    const run = await this.runs.find(tx, actor.shopId, runId);
    if (run === undefined) throw new RunNotFoundError();
    return run;
  }

  private async partArea(tx: Tx, actor: Actor, runId: string): Promise<AreaDto | null> {
    const numbers = (await this.setUps.findLast(tx, actor.shopId, runId))?.results.numbers ?? [];
    const valueAt = (key: string) => numbers.find((number) => number.key === key)?.value ?? null;
    const [widthMm, heightMm] = [valueAt('artworkWidth'), valueAt('artworkHeight')];
    return widthMm === null || heightMm === null ? null : { widthMm, heightMm };
  }
}
