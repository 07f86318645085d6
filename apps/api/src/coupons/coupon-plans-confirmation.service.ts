import { Injectable } from '@nestjs/common';
import { COUPON_LAYOUT_VERSION, cellAddress } from '@proofplate/imaging';
import type { MarkStep, Panel, ParameterSet } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import { ConflictError, type FieldProblem, InvalidError, NotFoundError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { CouponPlanGroundService } from './coupon-plan-ground.service';
import { enterSetting, enterValues } from './coupon-plan-setting';
import { CouponPlansRepository, type RevisionToConfirm } from './coupon-plans.repository';
import { acknowledged, invalidPlan } from './coupon-plans.service';
import { CouponStoreService } from './coupon-plans-store.service';
import type { ConfirmRevisionDto } from './dto/confirm-revision.dto';
import type { CouponDto } from './dto/coupon.dto';
import { CELL_MM, GAP_MM } from './dto/plan-coupon.dto';

const PROVABLE = ['draft', 'in_review'];
/** One row reads best; more cells are folded into a block. */
const CELLS_IN_ONE_ROW = 13;

@Injectable()
export class CouponConfirmationService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly grounds: CouponPlanGroundService,
    private readonly plans: CouponPlansRepository,
    private readonly store: CouponStoreService,
  ) {}

  /** Plans n equal cells with exactly the parameters of a step of the draft: copied, never computed again. */
  async create(actor: Actor, dto: ConfirmRevisionDto): Promise<CouponDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      const revision = await this.plans.findRevision(tx, actor.shopId, dto.revisionId);
      if (revision === undefined) throw new NotFoundError('This draft is not in the shop, or no longer. Go back to Recipes.');
      const step = stepToProve(revision, dto.stepNumber ?? 1);
      const { title, code, ...keys } = revision.recipe;
      const ground = await this.grounds.read(tx, actor.shopId, keys);
      const labels = dto.labelStep === undefined ? undefined : enterSetting(ground.machine, dto.labelStep, { pointer: '#/labelStep' });
      if (labels !== undefined && labels.problems.length > 0) throw invalidPlan(labels.problems);
      const labelStep = labels?.result ?? (await this.copiedLabelStep(tx, actor.shopId, { revision, panel: ground.machine.panel }));
      const { rows, columns } = blockOf(dto.count);
      return this.store.add(tx, actor, {
        coupon: {
          ...keys,
          title: `Proof of ${code}, ${title}`,
          purpose: 'confirmation',
          confirmsRevisionId: revision.id,
          profileId: revision.profileId,
          calibrationId: revision.calibrationId,
          lot: dto.lot ?? '',
          thicknessMm: dto.thicknessMm ?? null,
          storedAt: dto.storedAt ?? '',
          notes: dto.notes ?? '',
          acknowledgedCautionIds: acknowledged(ground, dto.acknowledgedCautionIds),
        },
        grid: {
          ...{ rows, columns, rowFactor: null, columnFactor: null, baseSetting: step.parameters, labelStep },
          cellMm: dto.cellMm ?? CELL_MM.usual,
          gapMm: dto.gapMm ?? GAP_MM.usual,
          layoutVersion: COUPON_LAYOUT_VERSION,
          runOrderSeed: null,
          fillDrawnBy: 'machine',
        },
        cells: Array.from({ length: dto.count }, (_, index) => {
          const [rowIndex, columnIndex] = [Math.floor(index / columns), index % columns];
          return { address: cellAddress(rowIndex, columnIndex), rowIndex, columnIndex, runOrder: index + 1, parameters: step.parameters };
        }),
        action: 'coupon.planned-as-proof',
      });
    });
  }

  /** The setting that labelled the plates before; the panel may have changed since. */
  private async copiedLabelStep(
    tx: Tx,
    shopId: string,
    { revision, panel }: { revision: RevisionToConfirm; panel: Panel },
  ): Promise<ParameterSet | null> {
    const copied = await this.plans.labelStepFor(tx, shopId, revision);
    const problems = copied === null ? [] : unshowable(panel, copied);
    if (problems.length === 0) return copied;
    const what = problems.map(({ detail }) => detail).join(' ');
    throw new InvalidError(
      `The setting of the labels comes from an earlier plate, and the panel cannot show it any more. ${what}`,
      problems,
    );
  }
}

/** What the machine's panel of today cannot show of an earlier setting, each with the nearest values that it can. */
export function unshowable(panel: Panel, { values }: Pick<ParameterSet, 'values'>): FieldProblem[] {
  const entered = Object.fromEntries(Object.entries(values).map(([key, value]) => [key, value?.entered]));
  return [...enterValues(panel, entered, '#/labelStep/values').problems];
}

function stepToProve({ state, content }: RevisionToConfirm, stepNumber: number): MarkStep {
  if (!PROVABLE.includes(state))
    throw new ConflictError('Only a draft or a revision in review can be proved. Propose a change first, then prove that.');
  const step = content.steps[stepNumber - 1];
  if (step !== undefined) return step;
  const steps = content.steps.length;
  const detail = steps === 0 ? 'The draft has no mark step yet. Add one first.' : `The draft has ${steps} mark steps. Choose one of them.`;
  throw new InvalidError(detail, [{ pointer: '#/stepNumber', detail }]);
}

function blockOf(count: number): { rows: number; columns: number } {
  const columns = count <= CELLS_IN_ONE_ROW ? count : Math.ceil(Math.sqrt(count));
  return { rows: Math.ceil(count / columns), columns };
}
