import { Injectable } from '@nestjs/common';
import type { SourceKind } from '@proofplate/recipe-model';
import { type FieldProblem, InvalidError } from '../common/errors/domain-error';
import type { Tx } from '../database/unit-of-work';
import { CautionsService } from '../materials/cautions.service';
import { EffectsService } from '../materials/effects.service';
import { FinishesService } from '../materials/finishes.service';
import { MaterialsService } from '../materials/materials.service';
import type { PlanCautionDto } from './dto/coupon-preview.dto';

export type CatalogueKeys = { readonly materialId: string; readonly finishId: string; readonly effectId: string };
export type Catalogue = { readonly materialName: string; readonly cautions: readonly PlanCautionDto[] };

/** Material, finish and effect of a coupon with the cautions that belong to them. */
@Injectable()
export class CouponPlanCatalogueService {
  constructor(
    private readonly materials: MaterialsService,
    private readonly finishes: FinishesService,
    private readonly effects: EffectsService,
    private readonly cautions: CautionsService,
  ) {}

  /**
   * @throws NotInCatalogueError also for another shop's things
   * @throws ForbiddenByCautionError when a `never` caution applies
   * @throws InvalidError when something is archived
   */
  async read(tx: Tx, shopId: string, keys: CatalogueKeys, sourceKind: SourceKind): Promise<Catalogue> {
    const material = await this.materials.getMaterial(tx, shopId, keys.materialId);
    const finish = await this.finishes.getFinish(tx, shopId, keys.finishId);
    const effect = await this.effects.getEffect(tx, shopId, keys.effectId);
    const work = { materialId: material.id, finishId: finish.id, effectId: effect.id, sourceKind };
    await this.cautions.assertMayBeMarked(tx, shopId, work);
    refuseArchived({ materialId: material, finishId: finish, effectId: effect });
    const cautions = await this.cautions.cautionsFor(tx, shopId, work);
    return { materialName: material.name, cautions: cautions.map(({ id, subject, text, source }) => ({ id, subject, text, source })) };
  }
}

/** What is out of use may be read for ever, but nothing new is planned with it. Fields are those of the request. */
export function refuseArchived(things: Readonly<Record<string, { readonly archivedAt: Date | null }>>): void {
  const problems: FieldProblem[] = Object.entries(things)
    .filter(([, { archivedAt }]) => archivedAt !== null)
    .map(([field]) => ({ pointer: `#/${field}`, detail: 'This is archived. Choose another, or have it restored.' }));
  if (problems.length > 0) throw new InvalidError('Something chosen is no longer in use.', problems);
}
