import { Injectable } from '@nestjs/common';
import type { Actor } from '../common/actor';
import { ConflictError } from '../common/errors/domain-error';
import { type Tx, UnitOfWork } from '../database/unit-of-work';
import { fitCraters, isSameSpot, spotOf, toPlaceDto, whyNotSavable } from './coupon-crater-fit.mapper';
import { CouponCraterPlaceService } from './coupon-crater-place.service';
import { CouponInspectionRepository } from './coupon-inspection.repository';
import { CouponMeasurementsRepository } from './coupon-measurements.repository';
import { CouponNotFoundError } from './coupons.errors';
import { craterFitActions } from './coupons.policy';
import { CouponsService } from './coupons.service';
import type { CraterFitDto } from './dto/crater-fit.dto';

const FORMULA = 'D² = 2 w² ln(E / Eth), a line over ln E: w = √(slope / 2), Eth = exp(−intercept / slope), Fth = 2 Eth / (π w²)';
const SOURCE = 'J. M. Liu, Opt. Lett. 7 (1982) 196; docs/science/ablation.md';

type Saving = { readonly lensVersion: number; readonly shownSpotUm: number };

/** Threshold and spot from the craters of a coupon. Nothing of a fit is kept but the spot that somebody made the measured one. */
@Injectable()
export class CouponCraterFitService {
  constructor(
    private readonly unitOfWork: UnitOfWork,
    private readonly coupons: CouponsService,
    private readonly inspection: CouponInspectionRepository,
    private readonly measurements: CouponMeasurementsRepository,
    private readonly places: CouponCraterPlaceService,
  ) {}

  async get(actor: Actor, couponId: string): Promise<CraterFitDto> {
    return this.unitOfWork.read(actor, (tx) => this.read(tx, actor, couponId));
  }

  /** Makes the spot of the stored craters the measured one of the coupon’s machine and lens. */
  async saveSpot(actor: Actor, couponId: string, { lensVersion, shownSpotUm }: Saving): Promise<CraterFitDto> {
    return this.unitOfWork.run(actor, async (tx) => {
      // no crater is added between the look and the spot
      const coupon = await this.inspection.hold(tx, actor.shopId, couponId);
      if (coupon === undefined) throw new CouponNotFoundError();
      const found = await this.read(tx, actor, couponId);
      const { spot, place } = found;
      if (spot === null || place === null || found.notSavableBecause !== null)
        throw new ConflictError(found.notSavableBecause ?? 'There is no spot to save.');
      if (!isSameSpot(spot.diameterUm, shownSpotUm))
        throw new ConflictError(
          `The craters give ${spot.diameterUm} µm by now, not ${shownSpotUm} µm: somebody measured on. Look at the line again.`,
        );
      const pair = { machineId: place.machineId, lensId: place.lensId, version: lensVersion };
      await this.places.record(tx, actor, pair, { spot, line: found, coupon: { id: couponId, code: coupon.code } });
      return this.read(tx, actor, couponId);
    });
  }

  private async read(tx: Tx, actor: Actor, couponId: string): Promise<CraterFitDto> {
    const whole = await this.coupons.getWhole(tx, actor.shopId, couponId);
    const { coupon, profile } = whole.view;
    const { found, lastMeasuredAt } = fitCraters(whole, await this.measurements.ofCoupon(tx, actor.shopId, couponId));
    const place = await this.places.find(tx, actor.shopId, whole.view);
    const measuredOn = lastMeasuredAt === null ? null : await this.places.dayOf(tx, actor.shopId, lastMeasuredAt);
    const spot = spotOf(coupon.code, found, measuredOn);
    const { points, series, pointCount, fit, refusedBecause, remarks, incubation } = found;
    return {
      ...{ couponId, points: [...points], series, pointCount, fit, refusedBecause, remarks: [...remarks], spot },
      incubation: incubation === null ? null : { ...incubation, thresholds: [...incubation.thresholds] },
      place: place === undefined ? null : toPlaceDto(place),
      notSavableBecause: whyNotSavable({ found, spot, place }, profile.physicalNumber),
      ...{ formula: FORMULA, source: SOURCE },
      allowedActions: craterFitActions(actor),
    };
  }
}
