import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import type { FieldProblem } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { ShopsService } from '../shops/shops.service';
import { cellDose } from './cell-dose';
import { type EarlierPlate, earlierPlate } from './coupon-import-plate';
import { CouponPlanGroundService } from './coupon-plan-ground.service';
import { acknowledged, invalidPlan } from './coupon-plans.service';
import { CouponStoreService } from './coupon-plans-store.service';
import type { CouponDto } from './dto/coupon.dto';
import type { ImportCouponDto, ImportPreviewDto } from './dto/import-coupon.dto';
import { CELL_MM, GAP_MM } from './dto/plan-coupon.dto';

/** Plates of earlier years carry none of our marks, so no photo of theirs is found by a layout. */
const EARLIER_LAYOUT = 'earlier-plate';

/** Plates burnt before they were logged here: they enter as marked, and what nobody knows stays unknown. */
@Injectable()
export class CouponImportService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly grounds: CouponPlanGroundService,
    private readonly store: CouponStoreService,
    private readonly shops: ShopsService,
  ) {}

  /** What would be stored, with every refused row; nothing is. */
  async preview(actor: Actor, dto: ImportCouponDto): Promise<ImportPreviewDto> {
    const { plate } = await this.unitOfWork.read(actor, (tx) => this.read(tx, actor, dto));
    if (plate.problems.length > 0 && plate.refusedRows.length === 0) throw invalidPlan(plate.problems);
    const { rows, columns, cells, refusedRows, ignoredHeadings, unknownFields } = plate;
    return {
      ...{ rows, columns, refusedRows: [...refusedRows], ignoredHeadings: [...ignoredHeadings], unknownFields: [...unknownFields] },
      cells: cells.map(({ address, row, column, parameters, note }) => ({
        ...{ address, rowIndex: row, columnIndex: column, parameters, note },
        dose: cellDose(parameters, unknownFields),
      })),
    };
  }

  async create(actor: Actor, dto: ImportCouponDto): Promise<CouponDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const { ground, plate } = await this.read(tx, actor, dto);
      const problems = [...plate.problems, ...(dto.leaveOutRefusedRows === true ? [] : rowProblems(plate))];
      if (problems.length > 0) throw invalidPlan(problems);
      const { title = '', lot = '', thicknessMm = null, storedAt = '', notes = '' } = dto;
      const { materialId, finishId, effectId, machineId, lensId } = dto;
      const { rows, columns, rowFactor, columnFactor, baseSetting, cells } = plate;
      return this.store.add(tx, actor, {
        coupon: {
          ...{ title, lot, thicknessMm, storedAt, notes, materialId, finishId, effectId, machineId, lensId },
          purpose: 'exploration',
          state: 'marked',
          profileId: ground.profileId,
          calibrationId: null,
          acknowledgedCautionIds: acknowledged(ground, dto.acknowledgedCautionIds),
          isImported: true,
          unknownFields: [...plate.unknownFields],
          markedAt: dto.markedOn === undefined ? null : new Date(dto.markedOn),
          markedBy: dto.markedByMe === true ? actor.memberId : null,
        },
        grid: {
          ...{ rows, columns, rowFactor, columnFactor, baseSetting, labelStep: null },
          cellMm: dto.cellMm ?? CELL_MM.usual,
          gapMm: dto.gapMm ?? GAP_MM.usual,
          layoutVersion: EARLIER_LAYOUT,
          runOrderSeed: null,
          fillDrawnBy: 'machine',
        },
        cells: cells.map(({ address, row, column, parameters, note }, index) => ({
          ...{ address, rowIndex: row, columnIndex: column, runOrder: index + 1, parameters },
          markState: 'marked' as const,
          markNote: note,
        })),
        action: 'coupon.imported',
      });
    });
  }

  /** Calibrations of today say nothing about the watts of then. */
  private async read(tx: Tx, actor: Actor, dto: ImportCouponDto) {
    const ground = await this.grounds.read(tx, actor.shopId, dto);
    const { panel, physical } = ground.machine;
    const plate = earlierPlate({ panel, physical }, dto);
    const isLater = dto.markedOn !== undefined && dto.markedOn > (await this.shops.today(tx, actor.shopId));
    return { ground, plate: isLater ? { ...plate, problems: [MARKED_LATER, ...plate.problems] } : plate };
  }
}

const MARKED_LATER: FieldProblem = {
  pointer: '#/markedOn',
  detail: 'This day is still to come. Enter the day on which it was marked, or leave it out.',
};

const rowProblems = ({ refusedRows }: EarlierPlate): FieldProblem[] =>
  refusedRows.map(({ line, reason }) => ({ pointer: '#/table', detail: `Line ${line}: ${reason}` }));
