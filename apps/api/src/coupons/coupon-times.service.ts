import { Injectable } from '@nestjs/common';
import { type MarkedAreas, type MarkTime, markedAreas, markTime, type TimeGround } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { InvalidError } from '../common/errors/domain-error';
import { UnitOfWork } from '../database/unit-of-work';
import type { LoggedTimeDto } from '../machines/dto/marking-time.dto';
import { MarkingTimesService } from '../machines/marking-times.service';
import type { WholeCoupon } from './coupons.mapper';
import type { StoredCell } from './coupons.repository';
import { CouponsService } from './coupons.service';
import type { CouponTimesDto, LogCouponTimeDto } from './dto/coupon-times.dto';

/** What the time of a cell rests on; a plate burnt earlier may lack it. */
const RESTS_ON = ['speedMmPerS', 'lineSpacingUm', 'passes', 'fill'] as const;

/** How long cells take, and how long they took. */
@Injectable()
export class CouponTimesService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
    private readonly times: MarkingTimesService,
  ) {}

  async list(actor: Actor, couponId: string): Promise<CouponTimesDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const whole = await this.coupons.getWhole(tx, actor.shopId, couponId);
      const { machineId } = whole.view.coupon;
      const ground = await this.times.ground(tx, actor.shopId, machineId);
      return {
        whole: timeOf(areasOf(whole, markedCells(whole)), ground),
        cells: whole.cells.map((cell) => ({ cellId: cell.id, predicted: timeOf(areasOf(whole, [cell]), ground) })),
        items: await this.times.list(tx, actor.shopId, machineId, { couponId }),
      };
    });
  }

  /** A cell or all cells were clocked; a sealed coupon takes it too, because the time says something of the machine. */
  async log(actor: Actor, couponId: string, { seconds, cellId }: LogCouponTimeDto): Promise<LoggedTimeDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const whole = await this.coupons.getWhole(tx, actor.shopId, couponId);
      const { id, code, machineId } = whole.view.coupon;
      const cell = cellId === undefined ? undefined : getCell(whole, cellId);
      return this.times.add(tx, actor, {
        ...{ machineId, seconds, couponId, pausesS: 0, ...(cell === undefined ? {} : { cellId: cell.id }) },
        marked: areasOf(whole, cell === undefined ? markedCells(whole) : [cell]),
        subject: cell === undefined ? { type: 'coupon', id, code } : { type: 'cell', id: cell.id, code: `${code} ${cell.address}` },
      });
    });
  }
}

const markedCells = ({ cells }: WholeCoupon) => cells.filter(({ markState }) => markState !== 'skipped');

function getCell({ cells }: WholeCoupon, cellId: string): StoredCell {
  const cell = cells.find(({ id }) => id === cellId);
  if (cell === undefined)
    throw new InvalidError('One field needs another look.', [{ pointer: '#/cellId', detail: 'This cell is not on the coupon.' }]);
  if (cell.markState === 'skipped')
    throw new InvalidError('One field needs another look.', [
      { pointer: '#/cellId', detail: `${cell.address} was skipped: nothing was marked.` },
    ]);
  return cell;
}

/** Filled squares with what was really set. */
function areasOf({ view, grids }: WholeCoupon, cells: readonly StoredCell[]): MarkedAreas {
  const unknown = RESTS_ON.find((field) => view.coupon.unknownFields.includes(field));
  if (unknown !== undefined) return { unknownBecause: 'speed, line spacing, passes or fill of this plate were not written down' };
  const sides = new Map(grids.map(({ id, cellMm }) => [id, cellMm]));
  return markedAreas(
    cells.map(({ parameters, actualParameters, gridId }) => {
      const sideMm = sides.get(gridId) ?? 0;
      return { parameters: actualParameters ?? parameters, areaMm: { widthMm: sideMm, heightMm: sideMm } };
    }),
  );
}

function timeOf(marked: MarkedAreas, ground: TimeGround): MarkTime {
  if ('areas' in marked) return markTime({ areas: marked.areas, pausesS: 0 }, ground);
  return { totalS: null, beamOnS: null, errorS: null, missingBecause: marked.unknownBecause };
}
