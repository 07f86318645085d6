import { Injectable } from '@nestjs/common';
import { nextCouponState, type Panel, type ParameterSet, type PhysicalProfile } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { InvalidError, NotFoundError, StaleError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { LedgerService } from '../ledger/ledger.service';
import { actualParameters } from './coupon-marking';
import { type CellMark, CouponMarkingRepository } from './coupon-marking.repository';
import { measuredCalibration } from './coupon-plan-ground.service';
import type { SettingMachine } from './coupon-plan-setting';
import { CouponStateError } from './coupons.errors';
import { toCouponCellDto } from './coupons.mapper';
import type { StoredCell, StoredCoupon } from './coupons.repository';
import { CouponsService } from './coupons.service';
import type { CouponDto } from './dto/coupon.dto';
import type { FinishMarkingDto, MarkCellDto, MarkedCellDto, UndoMarkDto } from './dto/mark-cell.dto';

const UNMARKED: CellMark = { markState: 'planned', markNote: '', markedAt: null, markedBy: null, actualParameters: null };

/** Marking at the machine: every act is kept at once, so that a reload goes on where it was. */
@Injectable()
export class CouponMarkingService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
    private readonly marking: CouponMarkingRepository,
    private readonly ledger: LedgerService,
  ) {}

  /** The labels are on the plate and the cells come next; a second start changes nothing. */
  async start(actor: Actor, couponId: string): Promise<CouponDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.lockPlanned(tx, actor, couponId);
      if (coupon.markingStartedAt === null) {
        await this.marking.updateCoupon(tx, actor.shopId, couponId, { markingStartedAt: new Date() });
        await this.record(tx, actor, coupon, 'coupon.marking-started');
      }
      return this.coupons.getDto(tx, actor, couponId);
    });
  }

  async markCell(actor: Actor, couponId: string, dto: MarkCellDto): Promise<MarkedCellDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.lockPlanned(tx, actor, couponId);
      if (coupon.markingStartedAt === null) throw new CouponStateError('Mark the labels first, then start with the cells.');
      const before = await this.lockCell(tx, actor, coupon, dto);
      const mark = await this.markOf(tx, actor, { coupon, cell: before, dto });
      const cell = await this.marking.setMark(tx, actor.shopId, before.id, mark);
      await this.recordCell(tx, actor, { coupon, before, after: cell, action: `cell.${dto.outcome}` });
      return this.answer(tx, actor, coupon, cell);
    });
  }

  /** The cell is to be marked again: what was said of it is taken back, and the ledger keeps both. */
  async undo(actor: Actor, couponId: string, dto: UndoMarkDto): Promise<MarkedCellDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.lockPlanned(tx, actor, couponId);
      const before = await this.lockCell(tx, actor, coupon, dto);
      if (before.markState === 'planned') return this.answer(tx, actor, coupon, before);
      const cell = await this.marking.setMark(tx, actor.shopId, before.id, UNMARKED);
      await this.recordCell(tx, actor, { coupon, before, after: cell, action: 'cell.mark-undone' });
      return this.answer(tx, actor, coupon, cell);
    });
  }

  /** Planned → marked, with who and when. Every cell must be marked or skipped, and one at least marked. */
  async finish(actor: Actor, couponId: string, { ambientNotes, storedAt }: FinishMarkingDto): Promise<CouponDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const coupon = await this.lockPlanned(tx, actor, couponId);
      await this.refuseUnfinished(tx, actor, couponId);
      const moved = nextCouponState(coupon.state, 'mark');
      if (moved.kind === 'refused') throw new CouponStateError(moved.message);
      const change = {
        state: moved.state,
        markedAt: new Date(),
        markedBy: actor.memberId,
        ...(ambientNotes === undefined ? {} : { ambientNotes }),
        ...(storedAt === undefined ? {} : { storedAt }),
      };
      await this.marking.updateCoupon(tx, actor.shopId, couponId, change);
      await this.record(tx, actor, coupon, 'coupon.marked', change);
      return this.coupons.getDto(tx, actor, couponId);
    });
  }

  private async lockPlanned(tx: Tx, actor: Actor, couponId: string): Promise<StoredCoupon> {
    const coupon = await this.coupons.lock(tx, actor.shopId, couponId);
    if (coupon.state !== 'planned') throw new CouponStateError('This coupon is marked already. What differs goes into a correction.');
    return coupon;
  }

  private async lockCell(tx: Tx, actor: Actor, coupon: StoredCoupon, at: { cellId: string; cellVersion: number }): Promise<StoredCell> {
    const cell = await this.marking.lockCell(tx, actor.shopId, { couponId: coupon.id, cellId: at.cellId });
    if (cell === undefined) throw new NotFoundError('This cell is not on the coupon. Load the page again.');
    if (cell.version !== at.cellVersion) throw new StaleError(toCouponCellDto(cell, coupon.unknownFields));
    return cell;
  }

  private async markOf(tx: Tx, actor: Actor, { coupon, cell, dto }: { coupon: StoredCoupon; cell: StoredCell; dto: MarkCellDto }) {
    const { outcome, note = '' } = dto;
    if (outcome === 'skipped' && note === '')
      throw new InvalidError('Say why.', [{ pointer: '#/note', detail: 'Say why the cell was skipped, in a word or two.' }]);
    const actual = outcome === 'differs' ? await this.actualOf(tx, actor, { coupon, cell, dto }) : null;
    const mark: CellMark = { markState: outcome, markNote: note, markedAt: new Date(), markedBy: actor.memberId, actualParameters: actual };
    return mark;
  }

  private async actualOf(
    tx: Tx,
    actor: Actor,
    { coupon, cell, dto }: { coupon: StoredCoupon; cell: StoredCell; dto: MarkCellDto },
  ): Promise<ParameterSet> {
    const with_ = await this.marking.markedWith(tx, actor.shopId, coupon.id);
    if (with_ === undefined) throw new Error('the coupon has no profile');
    const { calibration } = with_;
    // the machines module is the only way into these columns, so they hold the model's shapes
    const machine: SettingMachine = {
      panel: with_.panel as unknown as Panel,
      physical: with_.physical as unknown as PhysicalProfile,
      ...(calibration === null ? {} : { calibration: measuredCalibration(calibration) }),
    };
    const { result, problems } = actualParameters(machine, cell.parameters, dto.actual);
    if (problems.length > 0) throw new InvalidError('What was really used needs another look.', problems);
    return result;
  }

  private async refuseUnfinished(tx: Tx, actor: Actor, couponId: string): Promise<void> {
    const marks = await this.marking.marks(tx, actor.shopId, couponId);
    const open = marks.filter(({ markState }) => markState === 'planned').map(({ address }) => address);
    if (open.length > 0) throw new CouponStateError(`Not yet marked or skipped: ${open.join(', ')}.`, { openCells: open });
    if (marks.every(({ markState }) => markState === 'skipped'))
      throw new CouponStateError('Every cell was skipped, so there is no marked plate. Mark one at least.');
  }

  private async answer(tx: Tx, actor: Actor, coupon: StoredCoupon, cell: StoredCell): Promise<MarkedCellDto> {
    const marks = await this.marking.marks(tx, actor.shopId, coupon.id);
    const doneCount = marks.filter(({ markState }) => markState !== 'planned').length;
    return { cell: toCouponCellDto(cell, coupon.unknownFields), doneCount, cellCount: marks.length };
  }

  private async record(tx: Tx, actor: Actor, { id, code, state }: StoredCoupon, action: string, after?: object): Promise<void> {
    await this.ledger.record(tx, { actor, action, subjectType: 'coupon', subjectId: id, subjectCode: code, before: { state }, after });
  }

  private async recordCell(
    tx: Tx,
    actor: Actor,
    { coupon, before, after, action }: { coupon: StoredCoupon; before: StoredCell; after: StoredCell; action: string },
  ): Promise<void> {
    const subject = { subjectType: 'cell', subjectId: after.id, subjectCode: `${coupon.code} ${after.address}` };
    await this.ledger.record(tx, { actor, action, ...subject, before: ledgerBody(before), after: ledgerBody(after) });
  }
}

const ledgerBody = ({ markState, markNote, actualParameters: actual }: StoredCell) => ({ markState, markNote, actualParameters: actual });
