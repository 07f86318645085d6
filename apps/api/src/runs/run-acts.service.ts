import { createHash } from 'node:crypto';
import { Injectable } from '@nestjs/common';
import { contentHash } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { Codes } from '../database/codes.repository';
import type { Tx } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CitedRevision } from './cited-revisions.repository';
import type { RunDto } from './dto/run.dto';
import type { StartRunDto } from './dto/start-run.dto';
import { RunSurroundingsService } from './run-surroundings.service';
import { RunFinishedError, RunNotFoundError } from './runs.errors';
import { toRunDto } from './runs.mapper';
import { readsAllRuns } from './runs.policy';
import { type RunRow, RunsRepository } from './runs.repository';

/** Writes the start of a run and reads runs back for their callers. */
@Injectable()
export class RunActs {
  constructor(
    private readonly runs: RunsRepository,
    private readonly surroundings: RunSurroundingsService,
    private readonly codes: Codes,
    private readonly ledger: LedgerService,
  ) {}

  async insertStarted(tx: Tx, actor: Actor, dto: StartRunDto, revision: CitedRevision): Promise<string | undefined> {
    const { kind, clientId, lensFittedId, jobReference, part, lot, deviationId = null } = dto;
    const now = new Date().toISOString();
    const values = {
      kind,
      recipeId: revision.recipe.id,
      revisionId: revision.id,
      machineId: revision.machine.id,
      contentHash: revision.contentHash ?? hashOf(revision),
      steps: kind === 'confirmation' ? revision.content.steps : null,
      ...{ clientId, lensFittedId, jobReference, part, lot, deviationId },
      ticks: Object.fromEntries(dto.ticks.map((key) => [key, now])),
      code: await this.codes.nextCode(tx, actor.shopId, 'run'),
    };
    const id = await this.runs.insert(tx, actor.shopId, actor.memberId, values);
    if (id === undefined) return undefined;
    const { ticks, steps: _steps, ...told } = values;
    await this.ledger.record(tx, {
      actor,
      action: 'run.started',
      subjectType: 'run',
      subjectId: id,
      subjectCode: values.code,
      after: { ...told, ticked: Object.keys(ticks) },
    });
    return id;
  }

  async toDto(tx: Tx, actor: Actor, key: string): Promise<RunDto> {
    const view = await this.runs.findView(tx, actor.shopId, key);
    if (view === undefined) throw new RunNotFoundError();
    return toRunDto(view, await this.surroundings.around(tx, actor.shopId, view), actor);
  }

  /** @throws RunNotFoundError also for another shop's run, and for a trainee somebody else's */
  async assertReadable(tx: Tx, actor: Actor, id: string): Promise<void> {
    const view = await this.runs.findView(tx, actor.shopId, id);
    if (view === undefined || (!readsAllRuns(actor) && view.startedBy.id !== actor.memberId)) throw new RunNotFoundError();
  }

  /** @throws RunFinishedError once the run has ended */
  async lockStarted(tx: Tx, actor: Actor, id: string): Promise<RunRow> {
    const run = await this.lockOwn(tx, actor, id);
    if (run.state !== 'started') throw new RunFinishedError();
    return run;
  }

  /** @throws RunNotFoundError also for another shop's run, and for a trainee somebody else's */
  async lockOwn(tx: Tx, actor: Actor, id: string): Promise<RunRow> {
    const run = await this.runs.lock(tx, actor.shopId, id);
    if (run === undefined || (!readsAllRuns(actor) && run.createdBy !== actor.memberId)) throw new RunNotFoundError();
    return run;
  }
}

/** A draft has no signed hash yet; this one says what was dialled in. */
const hashOf = ({ content }: CitedRevision) => contentHash(content, (text) => createHash('sha256').update(text, 'utf8').digest('hex'));
