import { Injectable } from '@nestjs/common';
import { type EnteredPart, type PartResults, partGround, partResults, partSetUp } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { InvalidError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CitedRevisionsService } from './cited-revisions.service';
import type { PartGroundDto, PartSetUpDto, RunPartSetUpDto } from './dto/part-set-up.dto';
import type { SavePartSetUpDto } from './dto/save-part-set-up.dto';
import { enteredOf, toPartSetUpDto } from './part-set-ups.mapper';
import { PartSetUpsRepository } from './part-set-ups.repository';
import { RunActs } from './run-acts.service';
import { RunNotFoundError } from './runs.errors';

/** Round parts on a rotary axis: worked out again on the server and kept with their run. */
@Injectable()
export class PartSetUpsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly setUps: PartSetUpsRepository,
    private readonly cited: CitedRevisionsService,
    private readonly ledger: LedgerService,
    private readonly acts: RunActs,
  ) {}

  /** What a part for a revision is worked out with, before its run exists. Trainees see approved ones only. */
  async groundOfRevision(actor: Actor, revisionId: string): Promise<PartGroundDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { id } = await this.cited.get(tx, actor, revisionId);
      return found(await this.setUps.groundOfRevision(tx, actor.shopId, id));
    });
  }

  /** @throws RunNotFoundError also for another shop's run, and for a trainee somebody else's */
  async get(actor: Actor, runId: string): Promise<RunPartSetUpDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      await this.acts.assertReadable(tx, actor, runId);
      const ground = found(await this.setUps.groundOfRun(tx, actor.shopId, runId));
      const last = await this.setUps.findLast(tx, actor.shopId, runId);
      return { setUp: last === undefined ? null : toPartSetUpDto(last), ground };
    });
  }

  /** Keeps a part with its run. Numbers of the device are not asked for: the same function works them out here. */
  async save(actor: Actor, runId: string, dto: SavePartSetUpDto): Promise<PartSetUpDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const run = await this.acts.lockStarted(tx, actor, runId);
      const ground = found(await this.setUps.groundOfRun(tx, actor.shopId, runId));
      const entered = enteredOf(dto);
      const results = workedOut(entered, ground);
      const before = await this.setUps.findLast(tx, actor.shopId, runId);
      const saved = await this.setUps.insertNext(tx, actor.shopId, actor.memberId, {
        ...{ runId, entered, ground, results, savedByName: actor.printedName },
      });
      await this.record(tx, actor, { run, entered, results, before: before?.entered });
      return toPartSetUpDto(saved);
    });
  }

  private async record(
    tx: Tx,
    actor: Actor,
    {
      run,
      entered,
      results,
      before,
    }: { run: { id: string; code: string }; entered: EnteredPart; results: PartResults; before: EnteredPart | undefined },
  ): Promise<void> {
    const known = results.numbers.flatMap(({ key, value }) => (value === null ? [] : [[key, value] as const]));
    await this.ledger.record(tx, {
      ...{ actor, action: 'run.part-set-up-saved', subjectType: 'run', subjectId: run.id, subjectCode: run.code },
      ...(before === undefined ? {} : { before: { entered: before } }),
      after: { entered, isMirrored: results.isMirrored, numbers: Object.fromEntries(known) },
    });
  }
}

/** @throws InvalidError with each reason at its field */
function workedOut(entered: EnteredPart, ground: PartGroundDto): PartResults {
  const setUp = partSetUp(entered, partGround(ground));
  if (setUp.kind === 'worked out') return partResults(setUp);
  const errors = setUp.problems.map(({ field, detail }) => ({ pointer: `#/${field}`, detail }));
  throw new InvalidError(errors.length === 1 ? 'One field needs another look.' : `${errors.length} fields need another look.`, errors);
}

function found(ground: PartGroundDto | undefined): PartGroundDto {
  if (ground === undefined) throw new RunNotFoundError();
  return ground;
}
