import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { decodeCursor, type Page, pageOf } from '../common/pagination/page';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { CalibrationsService } from '../machines/calibrations.service';
import { ShopsService } from '../shops/shops.service';
import { shiftSinceProof } from './calibration-checks';
import type { ListPowerShiftsQuery, PowerShiftDto, RecipePowerShiftDto } from './dto/power-shift.dto';
import { RecipeRevisionsRepository } from './recipe-revisions.repository';
import type { RevisionCalibration, RevisionHead } from './stored-revision';

/** What later readings of the power meter say of settings that were proved with earlier ones. */
@Injectable()
export class PowerShiftsService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly revisions: RecipeRevisionsRepository,
    private readonly calibrations: CalibrationsService,
    private readonly shops: ShopsService,
  ) {}

  /** Approved settings by their recipe's code, each with its shift or why there is none to tell. */
  async list(actor: Actor, { machineId, limit, cursor }: ListPowerShiftsQuery): Promise<Page<RecipePowerShiftDto>> {
    const [afterCode] = decodeCursor(cursor, ['string']) ?? [];
    return this.unitOfWork.read(actor, async (tx) => {
      const page = { limit: limit + 1, ...(afterCode === undefined ? {} : { afterCode: String(afterCode) }) };
      const ids = await this.revisions.approvedIds(tx, actor.shopId, { ...page, ...(machineId === undefined ? {} : { machineId }) });
      const heads = await this.revisions.heads(tx, actor.shopId, ids);
      const shifts = await this.ofHeads(tx, actor.shopId, heads);
      const inOrder = ids.flatMap((id) => heads.filter(({ revision }) => revision.id === id));
      return pageOf(inOrder, limit, {
        item: (head) => toListed(head, shifts.get(head.revision.id) ?? null),
        cursor: ({ recipe }) => [recipe.code],
      });
    });
  }

  /** Shifts beyond the policy by revision; a revision without one has none. */
  async checkDue(tx: Tx, shopId: string, revisionIds: readonly string[]): Promise<ReadonlyMap<string, PowerShiftDto>> {
    const shifts = await this.ofHeads(tx, shopId, await this.revisions.heads(tx, shopId, revisionIds));
    return new Map([...shifts].filter(([, { isCheckDue }]) => isCheckDue));
  }

  private async ofHeads(tx: Tx, shopId: string, heads: readonly RevisionHead[]): Promise<Map<string, PowerShiftDto>> {
    const machineIds = [...new Set(heads.map(({ recipe }) => recipe.machine.id))];
    const readings = await this.calibrations.readingsOf(tx, shopId, machineIds);
    const { policy } = await this.shops.getRow(tx, shopId);
    return new Map(
      heads.flatMap((head) => {
        const ofMachine = readings.filter(({ machineId }) => machineId === head.recipe.machine.id);
        const shift = toPowerShiftDto(head, ofMachine, policy.powerShiftPercent);
        return shift === null ? [] : [[head.revision.id, shift] as const];
      }),
    );
  }
}

function toPowerShiftDto(head: RevisionHead, readings: readonly RevisionCalibration[], limitPercent: number): PowerShiftDto | null {
  const shift = shiftSinceProof(head, readings);
  if (shift === null || head.calibration === null) return null;
  return { ...shift, citedOn: head.calibration.measuredOn, limitPercent, isCheckDue: Math.abs(shift.shiftPercent) > limitPercent };
}

function toListed({ recipe, revision, calibration }: RevisionHead, shift: PowerShiftDto | null): RecipePowerShiftDto {
  const { id, code, title, machine } = recipe;
  const noReading = calibration === null ? 'It cites no power calibration.' : 'No later reading holds for its frequency and pulse width.';
  return {
    ...{ id, code, title, machine: { id: machine.id, name: machine.name } },
    revisionNumber: revision.number ?? 0,
    shift,
    reason: shift === null ? noReading : null,
  };
}
