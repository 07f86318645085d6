import { Injectable } from '@nestjs/common';
import { type Criterion, meetsCriterion, QUANTITIES } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { InvalidError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { CitedRevisionsRepository } from './cited-revisions.repository';
import { DeviationsService } from './deviations.service';
import type { RunDto } from './dto/run.dto';
import type { FinishRunDto, FirstPieceActDto, MeasurePieceDto, TellBadResultDto } from './dto/run-acts.dto';
import type { TickRunDto } from './dto/start-run.dto';
import { stopsRun, whyNotUsable } from './revision-use';
import { RunActs } from './run-acts.service';
import { RunLettersService } from './run-letters.service';
import { tickProblems } from './run-ticks';
import { FirstPieceNotReleasedError, NotReadyToStartError, OnHoldError, RevisionNotUsableError } from './runs.errors';
import { type RunChange, type RunRow, RunsRepository } from './runs.repository';

/** What happens between the start of a run and its end, and the bad result that may come out later. */
@Injectable()
export class RunProgressService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly runs: RunsRepository,
    private readonly cited: CitedRevisionsRepository,
    private readonly deviations: DeviationsService,
    private readonly ledger: LedgerService,
    private readonly acts: RunActs,
    private readonly letters: RunLettersService,
  ) {}

  async tick(actor: Actor, id: string, { tick, untick }: TickRunDto): Promise<RunDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const run = await this.acts.lockStarted(tx, actor, id);
      const revision = await this.cited.find(tx, actor.shopId, run.revisionId);
      const problems = revision === undefined ? [] : tickProblems(revision.content, [...tick, ...untick], { isStart: false });
      if (problems.length > 0) throw new NotReadyToStartError(problems);
      const now = new Date().toISOString();
      const added = Object.fromEntries(tick.filter((key) => run.ticks[key] === undefined).map((key) => [key, now]));
      const kept = Object.fromEntries(Object.entries(run.ticks).filter(([key]) => !untick.includes(key)));
      return this.write(tx, actor, run, { action: 'run.ticked', change: { ticks: { ...kept, ...added } }, told: { tick, untick } });
    });
  }

  /** Looks at the first piece: releases the batch, or says that it does not match and leaves it for another try. */
  async firstPiece(actor: Actor, id: string, { ok, note, photoId }: FirstPieceActDto): Promise<RunDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const run = await this.acts.lockStarted(tx, actor, id);
      if (ok) await this.refuseStopped(tx, actor, run);
      if (photoId !== undefined && !(await this.runs.isPhotoOfShop(tx, actor.shopId, photoId)))
        throw new InvalidError('One field needs another look.', [{ pointer: '#/photoId', detail: 'This photo is not in the shop.' }]);
      const who = { by: actor.memberId, byName: actor.printedName, at: new Date().toISOString() };
      const firstPiece = { ok, ...who, note, ...(photoId === undefined ? {} : { photoId }) };
      const action = ok ? 'run.first-piece-released' : 'run.first-piece-refused';
      return this.write(tx, actor, run, { action, change: { firstPiece }, told: firstPiece });
    });
  }

  async finish(actor: Actor, id: string, dto: FinishRunDto): Promise<RunDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const run = await this.acts.lockStarted(tx, actor, id);
      if (run.kind === 'production' && dto.good > 0 && run.firstPiece?.ok !== true) throw new FirstPieceNotReleasedError();
      if (run.kind === 'confirmation' && dto.measurements.length === 0) throw measurementsMissing();
      if (run.deviationId !== null)
        await this.deviations.assertQuantityLeft(tx, actor.shopId, { id: run.deviationId, quantity: dto.good + dto.scrap });
      const criteria = await this.cited.criteria(tx, actor.shopId, run.revisionId);
      const measurements = dto.measurements.map((measurement) => judged(measurement, criteria));
      const told = { goodCount: dto.good, scrapCount: dto.scrap, measurements, notes: dto.notes };
      return this.write(tx, actor, run, {
        action: 'run.finished',
        change: { ...told, state: 'finished' },
        told,
      });
    });
  }

  /** A bad result is told of a run at any time, also after its end; every lead gets a letter about it. */
  async tellBadResult(actor: Actor, id: string, { outcome, note }: TellBadResultDto): Promise<RunDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const run = await this.acts.lockOwn(tx, actor, id);
      const badResult = { outcome, note, at: new Date().toISOString(), byName: actor.printedName };
      const dto = await this.write(tx, actor, run, { action: 'run.bad-result-told', change: { badResult }, told: badResult });
      await this.letters.badResult(tx, actor, dto);
      return dto;
    });
  }

  /** Under lock, so that no hold or withdrawal slips in before the batch is released. */
  private async refuseStopped(tx: Tx, actor: Actor, run: RunRow): Promise<void> {
    const revision = await this.cited.lock(tx, actor.shopId, run.revisionId);
    const holds = await this.runs.openHolds(tx, actor.shopId, run);
    if (holds.length > 0) throw new OnHoldError(holds);
    const stopped = revision !== undefined && stopsRun(revision.state) ? whyNotUsable(run.kind, revision.state) : undefined;
    if (stopped !== undefined) throw new RevisionNotUsableError(stopped);
  }

  private async write(
    tx: Tx,
    actor: Actor,
    run: RunRow,
    { action, change, told }: { action: string; change: RunChange; told: unknown },
  ): Promise<RunDto> {
    await this.runs.update(tx, actor.shopId, run.id, change);
    await this.ledger.record(tx, { actor, action, subjectType: 'run', subjectId: run.id, subjectCode: run.code, after: told });
    return this.acts.toDto(tx, actor, run.id);
  }
}

function judged({ piece, quantity, value, method }: MeasurePieceDto, criteria: readonly Criterion[]) {
  const asked = criteria.filter((criterion) => criterion.quantity === quantity);
  const meets = asked.length === 0 ? {} : { meets: asked.every((criterion) => meetsCriterion(criterion, value)) };
  return { piece, quantity, value, unit: QUANTITIES[quantity].unit, method, ...meets };
}

const measurementsMissing = () =>
  new InvalidError('A confirmation run proves a setting by measured pieces.', [
    { pointer: '#/measurements', detail: 'Measure at least one piece.' },
  ]);
