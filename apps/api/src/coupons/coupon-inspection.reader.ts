import { Injectable } from '@nestjs/common';
import type { Criterion } from '@proofplate/recipe-model';
import type { Actor } from '../common/actor';
import type { Tx } from '../database/unit-of-work';
import { EffectsService } from '../materials/effects.service';
import { CouponCorrectionsRepository } from './coupon-corrections.repository';
import { toCellRatingDto, toCorrectionDto, toMeasurementDtos, toVerdicts } from './coupon-inspection.mapper';
import { CouponInspectionRepository, type PhotoStanding } from './coupon-inspection.repository';
import { type InspectionFacts, missingToInspect, missingToSeal } from './coupon-inspection-missing';
import { CouponMeasurementsRepository } from './coupon-measurements.repository';
import { CouponRatingsRepository } from './coupon-ratings.repository';
import type { WholeCoupon } from './coupons.mapper';
import { couponActions } from './coupons.policy';
import { CouponsService } from './coupons.service';
import type { InspectionDto } from './dto/inspection.dto';

/** Everything that was found on a coupon, read in the caller's transaction. */
@Injectable()
export class CouponInspectionReader {
  constructor(
    private readonly coupons: CouponsService,
    private readonly inspection: CouponInspectionRepository,
    private readonly ratings: CouponRatingsRepository,
    private readonly measurements: CouponMeasurementsRepository,
    private readonly corrections: CouponCorrectionsRepository,
    private readonly effects: EffectsService,
  ) {}

  async read(tx: Tx, actor: Actor, couponId: string): Promise<InspectionDto> {
    const { shopId } = actor;
    const whole = await this.coupons.getWhole(tx, shopId, couponId);
    const { coupon } = whole.view;
    const measurements = await this.measurements.ofCoupon(tx, shopId, couponId);
    const ratings = await this.ratings.ofCoupon(tx, shopId, couponId);
    const photos = await this.inspection.photos(tx, shopId, couponId);
    const facts = { ...factsOf(whole, photos, await this.inspection.isPhotoRequired(tx, shopId)), ratings };
    return {
      couponId,
      state: coupon.state,
      criteria: coupon.criteria,
      criteriaRecordedAt: coupon.criteriaRecordedAt?.toISOString() ?? null,
      areCriteriaFixed: ratings.length + measurements.length > 0 || coupon.state === 'inspected' || coupon.state === 'sealed',
      proposedCriteria: await this.proposedCriteria(tx, shopId, coupon),
      ratings: ratings.map(toCellRatingDto),
      measurements: toMeasurementDtos(measurements, measurements),
      corrections: (await this.corrections.ofCoupon(tx, shopId, couponId)).map(toCorrectionDto),
      verdicts: toVerdicts(coupon, whole.cells, { ratings, measurements }),
      missingToInspect: missingToInspect(facts),
      missingToSeal: missingToSeal(facts),
      version: coupon.version,
      allowedActions: couponActions(actor, coupon),
    };
  }

  /** Facts for a decision: the coupon must be locked, and its photos are locked here. */
  async lockedFacts(tx: Tx, shopId: string, couponId: string): Promise<InspectionFacts> {
    const photos = await this.inspection.lockPhotos(tx, shopId, couponId);
    const whole = await this.coupons.getWhole(tx, shopId, couponId);
    const ratings = await this.ratings.ofCoupon(tx, shopId, couponId);
    return { ...factsOf(whole, photos, await this.inspection.isPhotoRequired(tx, shopId)), ratings };
  }

  /** A proof is judged as what it proves was: by the criteria of the coupon that the setting comes from. */
  private async proposedCriteria(
    tx: Tx,
    shopId: string,
    { effectId, confirmsRevisionId }: { readonly effectId: string; readonly confirmsRevisionId: string | null },
  ): Promise<Criterion[]> {
    const ofBasis = confirmsRevisionId === null ? null : await this.inspection.criteriaOfBasis(tx, shopId, confirmsRevisionId);
    if (ofBasis !== null) return ofBasis;
    const { criteria } = await this.effects.getEffect(tx, shopId, effectId);
    // the request class of effects is the only way into the column, so it holds the model's shape
    return criteria as Criterion[];
  }
}

function factsOf({ view, cells }: WholeCoupon, photos: readonly PhotoStanding[], isPhotoRequired: boolean) {
  return { coupon: view.coupon, cells, photos, isPhotoRequired };
}
