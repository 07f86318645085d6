import { Injectable } from '@nestjs/common';
import { COUPON_LAYOUT_VERSION } from '@proofplate/imaging';
import type { Actor } from '../common/actor';
import { type FieldProblem, InvalidError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { cellDose } from './cell-dose';
import { type PlannedGrid, planGrid } from './coupon-plan-grid';
import { CouponPlanGroundService, type PlanGround } from './coupon-plan-ground.service';
import { markingTimeOf, numbersOf } from './coupon-plan-numbers';
import { planWarnings } from './coupon-plan-warnings';
import { CouponStoreService } from './coupon-plans-store.service';
import { plateSize } from './coupons.mapper';
import { DoseCautionService } from './dose-caution.service';
import type { CouponDto } from './dto/coupon.dto';
import type { CouponPreviewDto } from './dto/coupon-preview.dto';
import type { PlanCouponDto } from './dto/plan-coupon.dto';

@Injectable()
export class CouponPlansService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly grounds: CouponPlanGroundService,
    private readonly doseCautions: DoseCautionService,
    private readonly store: CouponStoreService,
  ) {}

  /** What the plan would give; nothing is stored. */
  async preview(actor: Actor, dto: PlanCouponDto): Promise<CouponPreviewDto> {
    return this.unitOfWork.read(actor, async (tx) => {
      const ground = await this.grounds.read(tx, actor.shopId, dto);
      return this.toPreview(tx, actor, { dto, ground, grid: plannedOrThrow(ground, dto) });
    });
  }

  async create(actor: Actor, dto: PlanCouponDto): Promise<CouponDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const ground = await this.grounds.read(tx, actor.shopId, dto);
      const grid = plannedOrThrow(ground, dto);
      const { title = '', materialId, finishId, effectId, machineId, lensId } = dto;
      const { profileId, calibrationId } = ground;
      const coupon = {
        ...{ title, purpose: 'exploration' as const, materialId, finishId, effectId, machineId, lensId, profileId, calibrationId },
        lot: dto.lot ?? '',
        thicknessMm: dto.thicknessMm ?? null,
        storedAt: dto.storedAt ?? '',
        notes: dto.notes ?? '',
        acknowledgedCautionIds: acknowledged(ground, dto.acknowledgedCautionIds),
      };
      const { cells, ...stored } = grid;
      const { cellMm, gapMm, fillDrawnBy, runOrderSeed = null } = dto;
      const geometry = { cellMm, gapMm, layoutVersion: COUPON_LAYOUT_VERSION, runOrderSeed, fillDrawnBy };
      return this.store.add(tx, actor, {
        coupon,
        grid: { ...stored, ...geometry },
        cells: cells.map(({ row, column, ...cell }) => ({ ...cell, rowIndex: row, columnIndex: column })),
        action: 'coupon.planned',
      });
    });
  }

  private async toPreview(
    tx: Tx,
    actor: Actor,
    { dto, ground, grid }: { dto: PlanCouponDto; ground: PlanGround; grid: PlannedGrid },
  ): Promise<CouponPreviewDto> {
    const { rows, columns, rowFactor, columnFactor, baseSetting, cells } = grid;
    const plate = plateSize({ rows, columns, cellMm: dto.cellMm, gapMm: dto.gapMm });
    const caution = await this.doseCautions.find(tx, actor.shopId, dto, dto.doseCautionJPerMm2 ?? null);
    return {
      ...{ rows, columns, rowFactor, columnFactor, baseSetting, plate },
      cells: cells.map(({ address, row, column, runOrder, parameters }) => ({
        ...{ address, rowIndex: row, columnIndex: column, runOrder },
        dose: cellDose(parameters),
      })),
      markingTime: markingTimeOf(cells, dto.cellMm, ground.time),
      powerBasis: powerBasis(cells),
      spotUm: numbersOf(baseSetting, ground.optics).get('spotAtWork')?.value ?? null,
      doseCaution: caution,
      warnings: planWarnings(grid, { optics: ground.optics, doseCaution: caution, plate, lens: ground.lens }),
      cautions: [...ground.cautions],
    };
  }
}

function plannedOrThrow(ground: PlanGround, dto: PlanCouponDto): PlannedGrid {
  const planned = planGrid(ground.machine, dto);
  if (planned.kind === 'planned') return planned.grid;
  throw invalidPlan(planned.problems);
}

export const invalidPlan = (problems: readonly FieldProblem[]) =>
  new InvalidError(problems.length === 1 ? 'One field needs another look.' : `${problems.length} fields need another look.`, problems);

/** Only cautions that stand beside this work can have been read for it. */
export function acknowledged({ cautions }: Pick<PlanGround, 'cautions'>, ids: readonly string[] = []): string[] {
  return cautions.map(({ id }) => id).filter((id) => ids.includes(id));
}

function powerBasis(cells: PlannedGrid['cells']): CouponPreviewDto['powerBasis'] {
  const bases = new Set(cells.map(({ parameters: { power } }) => (power.watts === null ? 'unknown' : power.basis)));
  const [only] = bases;
  return bases.size === 1 && only !== undefined ? only : 'mixed';
}
