import { Injectable } from '@nestjs/common';
import type { MarkedAreas, TimeGround } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { ConflictError, InvalidError, NotFoundError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import type { CorrectLoggedTimeDto, LoggedTimeDto, MachineMarkingTimeDto } from './dto/marking-time.dto';
import { toLoggedTimeDto } from './logged-times.mapper';
import { LoggedTimesRepository, type LoggedTimeView, type TimesOf } from './logged-times.repository';
import { MachinesService } from './machines.service';
import { type MachineTimes, machineTimes } from './marking-overheads';

/** The newest ones say what the machine does now. */
const MOST_LOGGED = 500;

/** A clocked mark, as runs and coupons hand it in. */
export type ClockedTime = {
  readonly machineId: string;
  readonly seconds: number;
  readonly marked: MarkedAreas;
  readonly pausesS: number;
  readonly subject: { readonly type: 'run' | 'coupon' | 'cell'; readonly id: string; readonly code: string };
  readonly runId?: string;
  readonly couponId?: string;
  readonly cellId?: string;
};

/** Logged marking times of machines, and the overheads of the scan head that follow from them. */
@Injectable()
export class MarkingTimesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly machines: MachinesService,
    private readonly times: LoggedTimesRepository,
    private readonly ledger: LedgerService,
  ) {}

  async get(actor: Actor, machineId: string): Promise<MachineMarkingTimeDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const { profile } = await this.machines.getMachineWithProfile(tx, actor.shopId, machineId);
      const logged = await this.times.list(tx, actor.shopId, { machineId }, MOST_LOGGED);
      const found = machineTimes(profile, logged);
      return { ground: found.ground, items: logged.map((view) => toLoggedTimeDto(view, found)) };
    });
  }

  /** What times on this machine are worked out with now, for other modules' use cases. */
  async ground(tx: Tx, shopId: string, machineId: string): Promise<TimeGround> {
    return (await this.machineTimes(tx, shopId, machineId)).ground;
  }

  /** Logged times of one run or coupon, newest first, each with what is predicted now. */
  async list(tx: Tx, shopId: string, machineId: string, of: Exclude<TimesOf, { machineId: string }>): Promise<LoggedTimeDto[]> {
    const found = await this.machineTimes(tx, shopId, machineId);
    return (await this.times.list(tx, shopId, of, MOST_LOGGED)).map((view) => toLoggedTimeDto(view, found));
  }

  /** Keeps a clocked mark with the machine's profile in force; the caller has checked who may. @throws InvalidError with the field */
  async add(tx: Tx, actor: Actor, { machineId, marked, seconds, pausesS, subject, ...keys }: ClockedTime): Promise<LoggedTimeDto> {
    if ('unknownBecause' in marked) throw new InvalidError(`Nothing can be learnt from this time: ${marked.unknownBecause}.`, []);
    refuseWithinPauses(seconds, pausesS);
    const { machine } = await this.machines.getMachineWithProfile(tx, actor.shopId, machineId);
    const { runId = null, couponId = null, cellId = null } = keys;
    const id = await this.times.insert(tx, actor.shopId, actor.memberId, {
      ...{ machineId, profileNumber: machine.profileNumber, runId, couponId, cellId, seconds, pausesS },
      ...{ counts: true, supersedesId: null, reason: '', loggedByName: actor.printedName, areas: [...marked.areas] },
    });
    const { type: subjectType, id: subjectId, code: subjectCode } = subject;
    await this.ledger.record(tx, {
      ...{ actor, action: 'marking-time.logged', subjectType, subjectId, subjectCode },
      after: { machine: machine.name, seconds, pausesS, areas: [...marked.areas] },
    });
    return this.getDto(tx, actor, machineId, id);
  }

  /** A mistake is put right, or taken out of the count, by another row that says why. */
  async correct(actor: Actor, machineId: string, loggedTimeId: string, dto: CorrectLoggedTimeDto): Promise<LoggedTimeDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { machine } = await this.machines.getMachineWithProfile(tx, actor.shopId, machineId);
      const { time } = await this.getCurrent(tx, actor, machineId, loggedTimeId);
      const { shopId: _shop, id: supersedesId, createdAt: _at, createdBy: _by, ...mark } = time;
      const { counts, reason, seconds = mark.seconds } = dto;
      refuseWithinPauses(seconds, mark.pausesS);
      const loggedByName = actor.printedName;
      const changed = { counts, reason, seconds: counts ? seconds : mark.seconds };
      const id = await this.times.insert(tx, actor.shopId, actor.memberId, { ...mark, ...changed, supersedesId, loggedByName });
      await this.ledger.record(tx, {
        ...{ actor, action: counts ? 'marking-time.corrected' : 'marking-time.struck' },
        ...{ subjectType: 'machine', subjectId: machine.id, subjectCode: machine.name },
        before: { seconds: mark.seconds, counts: mark.counts },
        after: changed,
      });
      return this.getDto(tx, actor, machineId, id);
    });
  }

  private async machineTimes(tx: Tx, shopId: string, machineId: string): Promise<MachineTimes> {
    const { profile } = await this.machines.getMachineWithProfile(tx, shopId, machineId);
    return machineTimes(profile, await this.times.list(tx, shopId, { machineId }, MOST_LOGGED));
  }

  private async getCurrent(tx: Tx, actor: Actor, machineId: string, id: string): Promise<LoggedTimeView> {
    const view = await this.times.find(tx, actor.shopId, id);
    if (view === undefined || view.time.machineId !== machineId)
      throw new NotFoundError('This time is not logged on the machine, or was corrected meanwhile. Load the page again.');
    return view;
  }

  private async getDto(tx: Tx, actor: Actor, machineId: string, id: string | undefined): Promise<LoggedTimeDto> {
    if (id === undefined) throw new ConflictError('This time was corrected meanwhile. Load the page again.');
    return toLoggedTimeDto(await this.getCurrent(tx, actor, machineId, id), await this.machineTimes(tx, actor.shopId, machineId));
  }
}

function refuseWithinPauses(seconds: number, pausesS: number): void {
  if (seconds > pausesS) return;
  const detail = `The pauses between the mark steps alone take ${pausesS} s. Clock from the first line to the last one.`;
  throw new InvalidError('One field needs another look.', [{ pointer: '#/seconds', detail }]);
}
